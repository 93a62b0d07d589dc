import { CASES, type Case, type SeverityClass, type Tip } from '@/lib/severity/severity';
import type { ReadingSums } from './reading';

/** What was seen after such cuts: plain sums over the accepted record, no model. */

/** A reading counts for a time within this many days of it, both ends included. */
export const WINDOW_DAYS = 14;

/** Kinds that are summed up apart, each under its own denominators, in the order they are shown. */
export const OTHER_CUTS = ['pollarding', 'coppicing', 'thinning'] as const;
export type OtherCut = (typeof OTHER_CUTS)[number];
export type SeenKind = 'heading' | 'reduction' | 'none' | OtherCut;

export interface SeenReading extends ReadingSums {
  readonly daysAfterCut: number;
  readonly thinned: boolean;
  /** Set aside by a moderator: kept and shown, and in no sum. */
  readonly setAside: boolean;
}

/** One accepted entry, once, whatever was merged into it; of readings on one day the later in the list stands. */
export interface SeenEntry {
  readonly growerId: string;
  readonly orchardId: string;
  readonly kind: SeenKind;
  readonly severityClass: SeverityClass;
  readonly tip: Tip;
  readonly retainedLengthM: number | null;
  readonly readings: readonly SeenReading[];
}

/** As the API answers it; without an entry the counts are 0 and the rest null. */
export interface Seen {
  readonly entries: number;
  readonly growers: number;
  readonly orchards: number;
  readonly branches: number;
  /** Shoots a branch: all shoots over all branches. */
  readonly rate: number | null;
  /** Standard deviation (n - 1) of the entries' own rates; null for one entry. */
  readonly sd: number | null;
  /** Shoots a metre of retained wood, of the entries that state a retained length over 0. */
  readonly perMetre: number | null;
  /** Share of branches without a shoot, of those counted one by one or with a total of 0. */
  readonly none: number | null;
}

export interface SeenInCase extends Case {
  readonly seen: Seen;
}

export interface SeenOfOtherCut {
  readonly kind: OtherCut;
  readonly entries: number;
  readonly branches: number;
  readonly rate: number | null;
}

export interface SeenOfSpecies {
  /** All nine, in the order of CASES. */
  readonly cases: SeenInCase[];
  /** Kinds of which something was seen. */
  readonly otherCuts: SeenOfOtherCut[];
}

/**
 * Sums up one species at so many weeks after the cut: of each entry the last unthinned reading from 14 days
 * before to 14 days after weeks * 7. An entry whose reading has no branch left is out.
 * @throws RangeError for an entry that is in none of the nine cases.
 */
export function seen(entries: Iterable<SeenEntry>, weeks: number): SeenOfSpecies {
  const tally = new SeenTally(weeks);
  for (const entry of entries) tally.add(entry);
  return tally.result();
}

/** The same taken one entry at a time, for records too many to hold at once. */
export class SeenTally {
  private readonly cases = new Map(CASES.map((one) => [caseKey(one.class, one.tip), new Sums()]));
  private readonly others = new Map(OTHER_CUTS.map((kind) => [kind as SeenKind, new Sums()]));

  constructor(private readonly weeks: number) {
    if (!Number.isFinite(weeks)) throw new RangeError(`${weeks} weeks`);
  }

  add(entry: SeenEntry): void {
    const sums = this.others.get(entry.kind) ?? this.cases.get(caseKey(entry.severityClass, entry.tip));
    if (!sums) throw new RangeError(`no case is ${entry.severityClass} with the tip ${entry.tip}`);
    const reading = readingAt(entry.readings, this.weeks);
    if (reading && reading.branches > 0) sums.add(entry, reading);
  }

  result(): SeenOfSpecies {
    return {
      cases: CASES.map((one) => ({
        ...one,
        seen: (this.cases.get(caseKey(one.class, one.tip)) ?? new Sums()).seen(),
      })),
      otherCuts: OTHER_CUTS.flatMap((kind) => {
        const { entries = 0, branches = 0, rate = null } = this.others.get(kind)?.seen() ?? {};
        return entries > 0 ? [{ kind, entries, branches, rate }] : [];
      }),
    };
  }
}

/** The reading that speaks for an entry at so many weeks: the last in the window that is unthinned and not set aside. */
export function readingAt<R extends Pick<SeenReading, 'daysAfterCut' | 'thinned' | 'setAside'>>(
  readings: readonly R[],
  weeks: number,
): R | null {
  let last: R | null = null;
  for (const reading of readings) {
    if (reading.thinned || reading.setAside) continue;
    if (Math.abs(reading.daysAfterCut - weeks * 7) > WINDOW_DAYS) continue;
    if (last === null || reading.daysAfterCut >= last.daysAfterCut) last = reading;
  }
  return last;
}

class Sums {
  private readonly growers = new Set<string>();
  private readonly orchards = new Set<string>();
  private readonly rates: number[] = [];
  private shoots = 0;
  private branches = 0;
  private measuredShoots = 0;
  private metres = 0;
  private bare = 0;
  private watched = 0;

  add(entry: SeenEntry, { shoots, branches, bare }: ReadingSums): void {
    this.growers.add(entry.growerId);
    this.orchards.add(entry.orchardId);
    this.rates.push(shoots / branches);
    this.shoots += shoots;
    this.branches += branches;
    if (entry.retainedLengthM !== null && entry.retainedLengthM > 0) {
      this.measuredShoots += shoots;
      this.metres += entry.retainedLengthM * branches;
    }
    if (bare !== null) {
      this.bare += bare;
      this.watched += branches;
    }
  }

  seen(): Seen {
    return {
      entries: this.rates.length,
      growers: this.growers.size,
      orchards: this.orchards.size,
      branches: this.branches,
      rate: over(this.shoots, this.branches),
      sd: standardDeviation(this.rates),
      perMetre: over(this.measuredShoots, this.metres),
      none: over(this.bare, this.watched),
    };
  }
}

/** Standard deviation with n - 1; null for fewer than two values. */
export function standardDeviation(values: readonly number[]): number | null {
  if (values.length < 2) return null;
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  const squares = values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  return Math.sqrt(squares / (values.length - 1));
}

function over(part: number, whole: number): number | null {
  return whole > 0 ? part / whole : null;
}

function caseKey(severityClass: SeverityClass, tip: Tip): string {
  return `${severityClass} ${tip}`;
}
