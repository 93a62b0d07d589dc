/** What one reading of an entry amounts to. */

export interface ReadingSums {
  /** Live shoots of all its branches, lost ones left out. */
  readonly shoots: number;
  /** Branches that were counted, lost ones left out. */
  readonly branches: number;
  /** Branches without a shoot; null where a total does not tell. */
  readonly bare: number | null;
}

/** Sums of counts given branch by branch: null is a lost branch, 0 one that died or stayed bare. */
export function sumsOfCounts(counts: readonly (number | null)[]): ReadingSums {
  let shoots = 0;
  let branches = 0;
  let bare = 0;
  for (const count of counts) {
    if (count === null) continue;
    shoots += count;
    branches += 1;
    if (count === 0) bare += 1;
  }
  return { shoots, branches, bare };
}

/** Sums of a reading that has one total over a number of branches. */
export function sumsOfTotal(total: number, branches: number): ReadingSums {
  return { shoots: total, branches, bare: total === 0 ? branches : null };
}

/**
 * Of an entry's readings, whether each is thinned: flush was removed at an earlier visit. Shoots are counted before
 * any are taken off, so the visit itself, and any reading of the same day, is not. Pass all the entry's readings.
 * @param readings with days since the cut and shoots removed at that visit (null where not noted), in any order
 */
export function markThinned(
  readings: readonly { daysAfterCut: number; removed: number | null }[],
): boolean[] {
  let first = Infinity;
  for (const { daysAfterCut, removed } of readings) {
    if ((removed ?? 0) > 0) first = Math.min(first, daysAfterCut);
  }
  return readings.map(({ daysAfterCut }) => daysAfterCut > first);
}
