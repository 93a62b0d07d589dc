import type { EntryContent, EntryView } from '@/lib/entries/schema';
import type { Units } from '@/lib/units/units';
import { contentOf, EMPTY_CONTENT } from './content';
import { editable, trimmed, type Doc } from './document';
import { formFrom, type EntryForm } from './form';
import type { LocalCopies } from './local-copy';
import { openingOf } from './resume';

/** All that one opening of the editor starts from. */
export interface Session {
  readonly id: string;
  readonly revision: number | null;
  readonly status: EntryView['status'];
  readonly base: EntryContent;
  readonly form: EntryForm;
  readonly doc: Doc;
  /** What was sent earlier and never answered. */
  readonly sent: readonly EntryContent[];
  /** It opened from the copy on this device. */
  readonly isRestored: boolean;
  /** What is stored, where both versions must be shown. */
  readonly theirs: EntryView | null;
}

/** Opens a stored entry, or what this device still holds of it. */
export function openStored(view: EntryView, copies: LocalCopies, units: Units): Session {
  const opening = openingOf(view, copies.read(view.id));
  const base = contentOf(view);
  if (opening.from === 'stored') return fromView(view, units);
  const { copy, theirs } = opening;
  return {
    ...fromView(view, units),
    base,
    form: copy.form,
    doc: editable(
      copy.doc,
      copy.content.readings.map(({ id }) => id),
    ),
    sent: copy.sent,
    isRestored: true,
    theirs,
  };
}

/** Opens what is stored and nothing else. */
export function fromView(view: EntryView, units: Units): Session {
  const base = contentOf(view);
  return {
    id: view.id,
    revision: view.revision,
    status: view.status,
    base,
    form: formFrom(base, units),
    doc: editable(
      base.doc,
      base.readings.map(({ id }) => id),
    ),
    sent: [],
    isRestored: false,
    theirs: null,
  };
}

/** A new entry: what was begun on this device and never reached the server, else an empty one under `freshId`. */
export function openNew(freshId: string, start: EntryContent, copies: LocalCopies, units: Units): Session {
  const id = copies.newestUnmade();
  const copy = id === null ? null : copies.read(id);
  if (id === null || copy === null) return empty(freshId, start, units);
  return {
    ...empty(id, EMPTY_CONTENT, units),
    form: copy.form,
    doc: editable(
      copy.doc,
      copy.content.readings.map((reading) => reading.id),
    ),
    sent: copy.sent,
    isRestored: true,
  };
}

export function empty(id: string, start: EntryContent, units: Units): Session {
  const doc = editable(start.doc, []);
  return {
    id,
    revision: null,
    status: 'draft',
    // What an orchard brings by itself is nothing that anybody wrote: untouched, it makes no draft.
    base: { ...start, doc: trimmed(doc) },
    form: formFrom(start, units),
    doc,
    sent: [],
    isRestored: false,
    theirs: null,
  };
}
