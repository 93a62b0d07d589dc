import { standardDeviation } from './seen';

/** Sums over whole plants that were cut: one plant is one observation, its living shoots at a later visit. */

export interface CutPlant {
  /** Whether it was alive and sprouting at the visit; null where nobody knows. */
  readonly resprouted: boolean | null;
  /** Shoots counted on it; null where nobody counted. */
  readonly shoots: number | null;
  readonly group: string | null;
}

export interface CountSummary {
  readonly n: number;
  readonly mean: number | null;
  /** With n - 1; null for fewer than two. */
  readonly sd: number | null;
}

export interface PlantsSummary {
  /** Plants whose fate is known. */
  readonly cut: number;
  readonly resprouted: number;
  readonly share: number | null;
  /** Score interval of the share, without continuity correction (Wilson 1927, J. Am. Stat. Assoc. 22:209-212). */
  readonly wilson95: [low: number, high: number] | null;
  /** Shoots a plant that resprouted, of those that were counted. */
  readonly perResprouting: CountSummary;
  /** Shoots a plant cut: one that died has 0, one that lived uncounted is left out. */
  readonly perCut: CountSummary;
}

/**
 * Sums up plants of known fate, all together and group by group (none without a `group`, in the order met).
 * A plant of unknown fate is in no denominator.
 */
export function sumUpPlants(plants: readonly CutPlant[]): {
  all: PlantsSummary;
  groups: Record<string, PlantsSummary>;
} {
  const groups = new Map<string, CutPlant[]>();
  for (const plant of plants) {
    if (plant.group === null) continue;
    const members = groups.get(plant.group);
    if (members) members.push(plant);
    else groups.set(plant.group, [plant]);
  }
  return {
    all: summary(plants),
    groups: Object.fromEntries([...groups].map(([name, members]) => [name, summary(members)])),
  };
}

function summary(plants: readonly CutPlant[]): PlantsSummary {
  const known = plants.filter(({ resprouted }) => resprouted !== null);
  const alive = known.filter(({ resprouted }) => resprouted);
  const counted = alive.flatMap(({ shoots }) => (shoots === null ? [] : [shoots]));
  const dead = known.length - alive.length;
  return {
    cut: known.length,
    resprouted: alive.length,
    share: known.length > 0 ? alive.length / known.length : null,
    wilson95: wilson95(alive.length, known.length),
    perResprouting: countSummary(counted),
    perCut: countSummary([...counted, ...new Array<number>(dead).fill(0)]),
  };
}

function countSummary(counts: readonly number[]): CountSummary {
  const n = counts.length;
  const mean = n > 0 ? counts.reduce((sum, count) => sum + count, 0) / n : null;
  return { n, mean, sd: standardDeviation(counts) };
}

const NORMAL_975 = 1.959963984540054;

/** Wilson's 95 % interval of `some` out of `all`; null of none. */
export function wilson95(some: number, all: number): [low: number, high: number] | null {
  if (all === 0) return null;
  const share = some / all;
  const square = NORMAL_975 ** 2;
  const middle = (share + square / (2 * all)) / (1 + square / all);
  const half =
    (NORMAL_975 / (1 + square / all)) * Math.sqrt((share * (1 - share)) / all + square / (4 * all ** 2));
  return [some === 0 ? 0 : middle - half, some === all ? 1 : middle + half];
}
