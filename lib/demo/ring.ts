import { addDays } from './calendar';
import { demoId } from './ids';
import {
  ADMIN_NAME,
  FAMILY_NAMES,
  GIVEN_NAMES,
  GROWER,
  HELPER_NAME,
  MODERATOR_NAME,
  NEIGHBOUR,
  ORCHARD_NAMES,
  WRITERS,
  type CastMember,
} from './names';
import type { Random } from './random';
import { RING_SPECIES, type RingSpecies } from './species';
import type { DemoMember, DemoOrchard, DemoPerson, Place } from './types';

/** The growers of the valley and their orchards, before a tree is cut. */
export interface Ring {
  people: DemoPerson[];
  orchards: DemoOrchard[];
  members: DemoMember[];
  /** What each orchard grows, by its id. */
  grows: Map<string, RingSpecies[]>;
  grower: DemoPerson;
  neighbour: DemoPerson;
  helper: DemoPerson;
  moderator: DemoPerson;
  /** Two orchards that are one planting, written down by two people; absent in a small ring. */
  twins: [DemoOrchard, DemoOrchard] | null;
}

/** The valley lies in open sea on any map, so that no one's orchard is meant. */
const MOUTH = { latitude: 18.05, longitude: -42.9 };
const LENGTH = { latitude: 0.42, longitude: 0.5 };
/** The river falls a little faster near its head. */
const CLIMB = 1.1;
const TIME_ZONE = 'Etc/GMT+3';

export function makeRing(
  random: Random,
  size: { growers: number; orchards: number; species: number },
  today: string,
): Ring {
  const maker = new RingMaker(random, addDays(today, -760), RING_SPECIES.slice(0, size.species));
  const grower = maker.person(GROWER.name, 'grower@aftercut.example');
  const neighbour = maker.person(NEIGHBOUR.name, 'neighbour@aftercut.example');
  const helper = maker.person(HELPER_NAME, 'helper@aftercut.example');
  const moderator = maker.person(MODERATOR_NAME, 'moderator@aftercut.example', 'moderator');
  maker.person(ADMIN_NAME, 'admin@aftercut.example', 'admin');
  const own = maker.orchardOf(grower, GROWER);
  maker.join(own, helper);
  maker.orchardOf(neighbour, NEIGHBOUR);
  for (const writer of WRITERS) maker.orchardOf(maker.person(writer.name), writer);
  const others = Array.from({ length: Math.max(0, size.growers - 3 - WRITERS.length) }, () => maker.person());
  const twins = maker.otherOrchards(others, size.orchards);
  maker.plantWhatNobodyGrows();
  const { people, orchards, members, grows } = maker;
  return { people, orchards, members, grows, grower, neighbour, helper, moderator, twins };
}

class RingMaker {
  readonly people: DemoPerson[] = [];
  readonly orchards: DemoOrchard[] = [];
  readonly members: DemoMember[] = [];
  readonly grows = new Map<string, RingSpecies[]>();
  private readonly names = new Set([GROWER, NEIGHBOUR, ...WRITERS].map(({ name }) => name));

  constructor(
    private readonly random: Random,
    private readonly since: string,
    private readonly species: readonly RingSpecies[],
  ) {
    for (const name of [HELPER_NAME, MODERATOR_NAME, ADMIN_NAME]) this.names.add(name);
  }

  person(known?: string, email?: string, role: DemoPerson['role'] = 'grower'): DemoPerson {
    const random = this.random.fork(`person/${this.people.length}`);
    const createdAt = this.joined();
    const person: DemoPerson = {
      id: demoId(random, createdAt),
      name: known ?? this.freshName(random),
      email: email ?? `ring-${this.people.length + 1}@aftercut.example`,
      role,
      signsIn: email !== undefined,
      units: email === undefined && random.chance(0.2) ? 'imperial' : 'metric',
      createdAt,
    };
    this.people.push(person);
    return person;
  }

  orchardOf(owner: DemoPerson, cast: CastMember): DemoOrchard {
    const orchard = this.orchard(
      owner,
      cast.orchard,
      this.climb(cast.elevationM),
      cast.elevationM,
      cast.place,
    );
    const known = this.species.filter(({ slug }) => cast.species.includes(slug));
    this.grows.set(orchard.id, known.length > 0 ? known : this.suited(cast.elevationM, this.random));
    return orchard;
  }

  /** Nine in ten owners have one orchard; those without one help in somebody else's. The last two are twins. */
  otherOrchards(people: readonly DemoPerson[], upTo: number): [DemoOrchard, DemoOrchard] | null {
    const wanted = Math.max(0, upTo - this.orchards.length);
    const owners = people.slice(0, Math.max(1, Math.ceil(wanted * 0.9)));
    if (owners.length === 0) return null;
    const names = this.random.fork('orchard names').shuffled(ORCHARD_NAMES);
    const taken = new Set(this.orchards.map(({ name }) => name));
    const free = names.filter((name) => !taken.has(name));
    let last: DemoOrchard | undefined;
    let twins: [DemoOrchard, DemoOrchard] | null = null;
    for (let index = 0; index < wanted; index++) {
      const random = this.random.fork(`orchard/${index}`);
      const owner = owners[index % owners.length] as DemoPerson;
      const name = free[index % free.length] as string;
      if (index === wanted - 1 && last && last.ownerId !== owner.id) {
        const twin = this.twinOf(last, owner, name);
        twins = [last, twin];
        break;
      }
      const along = random.uniform();
      const elevationM = Math.round(30 + 1800 * along ** CLIMB + Math.abs(random.normal(0, 30)));
      last = this.orchard(owner, name, along, elevationM, drawPlace(random));
      this.grows.set(last.id, this.suited(elevationM, random));
    }
    for (const person of people.slice(owners.length)) this.join(this.random.pick(this.orchards), person);
    return twins;
  }

  /** Gives every species a home, in the orchard whose height suits it best. */
  plantWhatNobodyGrows(): void {
    const grown = new Set([...this.grows.values()].flat());
    for (const species of this.species.filter((one) => !grown.has(one))) {
      const middleM = (species.band.fromM + species.band.toM) / 2;
      const best = this.orchards.reduce((a, b) =>
        Math.abs(a.elevationM - middleM) <= Math.abs(b.elevationM - middleM) ? a : b,
      );
      this.grows.get(best.id)?.push(species);
    }
  }

  join(orchard: DemoOrchard, person: DemoPerson): void {
    this.members.push({ orchardId: orchard.id, personId: person.id, joinedAt: this.joined() });
  }

  private twinOf(first: DemoOrchard, owner: DemoPerson, name: string): DemoOrchard {
    const twin = { ...first, id: demoId(this.random, first.createdAt), ownerId: owner.id, name };
    twin.latitude = round(first.latitude + 0.0004, 6);
    this.orchards.push(twin);
    this.grows.set(twin.id, [...(this.grows.get(first.id) ?? [])]);
    return twin;
  }

  private orchard(
    owner: DemoPerson,
    name: string,
    along: number,
    elevationM: number,
    place: Place,
  ): DemoOrchard {
    const random = this.random.fork(`place/${this.orchards.length}`);
    const orchard: DemoOrchard = {
      id: demoId(random, owner.createdAt),
      ownerId: owner.id,
      name,
      latitude: round(
        MOUTH.latitude + LENGTH.latitude * along + 0.02 * Math.sin(9 * along) + random.normal(0, 0.006),
        6,
      ),
      longitude: round(MOUTH.longitude + LENGTH.longitude * along + random.normal(0, 0.006), 6),
      elevationM,
      timeZone: TIME_ZONE,
      place,
      createdAt: owner.createdAt,
    };
    this.orchards.push(orchard);
    return orchard;
  }

  private suited(elevationM: number, random: Random): RingSpecies[] {
    const fitting = this.species.filter(({ band }) => band.fromM <= elevationM && elevationM <= band.toM);
    let left = fitting.length > 0 ? fitting : [...this.species];
    const chosen: RingSpecies[] = [];
    for (let number = random.whole(4, 7); number > 0 && left.length > 0; number--) {
      const next = random.weighted(left, ({ grown }) => grown);
      chosen.push(next);
      left = left.filter((species) => species !== next);
    }
    return chosen;
  }

  private climb(elevationM: number): number {
    return Math.max(0, (elevationM - 30) / 1800) ** (1 / CLIMB);
  }

  private freshName(random: Random): string {
    for (let middle = 0; ; middle++) {
      const initial = middle < 20 ? '' : ` ${String.fromCharCode(65 + random.whole(0, 25))}.`;
      const name = `${random.pick(GIVEN_NAMES)}${initial} ${random.pick(FAMILY_NAMES)}`;
      if (this.names.has(name)) continue;
      this.names.add(name);
      return name;
    }
  }

  private joined(): Date {
    return new Date(Date.parse(`${this.since}T09:00:00Z`) + this.people.length * 3_600_000);
  }
}

export function drawPlace(random: Random): Place {
  return {
    sun: random.weighted(['full', 'part', 'shade'] as const, (sun) => ({ full: 6, part: 3, shade: 1 })[sun]),
    wind: random.weighted(
      ['sheltered', 'breezy', 'exposed'] as const,
      (wind) => ({ sheltered: 4, breezy: 4, exposed: 2 })[wind],
    ),
    water: random.weighted(
      ['dry', 'moderate', 'wet'] as const,
      (water) => ({ dry: 3, moderate: 5, wet: 2 })[water],
    ),
  };
}

function round(value: number, digits: number): number {
  return Math.round(value * 10 ** digits) / 10 ** digits;
}
