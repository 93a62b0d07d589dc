import { EMPTY_CONTENT, EMPTY_READING_CONTENT } from '@/components/entry/editor/content';
import type { Clock } from '@/components/entry/editor/save';
import type { EntryContent, EntryView, Reading } from '@/lib/entries/schema';

export const ENTRY = '0198c2f0-0000-7000-8000-0000000000aa';
export const READING = '0198c2f0-0000-7000-8000-000000000001';
export const OTHER_READING = '0198c2f0-0000-7000-8000-000000000002';

/** An entry's content; its document places the cut and the readings, as the editor would. */
export function content(change: Partial<EntryContent> = {}): EntryContent {
  const readings = change.readings ?? [];
  const blocks = [{ type: 'cut' }, ...readings.map(({ id }) => ({ type: 'reading', attrs: { id } }))];
  return { ...EMPTY_CONTENT, doc: { type: 'doc', content: blocks }, ...change };
}

export function reading(change: Partial<Reading> = {}): Reading {
  return { ...EMPTY_READING_CONTENT, id: READING, date: '2026-04-28', counts: [7, 9, null, 11], ...change };
}

export function cut(change: Partial<EntryContent['cut']> = {}): EntryContent['cut'] {
  return { ...EMPTY_CONTENT.cut, ...change };
}

/** The same content as the server would tell it. */
export function viewOf(stored: EntryContent, revision: number): EntryView {
  return {
    ...stored,
    id: ENTRY,
    status: 'draft',
    revision,
    owner: 'An invented grower',
    mine: true,
    createdAt: '2026-05-01T00:00:00.000Z',
    updatedAt: '2026-05-01T00:00:00.000Z',
    class: null,
    credits: [],
    readings: stored.readings.map((one) => ({
      ...one,
      revision: 1,
      weeks: 8,
      thinned: false,
      setAside: false,
    })),
  };
}

/** Time that passes when the test says so. */
export class HandClock implements Clock {
  private now = 0;
  private next = 1;
  private readonly waiting = new Map<number, { at: number; act: () => void }>();

  set(act: () => void, afterMs: number): number {
    this.waiting.set(this.next, { at: this.now + afterMs, act });
    return this.next++;
  }

  clear(timer: unknown): void {
    this.waiting.delete(timer as number);
  }

  /** Milliseconds to each timer that is set. */
  pending(): number[] {
    return [...this.waiting.values()].map(({ at }) => at - this.now);
  }

  async pass(ms: number): Promise<void> {
    this.now += ms;
    for (const [id, { at, act }] of [...this.waiting]) {
      if (at > this.now) continue;
      this.waiting.delete(id);
      act();
    }
    await settled();
  }
}

/** Lets everything that is already resolved run. */
export async function settled(): Promise<void> {
  for (let turn = 0; turn < 50; turn += 1) await Promise.resolve();
}
