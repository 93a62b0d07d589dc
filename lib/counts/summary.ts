import type { Counted } from './parse';

export interface CountsSummary {
  readonly sum: number;
  /** Branches that were counted: lost ones are no part of it, bare ones are. */
  readonly branches: number;
  readonly lost: number;
  /** Shoots a counted branch; null where every branch was lost. */
  readonly mean: number | null;
}

export function countsSummary(counted: Counted): CountsSummary {
  if ('total' in counted) {
    const { total, branches } = counted;
    return { sum: total, branches, lost: 0, mean: total / branches };
  }
  const alive = counted.counts.filter((count) => count !== null);
  const sum = alive.reduce((all, count) => all + count, 0);
  const lost = counted.counts.length - alive.length;
  return { sum, branches: alive.length, lost, mean: alive.length > 0 ? sum / alive.length : null };
}

/** "31 on 4 branches, 7.8 each" and, where it is so, "1 lost". */
export function countsInWords(counted: Counted): string {
  const { sum, branches, lost, mean } = countsSummary(counted);
  const lostToo = lost > 0 ? [`${lost} lost`] : [];
  if (mean === null) return lost === 1 ? 'The branch was lost' : `All ${lost} branches were lost`;
  const each = branches > 1 ? [`${mean.toFixed(1)} each`] : [];
  return [`${sum} on ${branches === 1 ? '1 branch' : `${branches} branches`}`, ...each, ...lostToo].join(
    ', ',
  );
}
