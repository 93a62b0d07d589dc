import { sumsOfCounts, sumsOfTotal } from '@/lib/seen/reading';
import type { SeenEntry, SeenReading } from '@/lib/seen/seen';

let made = 0;

export function reading(
  daysAfterCut: number,
  counts: readonly (number | null)[],
  rest: Partial<SeenReading> = {},
): SeenReading {
  return { daysAfterCut, ...sumsOfCounts(counts), thinned: false, setAside: false, ...rest };
}

export function totalReading(daysAfterCut: number, total: number, branches: number): SeenReading {
  return { daysAfterCut, ...sumsOfTotal(total, branches), thinned: false, setAside: false };
}

/** A heading, heavy, tip removed, by a grower and in an orchard of its own. */
export function entry(readings: readonly SeenReading[], rest: Partial<SeenEntry> = {}): SeenEntry {
  made += 1;
  return {
    growerId: `grower ${made}`,
    orchardId: `orchard ${made}`,
    kind: 'heading',
    severityClass: 'heavy',
    tip: 'removed',
    retainedLengthM: null,
    readings,
    ...rest,
  };
}
