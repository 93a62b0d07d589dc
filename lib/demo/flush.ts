import type { EntryContent, Reading } from '@/lib/entries/schema';
import { addDays, daysBetween, evening } from './calendar';
import { demoId } from './ids';
import { gaussianBelow, negativeBinomialQuantile } from './negative-binomial';
import type { Random } from './random';
import { ringSpecies } from './species';
import { TRUTH, logMean } from './truth';

/** One marked branch through all its visits. */
interface Branch {
  /** Its own luck, the same at every visit. */
  readonly luck: number;
  /** Visit from which it is broken off, or died back; Infinity for one that stands. */
  readonly lostFrom: number;
  readonly deadFrom: number;
  /** Shoots left on it when the flush was thinned. */
  kept: number | null;
}

export interface Hand {
  readonly seed: number;
  readonly entryId: string;
  readonly ownerId: string;
  readonly today: string;
  /** Whether its readings may be thinned, lost branches and totals: small differences between hands. */
  readonly plain?: boolean;
}

/** The readings of these days after the cut: each branch keeps its luck from one visit to the next. */
export function drawReadings(
  random: Random,
  hand: Hand,
  content: EntryContent,
  days: readonly number[],
): Reading[] {
  const { date, branches: marked, severity } = content.cut;
  if (date === null || marked === null || severity === null) throw new Error('a reading needs its cut');
  const branches = Array.from({ length: marked }, () =>
    drawBranch(random, severity, days.length, hand.plain ?? false),
  );
  const thinAt = thinningVisit(random, days, content, hand.plain ?? false);
  const asTotal = !hand.plain && random.chance(0.06);
  const reach = Math.exp(random.normal(0, 0.2));
  return days.map((day, visit) => {
    const mean = Math.exp(logMean(hand.seed, hand.entryId, hand.ownerId, content, day / 7));
    const counts = branches.map((branch) => countOf(random, branch, visit, mean));
    const reading = emptyReading(random, addDays(date, day), hand.today);
    measure(random, reading, content, { counts, weeks: day / 7, visit, branches, reach });
    if (visit === thinAt) thin(random, reading, branches, counts);
    return asTotal && !counts.includes(null) ? inTotal(reading, counts) : { ...reading, counts };
  });
}

function drawBranch(random: Random, severity: number, visits: number, plain: boolean): Branch {
  const luck = random.normal();
  const lost = random.chance(0.02);
  const dead = random.chance(severity > 0.5 ? 0.035 : severity > 0 ? 0.012 : 0.003);
  const from = random.whole(0, visits);
  return {
    luck,
    lostFrom: lost && !plain ? Math.max(1, from) : Infinity,
    deadFrom: dead ? from : Infinity,
    kept: null,
  };
}

function countOf(random: Random, branch: Branch, visit: number, mean: number): number | null {
  const fresh = random.normal();
  if (visit >= branch.lostFrom) return null;
  if (visit >= branch.deadFrom) return 0;
  const share = gaussianBelow(Math.sqrt(TRUTH.lasting) * branch.luck + Math.sqrt(1 - TRUTH.lasting) * fresh);
  // After a thinning a few more rise beside what was kept.
  if (branch.kept !== null) return branch.kept + negativeBinomialQuantile(share, mean * 0.15, TRUTH.theta);
  return negativeBinomialQuantile(share, mean, TRUTH.theta);
}

/** One visit's counts, and how far this entry's shoots reach against their species' usual. */
interface Visit {
  readonly counts: readonly (number | null)[];
  readonly weeks: number;
  readonly visit: number;
  readonly branches: readonly Branch[];
  readonly reach: number;
}

function measure(
  random: Random,
  reading: Reading,
  content: EntryContent,
  { counts, weeks, visit, branches, reach }: Visit,
): void {
  const shoots = counts.reduce<number>((sum, count) => sum + (count ?? 0), 0);
  const vigourM = ringSpecies(content.species ?? '').vigourM;
  const cut = content.cut.tip === 'removed' ? 1 : 0.6;
  if (shoots > 0 && random.chance(0.65)) {
    const lengthM = vigourM * cut * (1 - Math.exp(-weeks / 11)) * reach;
    reading.longestShoot = Math.max(0.02, Math.round(lengthM * 100) / 100);
  }
  const died = branches.some((branch) => visit >= branch.deadFrom && visit < branch.lostFrom);
  if (died && content.cut.retainedLength !== null) reading.dieback = content.cut.retainedLength;
  else if (!died && random.chance(0.35)) reading.dieback = random.chance(0.8) ? 0 : random.whole(1, 6) / 100;
  if (branches.some((branch) => visit === branch.lostFrom) && random.chance(0.7)) {
    reading.note = random.pick(LOST);
  } else if (died && random.chance(0.5)) {
    reading.note = random.pick(DIED);
  }
}

const LOST = [
  'One broke off in the wind; left out.',
  'Goats had one of them, so a dash for that.',
  'One marked branch came off under the fruit.',
  'One gone: the tape lay on the ground.',
];
const DIED = [
  'One is dry to the fork: zero.',
  'One died back. Counted as nothing.',
  'Bark loose on one, no live bud on it.',
];

function thin(
  random: Random,
  reading: Reading,
  branches: readonly Branch[],
  counts: readonly (number | null)[],
): void {
  const most = random.whole(2, 3);
  let kept = 0;
  let removed = 0;
  branches.forEach((branch, index) => {
    const count = counts[index];
    if (count == null) return;
    branch.kept = Math.min(count, most);
    kept += branch.kept;
    removed += count - branch.kept;
  });
  if (removed === 0) return branches.forEach((branch) => void (branch.kept = null));
  Object.assign(reading, { removed, kept });
}

/** The visit at which the flush is thinned: the one nearest eight weeks, in one entry of six. */
function thinningVisit(
  random: Random,
  days: readonly number[],
  { cut }: EntryContent,
  plain: boolean,
): number | null {
  const ready = days.findIndex((day) => day >= 45);
  const wanted =
    random.chance(0.17) && cut.tip === 'removed' && (cut.kind === 'heading' || cut.kind === 'reduction');
  return wanted && !plain && ready >= 0 ? ready : null;
}

export function emptyReading(random: Random, date: string, today: string): Reading {
  return {
    id: demoId(random, evening(date, random.whole(0, 200), today)),
    date,
    dateApproximate: null,
    counts: null,
    total: null,
    branches: null,
    longestShoot: null,
    dieback: null,
    removed: null,
    kept: null,
    note: null,
  };
}

function inTotal(reading: Reading, counts: readonly (number | null)[]): Reading {
  const total = counts.reduce<number>((sum, count) => sum + (count ?? 0), 0);
  return { ...reading, total, branches: counts.length };
}

const VISITS: Record<number, number[][]> = {
  1: [[8], [8], [8], [12], [4]],
  2: [
    [4, 8],
    [8, 26],
    [8, 12],
    [8, 26],
  ],
  3: [
    [4, 8, 12],
    [4, 8, 26],
    [8, 12, 26],
  ],
  4: [[4, 8, 12, 26]],
};

/** Days after the cut on which somebody came back: near 4, 8, 12 and 26 weeks, none after `latest`. */
export function drawVisits(random: Random, cutDate: string, latest: string): number[] {
  const number = random.weighted([1, 2, 3, 4], (n) => [0, 22, 33, 28, 17][n] ?? 0);
  const spread: Record<number, number> = { 4: 3, 8: 3.5, 12: 5, 26: 8 };
  const longest = daysBetween(cutDate, latest);
  const days = random.pick(VISITS[number] ?? [[8]]).map((weeks) => {
    const days = Math.round(random.normal(weeks * 7, spread[weeks]));
    return Math.max(weeks * 7 - 10, Math.min(weeks * 7 + 12, days));
  });
  const past = days.filter((day) => day <= longest);
  return past.length > 0 ? past : [longest];
}
