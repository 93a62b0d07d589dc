import { describe, expect, it } from 'vitest';
import { daysBetween } from '@/lib/demo/calendar';
import { generateDemo } from '@/lib/demo/generate';
import { TRUTH } from '@/lib/demo/truth';
import type { EntryContent } from '@/lib/entries/schema';
import { thinnedReadings } from '@/lib/entries/consistency';
import { severityClass } from '@/lib/severity/severity';

/** Directions are trade facts (common practice): tip removed flushes more; eight weeks sees it near its full count. */
const demo = generateDemo({ seed: 3, today: '2026-12-01', entries: 6000 });
const rows = demo.entries
  .filter(({ status, origin }) => status === 'accepted' && origin !== 'per-tree')
  .flatMap(({ content, id }) => {
    const thinned = thinnedReadings(content.readings);
    return content.readings
      .filter((reading) => !thinned.has(reading.id) && reading.counts !== null)
      .map((reading) => ({
        id,
        content,
        weeks: daysBetween(content.cut.date ?? '', reading.date ?? '') / 7,
        counts: reading.counts ?? [],
      }));
  });
const modelled = rows.filter(({ content }) =>
  ['heading', 'reduction', 'none'].includes(content.cut.kind ?? ''),
);

function rate(where: (content: EntryContent, weeks: number) => boolean): number {
  const counts = modelled
    .filter(({ content, weeks }) => where(content, weeks))
    .flatMap((row) => row.counts.filter((count) => count !== null));
  expect(counts.length).toBeGreaterThan(100);
  return counts.reduce((sum, count) => sum + count, 0) / counts.length;
}
const near = (weeks: number, at: number) => Math.abs(weeks - at) <= 1.5;
const classOf = ({ cut }: EntryContent) => severityClass(cut.severity ?? 0);

describe('the demo tells what the trade tells', () => {
  it.each(['light', 'moderate', 'heavy', 'severe'])(
    '%s: more shoots with the tip removed than kept',
    (depth) => {
      const at = (tip: string) =>
        rate((content, weeks) => near(weeks, 8) && classOf(content) === depth && content.cut.tip === tip);
      expect(at('removed')).toBeGreaterThan(1.2 * at('kept'));
    },
  );

  it('an uncut control makes fewer than any cut', () => {
    const uncut = rate((content, weeks) => near(weeks, 8) && classOf(content) === 'uncut');
    expect(uncut).toBeLessThan(
      rate((content, weeks) => near(weeks, 8) && classOf(content) === 'light' && content.cut.tip === 'kept'),
    );
  });

  it('counts rise to eight weeks and are near full there', () => {
    const four = rate((_, weeks) => near(weeks, 4));
    const eight = rate((_, weeks) => near(weeks, 8));
    const twelve = rate((_, weeks) => near(weeks, 12));
    expect(four).toBeLessThan(0.85 * eight);
    expect(Math.abs(twelve / eight - 1)).toBeLessThan(0.2);
  });

  it('soft wood flushes more than hard, and shade less than sun', () => {
    expect(TRUTH.wood.soft).toBeGreaterThan(TRUTH.wood.hard);
    const sun = rate((content, weeks) => near(weeks, 8) && content.place.sun === 'full');
    expect(rate((content, weeks) => near(weeks, 8) && content.place.sun === 'shade')).toBeLessThan(sun);
  });

  it('counts spread wider than Poisson: the variance is over twice the mean', () => {
    const counts = modelled
      .filter(({ weeks }) => near(weeks, 8))
      .flatMap((row) => row.counts.filter((count) => count !== null));
    const mean = counts.reduce((sum, count) => sum + count, 0) / counts.length;
    const variance = counts.reduce((sum, count) => sum + (count - mean) ** 2, 0) / counts.length;
    expect(variance).toBeGreaterThan(2 * mean);
  });

  it('branches of one tree keep their differences from visit to visit', () => {
    const byEntry = new Map<string, typeof modelled>();
    for (const row of modelled) byEntry.set(row.id, [...(byEntry.get(row.id) ?? []), row]);
    let pairs = 0;
    let kept = 0;
    for (const [first, second] of [...byEntry.values()]) {
      if (!first || !second) continue;
      const best = Math.max(...first.counts.map((count) => count ?? 0));
      const worst = Math.min(...first.counts.map((count) => count ?? 0));
      const at = (value: number) => second.counts[first.counts.indexOf(value)] ?? null;
      const [later, earlier] = [at(best), at(worst)];
      if (best - worst < 4 || later === null || earlier === null) continue;
      pairs++;
      if (later > earlier) kept++;
    }
    expect(pairs).toBeGreaterThan(500);
    expect(kept / pairs).toBeGreaterThan(0.85);
  });
});
