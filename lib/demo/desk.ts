import type { EntryContent } from '@/lib/entries/schema';
import { addDays } from './calendar';
import type { OrchardsWork } from './orchards-work';
import { paragraph, writeDocument } from './prose';
import type { Random } from './random';
import { ringSpecies, type RingSpecies } from './species';
import { draft, returned, waiting } from './statuses';
import type { DemoEntry, DemoOrchard, DocNode } from './types';

/** What lies on the desk of the demo's grower, and of the neighbour. */
export interface Desk {
  /** Each with a reading or more: they count among the ring's entries. */
  read: DemoEntry[];
  /** Drafts whose first return is still to come. */
  unread: DemoEntry[];
}

export const FINISHED_ON_DESK = 22;
const NEIGHBOURS = 6;

export function growersDesk(random: Random, work: OrchardsWork, orchard: DemoOrchard): Desk {
  const grows = work.ring.grows.get(orchard.id) ?? [];
  const made = (label: string, species: RingSpecies, cutAgo: number, readAgo: number[], tree?: string) =>
    madeBy(random.fork(label), work, orchard, species, { cutAgo, readAgo, tree });
  const first = grows[0] as RingSpecies;
  const other = grows[1] ?? first;
  const finished = Array.from({ length: FINISHED_ON_DESK }, (_, index) =>
    anyEntry(random.fork(`done/${index}`), work, orchard, grows),
  );
  const [changed, ...done] = finished as [DemoEntry, ...DemoEntry[]];
  return {
    read: [
      withPendingChange(changed),
      ...done,
      // Accepted on its first count; the later visits are still ahead.
      made('under way', other, 47, [18]),
      draft(made('due today', first, 56, [28], `Young ${first.name} by the pump`)),
      draft(made('due in three weeks', other, 35, [6])),
      draft(made('late in the year', first, 100, [44])),
      returned(random.fork('returned'), made('returned', other, 90, [34])),
    ],
    unread: [draft(made('just cut', first, 9, [])), draft(begun(made('begun', other, 2, [])))],
  };
}

/** A few of the neighbour's: the newest waits on the bench. */
export function neighboursDesk(random: Random, work: OrchardsWork, orchard: DemoOrchard): DemoEntry[] {
  const grows = work.ring.grows.get(orchard.id) ?? [];
  const finished = Array.from({ length: NEIGHBOURS }, (_, index) =>
    anyEntry(random.fork(`done/${index}`), work, orchard, grows),
  );
  const fresh = madeBy(random.fork('waiting'), work, orchard, grows[0] as RingSpecies, {
    cutAgo: 61,
    readAgo: [33, 4],
  });
  return [...finished, waiting(random, fresh, work.today)];
}

function anyEntry(
  random: Random,
  work: OrchardsWork,
  orchard: DemoOrchard,
  grows: readonly RingSpecies[],
): DemoEntry {
  const species = random.weighted(grows, ({ grown }) => grown);
  const entry = work.entry(random, orchard, work.tree(random, orchard, species), species);
  return { ...entry, origin: 'own', content: written(random, entry.content) };
}

function madeBy(
  random: Random,
  work: OrchardsWork,
  orchard: DemoOrchard,
  species: RingSpecies,
  { cutAgo, readAgo, tree }: { cutAgo: number; readAgo: number[]; tree?: string | undefined },
): DemoEntry {
  const date = addDays(work.today, -cutAgo);
  const content = work.content(random, orchard, work.tree(random, orchard, species, tree), species, date);
  content.title ??= `A ${species.name}`;
  content.cut.dateApproximate = null;
  const days = readAgo.map((ago) => cutAgo - ago);
  const entry = work.finish(random, orchard, content, days, true);
  return { ...entry, origin: 'own', content: written(random, entry.content) };
}

function written(random: Random, content: EntryContent): EntryContent {
  return { ...content, doc: writeDocument(random.fork('prose'), content) };
}

/** A note set down on the way home: what was cut, and little else. */
function begun(entry: DemoEntry): DemoEntry {
  const { cut, ...rest } = entry.content;
  const bare = {
    ...cut,
    severity: null,
    tip: null,
    branches: null,
    stage: null,
    removedLength: null,
    retainedLength: null,
    diameter: null,
  };
  return {
    ...entry,
    content: {
      ...rest,
      cut: { ...bare, kind: null, aim: null, intensity: null, severityEstimated: false },
      title: 'Cut this before the rain',
      tree: null,
    },
  };
}

/** An accepted entry to which its owner added a line and a thickness, not sent for reading yet. */
function withPendingChange(entry: DemoEntry): DemoEntry {
  const { content } = entry;
  const nodes = (content.doc as DocNode).content ?? [];
  const line = paragraph(
    `Went back with the callipers; the thickness above is from that. The ${ringSpecies(content.species ?? '').name} stands well.`,
  );
  return {
    ...entry,
    pending: {
      ...content,
      cut: { ...content.cut, diameter: 0.037 },
      doc: { type: 'doc', content: [...nodes, line] },
    },
  };
}
