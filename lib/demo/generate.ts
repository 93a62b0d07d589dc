import { growersDesk, neighboursDesk } from './desk';
import { countPerTree, writeTwice } from './faults';
import { placeHandwritten } from './place-handwritten';
import { OrchardsWork } from './orchards-work';
import { writeDocument } from './prose';
import { seededRandom, type Random } from './random';
import { makeRing, type Ring } from './ring';
import { RING_SPECIES, type RingSpecies } from './species';
import { sendToBench, settle } from './statuses';
import type { Demo, DemoEntry, DemoOptions, DemoOrchard } from './types';

const USUAL_ENTRIES = 900;
const USUAL_GROWERS = 60;
const USUAL_ORCHARDS = 45;
/** Of the ring's entries, how many are written down twice, or counted per tree. */
const DOUBLES = 0.012;
const PER_TREE = 0.007;
const ON_THE_BENCH = 3;

/**
 * The whole demo of an invented valley, as it stands on `today`: the same for the same seed and day. Pure: what is
 * written by hand is handed in. A ring of more than 900 entries has more growers and orchards, less than in proportion.
 * Two drafts of the demo's grower, not read yet, come on top of `entries`.
 */
export function generateDemo(options: DemoOptions): Demo {
  const { seed, today, entries: wanted = USUAL_ENTRIES, handwritten = [] } = options;
  const scale = Math.max(1, wanted / USUAL_ENTRIES) ** 0.75;
  const size = {
    growers: options.growers ?? Math.round(USUAL_GROWERS * scale),
    orchards: options.orchards ?? Math.round(USUAL_ORCHARDS * scale),
    species: options.species ?? RING_SPECIES.length,
  };
  const random = seededRandom(seed, 'demo');
  const ring = makeRing(random.fork('ring'), size, today);
  const work = new OrchardsWork(random, seed, today, ring);
  const byHand = handwritten.map((one) => placeHandwritten(random.fork(`hand/${one.slug}`), work, one));
  const desk = growersDesk(random.fork('desk'), work, orchardOf(ring, ring.grower.id));
  const neighbours = neighboursDesk(random.fork('neighbour'), work, orchardOf(ring, ring.neighbour.id));
  const known = [...byHand, ...desk.read, ...neighbours];
  const others = ringsEntries(random.fork('ring entries'), work, Math.max(0, wanted - known.length));
  const onBench = known.filter(({ status }) => status === 'waiting').length;
  const settled = sendToBench(
    random.fork('bench'),
    settle(random.fork('settle'), others),
    ON_THE_BENCH - onBench,
    today,
  );
  return {
    people: ring.people,
    orchards: ring.orchards,
    members: ring.members,
    trees: work.trees,
    entries: [...known, ...settled, ...desk.unread],
  };
}

/** What the rest of the ring wrote down: every species at least once where there is room, mistakes included. */
function ringsEntries(random: Random, work: OrchardsWork, number: number): DemoEntry[] {
  const doubles = Math.round(number * DOUBLES);
  const theirs = [work.ring.grower.id, work.ring.neighbour.id];
  const orchards = work.ring.orchards.filter(({ ownerId }) => !theirs.includes(ownerId));
  const weights = new Map(
    orchards.map(({ id }) => [id, 0.25 - Math.log(1 - random.fork(`busy/${id}`).uniform())]),
  );
  const homes = homesOf(work.ring, orchards);
  const entries = Array.from({ length: number - doubles }, (_, index) => {
    const own = random.fork(String(index));
    const rare = homes[index];
    const orchard = rare?.orchard ?? own.weighted(orchards, ({ id }) => weights.get(id) ?? 1);
    const species =
      rare?.species ?? own.weighted(work.ring.grows.get(orchard.id) ?? [], ({ grown }) => grown);
    return work.entry(own, orchard, work.tree(own, orchard, species), species);
  });
  miscount(random.fork('per tree'), entries, Math.round(number * PER_TREE));
  const twice = random
    .fork('twice')
    .shuffled(entries.filter(({ origin }) => origin === 'generated'))
    .sort((a, b) => Number(inTwin(work.ring, b)) - Number(inTwin(work.ring, a)));
  const copies = Array.from({ length: Math.min(doubles, twice.length) }, (_, index) => {
    // Four in ten by the other owner of the twin planting, as far as there are entries in it.
    const fromTwin = index < doubles * 0.4;
    const entry = (fromTwin ? twice[index] : twice[twice.length - 1 - index]) as DemoEntry;
    const other = inTwin(work.ring, entry) ? work.ring.twins?.[1] : undefined;
    return writeTwice(random.fork(`twice/${index}`), work, entry, other);
  });
  return [...entries, ...copies].map((entry) => ({
    ...entry,
    content: { ...entry.content, doc: writeDocument(random.fork(`prose/${entry.id}`), entry.content) },
  }));
}

/** Three hands count whole trees for branches: their entries with a flush of some size. */
function miscount(random: Random, entries: DemoEntry[], number: number): void {
  const owners = new Set(
    random.shuffled([...new Set(entries.map(({ ownerId }) => ownerId))]).slice(0, Math.max(3, number)),
  );
  let left = number;
  entries.forEach((entry, index) => {
    if (
      left === 0 ||
      !owners.has(entry.ownerId) ||
      entry.content.cut.kind !== 'heading' ||
      random.chance(0.5)
    )
      return;
    entries[index] = countPerTree(random.fork(String(index)), entry);
    left--;
  });
}

function homesOf(
  ring: Ring,
  orchards: readonly DemoOrchard[],
): { orchard: DemoOrchard; species: RingSpecies }[] {
  const seen = new Set<RingSpecies>();
  return orchards.flatMap((orchard) =>
    (ring.grows.get(orchard.id) ?? []).flatMap((species) => {
      if (seen.has(species)) return [];
      seen.add(species);
      return [{ orchard, species }];
    }),
  );
}

function inTwin({ twins }: Ring, { content }: DemoEntry): boolean {
  return twins !== null && content.orchard === twins[0].id;
}

function orchardOf({ orchards }: Ring, ownerId: string): DemoOrchard {
  const found = orchards.find((orchard) => orchard.ownerId === ownerId);
  if (!found) throw new Error('the demo has people without an orchard');
  return found;
}
