import type { Reading } from '@/lib/entries/schema';
import { CLASS_MIDPOINT, roundSeverity, severityClass } from '@/lib/severity/severity';
import { addDays } from './calendar';
import { emptyReading } from './flush';
import { demoId } from './ids';
import type { OrchardsWork } from './orchards-work';
import type { Random } from './random';
import { ringSpecies } from './species';
import { notebookTitle } from './titles';
import type { DemoEntry, DemoOrchard } from './types';

/**
 * The same cut written down twice: a day off, branches called in another order, the depth from memory. With
 * `other`, by the other owner of the same planting.
 */
export function writeTwice(
  random: Random,
  work: OrchardsWork,
  entry: DemoEntry,
  other?: DemoOrchard,
): DemoEntry {
  const { content } = entry;
  const shift = random.chance(0.5) ? 1 : -1;
  const order = random.shuffled(Array.from({ length: content.cut.branches ?? 0 }, (_, index) => index));
  const date = addDays(content.cut.date ?? work.today, shift);
  const readings = content.readings.map((reading) => readAgain(random, work, reading, order, shift));
  const label = work.trees.find(({ id }) => id === content.tree)?.label;
  const tree = other ? work.tree(random, other, ringSpecies(content.species ?? ''), label).id : content.tree;
  const owner = other?.ownerId ?? entry.ownerId;
  const createdAt = new Date(entry.createdAt.getTime() + random.whole(20, 2000) * 60_000);
  return {
    ...entry,
    id: demoId(random, createdAt),
    ownerId: owner,
    origin: 'double',
    createdAt,
    readBy: readings.map(() => owner),
    content: {
      ...content,
      title: random.chance(0.5) ? content.title : notebookTitle(ringSpecies(content.species ?? '')),
      orchard: other?.id ?? content.orchard,
      tree,
      cut: { ...content.cut, date, ...fromMemory(random, entry) },
      readings,
    },
  };
}

function fromMemory(random: Random, { content: { cut } }: DemoEntry): Partial<DemoEntry['content']['cut']> {
  if (cut.kind === 'none' || cut.severity === null || random.chance(0.5)) return {};
  const severity = roundSeverity(CLASS_MIDPOINT[severityClass(cut.severity)]);
  return { severity, severityEstimated: true, removedLength: null, diameter: null, intensity: null };
}

function readAgain(
  random: Random,
  work: OrchardsWork,
  reading: Reading,
  order: readonly number[],
  shift: number,
): Reading {
  const date = addDays(reading.date ?? work.today, shift);
  const { id } = emptyReading(random, date, work.today);
  const counts = reading.counts && order.map((index) => reading.counts?.[index] ?? null);
  return { ...reading, id, date, counts };
}

/** Counts a whole tree as if it were one branch: the mistake that the bench asks about. */
export function countPerTree(random: Random, entry: DemoEntry): DemoEntry {
  const limbs = random.whole(4, 7);
  const readings = entry.content.readings.map((reading) => {
    const shoots =
      reading.total ?? (reading.counts ?? []).reduce<number>((sum, count) => sum + (count ?? 0), 0);
    const all = Math.min(999, shoots * limbs + random.whole(0, limbs));
    return { ...reading, counts: [all], total: null, branches: null, removed: null, kept: null, note: null };
  });
  const cut = { ...entry.content.cut, branches: 1 };
  return { ...entry, origin: 'per-tree', content: { ...entry.content, cut, readings } };
}
