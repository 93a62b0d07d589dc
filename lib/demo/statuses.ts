import { evening } from './calendar';
import type { Random } from './random';
import type { DemoEntry } from './types';

const NOTES = [
  'Which branches were counted at the second visit? There is one more than were marked.',
  'Could you say whether the tips were kept? The text and the cut block differ.',
  'The date of the cut looks like the date of the count. Please check it.',
  'Is the depth by tape or by eye? Tick the box if by eye, and it can go in.',
];
export const PER_TREE_NOTE =
  'Counted per tree rather than per branch? We need one number for each marked branch.';

export function waiting(random: Random, entry: DemoEntry, today: string): DemoEntry {
  const last = entry.content.readings.at(-1)?.date ?? today;
  return {
    ...entry,
    status: 'waiting',
    acceptedAt: null,
    waitingSince: evening(last, 250 + random.whole(0, 30), today),
  };
}

export function returned(random: Random, entry: DemoEntry): DemoEntry {
  const returnedNote = entry.origin === 'per-tree' ? PER_TREE_NOTE : random.pick(NOTES);
  return { ...entry, status: 'returned', acceptedAt: null, returnedNote };
}

export function draft(entry: DemoEntry): DemoEntry {
  return { ...entry, status: 'draft', acceptedAt: null };
}

/** Taken back by its owner after it was accepted. */
export function withdrawn(entry: DemoEntry): DemoEntry {
  return { ...entry, status: 'withdrawn' };
}

/**
 * Leaves most entries accepted and moves a few: one in a hundred withdrawn, one in seventy-five a draft, one in two
 * hundred sent back; of those counted per tree, two in five sent back.
 */
export function settle(random: Random, entries: readonly DemoEntry[]): DemoEntry[] {
  return entries.map((entry) => {
    if (entry.origin === 'per-tree') return random.chance(0.4) ? returned(random, entry) : entry;
    if (entry.origin !== 'generated') return entry;
    const draw = random.uniform();
    if (draw < 0.01) return withdrawn(entry);
    if (draw < 0.0235) return draft(entry);
    return draw < 0.0285 ? returned(random, entry) : entry;
  });
}

/** Puts the latest read of these on the bench: one an owner. */
export function sendToBench(
  random: Random,
  entries: readonly DemoEntry[],
  most: number,
  today: string,
): DemoEntry[] {
  const lately = [...entries]
    .filter(({ status, origin }) => status === 'accepted' && origin === 'generated')
    .sort((a, b) => lastRead(b).localeCompare(lastRead(a)));
  const chosen = new Map<string, string>();
  for (const entry of lately) {
    if (chosen.size < most && !chosen.has(entry.ownerId)) chosen.set(entry.ownerId, entry.id);
  }
  const ids = new Set(chosen.values());
  return entries.map((entry) => (ids.has(entry.id) ? waiting(random, entry, today) : entry));
}

function lastRead({ content }: DemoEntry): string {
  return content.readings.at(-1)?.date ?? '';
}
