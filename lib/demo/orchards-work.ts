import type { EntryContent } from '@/lib/entries/schema';
import { addDays, evening } from './calendar';
import { drawCut, seasonOf } from './cuts';
import { drawReadings, drawVisits } from './flush';
import { demoId } from './ids';
import { TREE_SPOTS } from './names';
import type { Random } from './random';
import type { Ring } from './ring';
import type { RingSpecies } from './species';
import { titleOf } from './titles';
import type { DemoEntry, DemoOrchard, DemoTree } from './types';

/** How far back the demo reaches, and how close to today an accepted entry was last read. */
const REACH_DAYS = 730;
export const SETTLED_DAYS = 3;

/** Everything a day's work in an orchard needs; trees are planted as they are first cut. */
export class OrchardsWork {
  readonly trees: DemoTree[] = [];
  private readonly treesIn = new Map<string, DemoTree[]>();

  constructor(
    readonly random: Random,
    readonly seed: number,
    readonly today: string,
    readonly ring: Ring,
  ) {}

  /** A tree of that species in that orchard: often one that was cut before. */
  tree(random: Random, orchard: DemoOrchard, species: RingSpecies, label?: string): DemoTree {
    const here = this.treesIn.get(orchard.id) ?? [];
    const known = here.filter(
      (tree) => tree.species === species.slug && (label === undefined || tree.label === label),
    );
    if (known.length > 0 && (label !== undefined || random.chance(0.4))) return random.pick(known);
    const tree: DemoTree = {
      id: demoId(random, orchard.createdAt),
      orchardId: orchard.id,
      label: label ?? freshLabel(random, species, new Set(here.map((one) => one.label))),
      species: species.slug,
      cultivar: species.cultivars.length > 0 && random.chance(0.5) ? random.pick(species.cultivars) : null,
      yearPlanted: random.chance(0.7) ? Number(this.today.slice(0, 4)) - random.whole(4, 38) : null,
      createdAt: orchard.createdAt,
    };
    this.trees.push(tree);
    this.treesIn.set(orchard.id, [...here, tree]);
    return tree;
  }

  /** A day in the last two years on which the ring would cut that species, far enough back to have been read. */
  cutDay(random: Random, species: RingSpecies): string {
    for (let tries = 0; ; tries++) {
      const day = addDays(this.today, -random.whole(40, REACH_DAYS));
      if (tries > 60 || random.chance(seasonOf(species, day))) return day;
    }
  }

  /** An entry of that tree, accepted, without a document yet. */
  entry(random: Random, orchard: DemoOrchard, tree: DemoTree, species: RingSpecies): DemoEntry {
    const date = this.cutDay(random, species);
    const content = this.content(random, orchard, tree, species, date);
    const days = drawVisits(random, date, addDays(this.today, -SETTLED_DAYS));
    return this.finish(random, orchard, content, days);
  }

  content(
    random: Random,
    orchard: DemoOrchard,
    tree: DemoTree,
    species: RingSpecies,
    date: string,
  ): EntryContent {
    const cut = drawCut(random, species, date);
    const place = { ...orchard.place };
    if (random.chance(0.15)) place.sun = random.pick(['full', 'part', 'shade'] as const);
    return {
      title: random.chance(0.94) ? titleOf(random, species, cut) : null,
      species: species.slug,
      cultivar: tree.cultivar,
      orchard: orchard.id,
      tree: tree.id,
      place: { ...place, elevation: random.chance(0.9) ? orchard.elevationM : null },
      cut,
      readings: [],
      doc: { type: 'doc', content: [] },
      schemaVersion: 1,
    };
  }

  /** Reads the branches on those days and has the entry accepted some days after the last. */
  finish(
    random: Random,
    orchard: DemoOrchard,
    content: EntryContent,
    days: readonly number[],
    plain = false,
  ): DemoEntry {
    const date = content.cut.date ?? this.today;
    const createdAt = evening(date, random.whole(0, 240), this.today);
    const id = demoId(random, createdAt);
    const hand = { seed: this.seed, entryId: id, ownerId: orchard.ownerId, today: this.today, plain };
    const readings = days.length > 0 ? drawReadings(random, hand, content, days) : [];
    const last = readings.at(-1)?.date ?? date;
    const helpers = this.ring.members
      .filter(({ orchardId }) => orchardId === orchard.id)
      .map(({ personId }) => personId);
    return {
      id,
      ownerId: orchard.ownerId,
      origin: 'generated',
      status: 'accepted',
      content: { ...content, readings },
      pending: null,
      returnedNote: null,
      readBy: readings.map(() =>
        helpers.length > 0 && random.chance(0.4) ? random.pick(helpers) : orchard.ownerId,
      ),
      createdAt,
      savedAt: evening(last, random.whole(0, 240), this.today),
      waitingSince: null,
      acceptedAt: evening(addDays(last, random.whole(1, 6)), random.whole(0, 240), this.today),
    };
  }
}

function freshLabel(random: Random, species: RingSpecies, taken: ReadonlySet<string>): string {
  const name = species.name.charAt(0).toUpperCase() + species.name.slice(1);
  for (let tries = 0; tries < 40; tries++) {
    const label = random.pick([
      () => `${name} ${random.pick(TREE_SPOTS)}`,
      () => `Row ${random.whole(1, 9)}, ${species.name} ${random.whole(1, 12)}`,
      () => `${name} ${random.whole(1, 30)}`,
      () => `Old ${species.name} ${random.pick(TREE_SPOTS)}`,
    ])();
    if (!taken.has(label)) return label;
  }
  return `${name} ${taken.size + 31}`;
}
