import type { Editor } from '@tiptap/react';
import { closeHistory } from '@tiptap/pm/history';
import { mentionedBlocks } from '@/lib/documents/blocks';
import type { EntryContent, Reading } from '@/lib/entries/schema';
import type { Units } from '@/lib/units/units';
import { readingForm } from './form';
import { FormStore } from './form-store';
import type { LocalCopies } from './local-copy';
import { Saver, type Clock } from './save';
import { trimmed, type Doc } from './document';
import type { Session } from './session';
import { contentFrom, type Written } from './to-content';
import { transport } from './transport';

const CLOCK: Clock = {
  set: (act, afterMs) => window.setTimeout(act, afterMs),
  clear: (timer) => window.clearTimeout(timer as number),
};

/** The parts of one opening of the editor that are no React: the fields' store, the saver, and the document's place. */
export class Desk {
  readonly store: FormStore;
  readonly saver: Saver;
  /** The editor, once it stands; before that the document is as it was opened. */
  private editor: Editor | null = null;

  constructor(
    readonly session: Session,
    private readonly copies: LocalCopies,
    private readonly units: Units,
  ) {
    this.store = new FormStore(session.form, units, () => this.saver.touch());
    this.saver = new Saver({
      id: session.id,
      revision: session.revision,
      base: session.base,
      sent: session.sent,
      write: (base) => this.write(base),
      keep: (copy) => this.keep(copy),
      adopt: (readings) => this.adopt(readings),
      transport: transport((input, init) => fetch(input, init)),
      clock: CLOCK,
    });
  }

  /** The editor stands: what the device had kept goes up, or both versions are shown. */
  attach(editor: Editor): void {
    this.editor = editor;
    if (this.session.isRestored) this.saver.resume(this.session.theirs);
  }

  detach(): void {
    this.editor = null;
  }

  doc(): Doc {
    return (this.editor?.getJSON() ?? this.session.doc) as Doc;
  }

  readingIds(): readonly string[] {
    return mentionedBlocks(this.doc()).readings;
  }

  write(base: EntryContent): Written {
    return contentFrom(
      this.store.get(),
      this.readingIds(),
      trimmed(this.doc()),
      base,
      this.units,
      new Date(),
    );
  }

  /** Puts a reading at the end of the document, a line of prose behind it. */
  place(id: string): void {
    this.editor
      ?.chain()
      .command(({ tr }) => {
        // Its own step of undo: it does not go with what was typed just before.
        closeHistory(tr);
        return true;
      })
      .insertContentAt(this.editor.state.doc.content.size, [
        { type: 'reading', attrs: { id } },
        { type: 'paragraph' },
      ])
      .run();
  }

  private keep(copy: Parameters<ConstructorParameters<typeof Saver>[0]['keep']>[0]): boolean {
    if (copy === null) {
      this.copies.remove(this.session.id);
      return false;
    }
    return this.copies.write(this.session.id, {
      version: 1,
      at: Date.now(),
      form: this.store.get(),
      doc: trimmed(this.doc()),
      ...copy,
    });
  }

  private adopt(readings: readonly Reading[]): void {
    for (const reading of readings) {
      this.store.setReading(reading.id, readingForm(reading, this.units));
      if (!this.readingIds().includes(reading.id)) this.place(reading.id);
    }
  }
}
