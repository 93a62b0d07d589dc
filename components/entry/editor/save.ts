import type { EntryContent, EntryView, Reading } from '@/lib/entries/schema';
import type { FieldError } from '@/lib/errors/errors';
import { contentOf, isOnlyAddedTo, newcomers, sameContent } from './content';
import { stillLacking, withIds } from './paths';
import type { Outcome, Transport } from './transport';
import type { Written } from './to-content';

/**
 * `saved` the server has it all; `changed` something is on its way to being sent; `saving` a request is under way;
 * `waiting` no answer, tried again by itself; the rest wait for somebody.
 */
export type Phase =
  'saved' | 'changed' | 'saving' | 'waiting' | 'signed-out' | 'invalid' | 'refused' | 'conflict' | 'gone';

export interface SaveState {
  readonly phase: Phase;
  /** The stored revision this editor knows; null while the server has none. */
  readonly revision: number | null;
  /** Whether the latest that was typed is in the copy on this device. */
  readonly onDevice: boolean;
  /** What cannot be read as typed, found here. */
  readonly problems: readonly FieldError[];
  /** What the server refused, with a reading's id for its index. */
  readonly errors: readonly FieldError[];
  readonly detail: string | null;
  /** What the bench still needs, found at the last try to send it there. */
  readonly lacks: readonly FieldError[];
  /** In a conflict, what is stored. */
  readonly theirs: EntryView | null;
}

export interface Clock {
  set(act: () => void, afterMs: number): unknown;
  clear(timer: unknown): void;
}

export interface SaverOptions {
  readonly id: string;
  readonly revision: number | null;
  /** What is stored at that revision; an empty draft where nothing is. */
  readonly base: EntryContent;
  /** What an earlier session sent and never got an answer to. */
  readonly sent?: readonly EntryContent[];
  /** Reads what now stands in the editor. */
  readonly write: (base: EntryContent) => Written;
  /** Puts the copy on the device, or takes it away when there is nothing to keep. Says whether it is there. */
  readonly keep: (
    copy: { content: EntryContent; revision: number | null; sent: readonly EntryContent[] } | null,
  ) => boolean;
  /** Takes in readings that somebody else added meanwhile, such as a helper in the orchard. */
  readonly adopt: (readings: readonly Reading[]) => void;
  readonly transport: Transport;
  readonly clock: Clock;
}

const DEBOUNCE_MS = 1000;
const FIRST_PAUSE_MS = 2000;
const LONGEST_PAUSE_MS = 60_000;
const MOST_UNANSWERED = 5;

/**
 * Saves an entry as it is typed: on the device at once, then to the server, one request at a time, the latest text
 * winning. It never overwrites what it has not seen: a stale revision becomes a conflict that somebody decides.
 */
export class Saver {
  private current: SaveState;
  private base: EntryContent;
  /** Contents that were sent and not answered: each may have arrived all the same. */
  private sent: readonly EntryContent[] = [];
  private timer: unknown = null;
  private pauseMs = FIRST_PAUSE_MS;
  /** Looking at a record changes nothing, however its document is set out again to be edited. */
  private isTouched = false;
  private running: Promise<void> | null = null;
  private readonly listeners = new Set<() => void>();

  constructor(private readonly options: SaverOptions) {
    this.base = options.base;
    this.sent = options.sent ?? [];
    this.current = {
      phase: 'saved',
      revision: options.revision,
      onDevice: false,
      problems: [],
      errors: [],
      detail: null,
      lacks: [],
      theirs: null,
    };
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly state = (): SaveState => this.current;

  /** Something was typed: kept on the device now, sent after a short rest. */
  touch(): void {
    this.isTouched = true;
    const { content, problems } = this.options.write(this.base);
    if (this.running === null && problems.length === 0 && sameContent(content, this.base) && this.isQuiet()) {
      this.options.keep(null);
      this.update({ phase: 'saved', problems, onDevice: false });
      return;
    }
    this.keepCopy(content, problems);
    if (this.isHeld()) return;
    if (this.running === null) this.update({ phase: 'changed' });
    this.schedule(DEBOUNCE_MS);
  }

  /** Sends what is unsent now. Resolves to whether the server has everything that stands in the editor. */
  async flush({ keepalive = false } = {}): Promise<boolean> {
    if (!this.isTouched) return true;
    if (this.current.phase === 'conflict' || this.current.phase === 'gone') return false;
    this.stopTimer();
    this.running ??= this.run(keepalive).finally(() => {
      this.running = null;
    });
    await this.running;
    const { content, problems } = this.options.write(this.base);
    return this.current.phase === 'saved' && problems.length === 0 && sameContent(content, this.base);
  }

  /** Opens with what was on the device and never arrived. Where the stored one moved on without it, that is a conflict. */
  resume(theirs: EntryView | null): void {
    this.isTouched = true;
    const { content, problems } = this.options.write(this.base);
    this.keepCopy(content, problems);
    if (theirs) this.update({ phase: 'conflict', theirs });
    else this.touch();
  }

  /** In a conflict, or where the stored one was deleted: what stands here goes up, over what is stored there now. */
  keepMine(): Promise<boolean> {
    const { theirs } = this.current;
    if (theirs) {
      const stored = contentOf(theirs);
      this.options.adopt(newcomers(stored, this.base));
      this.base = stored;
      this.update({ revision: theirs.revision });
    } else if (this.current.phase === 'gone') {
      this.update({ revision: null });
    }
    this.update({ phase: 'changed', theirs: null });
    return this.flush();
  }

  /** In a conflict: what is stored stays, and is given back for the editor to show. */
  takeTheirs(): EntryView | null {
    const { theirs } = this.current;
    if (!theirs) return null;
    this.base = contentOf(theirs);
    this.isTouched = false;
    this.sent = [];
    this.options.keep(null);
    this.update({
      phase: 'saved',
      revision: theirs.revision,
      theirs: null,
      errors: [],
      problems: [],
      onDevice: false,
    });
    return theirs;
  }

  /** Asks the bench to read what is saved. Asked twice, it is sent once. */
  submit(): Promise<Outcome> {
    return this.options.transport.submit(this.options.id);
  }

  /** What the bench said is still missing. */
  showLacks(errors: readonly FieldError[]): void {
    this.update({ lacks: withIds(errors, this.base) });
  }

  stop(): void {
    this.stopTimer();
    this.listeners.clear();
  }

  private async run(keepalive: boolean): Promise<void> {
    for (;;) {
      const { content, problems } = this.options.write(this.base);
      const isNothingNew = sameContent(content, this.base);
      if (isNothingNew) {
        this.settle(content, problems);
        return;
      }
      this.sent = [...this.sent, content].slice(-MOST_UNANSWERED);
      this.keepCopy(content, problems);
      this.update({ phase: 'saving' });
      const { transport, id } = this.options;
      const outcome = await transport.put(id, content, this.current.revision, keepalive);
      const goesOn =
        outcome.kind === 'done'
          ? this.accept(content, outcome.revision)
          : outcome.kind === 'stale'
            ? await this.lookAgain()
            : this.stopAt(outcome, content);
      if (!goesOn) return;
    }
  }

  private accept(content: EntryContent, revision: number): boolean {
    this.base = content;
    this.sent = [];
    this.pauseMs = FIRST_PAUSE_MS;
    this.update({ revision, errors: [], detail: null });
    return true;
  }

  /** Stale: the stored one may be our own, its answer lost on the way; else somebody else's. */
  private async lookAgain(): Promise<boolean> {
    const outcome = await this.options.transport.get(this.options.id);
    if (outcome.kind !== 'done') return this.stopAt(outcome, this.sent.at(-1) ?? this.base);
    const stored = contentOf(outcome.view);
    const { content, problems } = this.options.write(this.base);
    const isOurs = [this.base, ...this.sent, content].some((one) => sameContent(one, stored));
    if (isOurs) return this.accept(stored, outcome.view.revision);
    const added = newcomers(stored, this.base);
    if (added.length > 0 && [this.base, ...this.sent].some((one) => isOnlyAddedTo(one, stored, added))) {
      this.options.adopt(added);
      return this.accept(stored, outcome.view.revision);
    }
    this.keepCopy(content, problems);
    this.update({ phase: 'conflict', theirs: outcome.view });
    return false;
  }

  private stopAt(outcome: Exclude<Outcome, { kind: 'done' }>, content: EntryContent): false {
    const { problems } = this.options.write(this.base);
    this.keepCopy(content, problems);
    switch (outcome.kind) {
      case 'signed-out':
      case 'gone':
        this.update({ phase: outcome.kind });
        break;
      case 'invalid':
        this.update({ phase: 'invalid', errors: withIds(outcome.errors, content), detail: outcome.detail });
        break;
      case 'refused':
        this.update({ phase: 'refused', detail: outcome.detail });
        break;
      default:
        this.update({ phase: 'waiting' });
        this.schedule((outcome.kind === 'later' && outcome.afterMs) || this.pauseMs);
        this.pauseMs = Math.min(this.pauseMs * 2, LONGEST_PAUSE_MS);
    }
    return false;
  }

  /** The server has all of it; what cannot be read yet stays on the device alone. */
  private settle(content: EntryContent, problems: readonly FieldError[]): void {
    this.sent = [];
    if (problems.length > 0) {
      this.keepCopy(content, problems);
      this.update({ phase: 'saved' });
      return;
    }
    this.options.keep(null);
    this.update({ phase: 'saved', onDevice: false, problems: [], errors: [], detail: null });
  }

  private keepCopy(content: EntryContent, problems: readonly FieldError[]): void {
    const onDevice = this.options.keep({ content, revision: this.current.revision, sent: this.sent });
    this.update({ onDevice, problems, lacks: stillLacking(this.current.lacks, content) });
  }

  /** Nothing more is sent by itself: somebody has to look, or it is already being tried again at growing pauses. */
  private isHeld(): boolean {
    return ['conflict', 'gone', 'refused', 'signed-out', 'waiting'].includes(this.current.phase);
  }

  private isQuiet(): boolean {
    return this.current.phase === 'saved' || this.current.phase === 'changed';
  }

  private schedule(afterMs: number): void {
    this.stopTimer();
    this.timer = this.options.clock.set(() => void this.flush(), afterMs);
  }

  private stopTimer(): void {
    if (this.timer !== null) this.options.clock.clear(this.timer);
    this.timer = null;
  }

  private update(change: Partial<SaveState>): void {
    this.current = { ...this.current, ...change };
    for (const listener of this.listeners) listener();
  }
}
