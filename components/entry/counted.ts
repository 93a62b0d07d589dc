import { countsSummary } from '@/lib/counts/summary';
import type { Counted } from '@/lib/counts/parse';
import type { ReadingView } from '@/lib/entries/schema';

/** What was counted at a visit, or null where nothing was noted yet. */
export function countedOf(reading: ReadingView): Counted | null {
  if (reading.counts) return { counts: reading.counts };
  if (reading.total !== null && reading.branches !== null)
    return { total: reading.total, branches: reading.branches };
  return null;
}

/** Shoots a branch at this visit, or null. */
export function countedMean(reading: ReadingView): number | null {
  const counted = countedOf(reading);
  return counted ? countsSummary(counted).mean : null;
}
