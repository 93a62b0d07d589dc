import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { questionHref, readQuestion } from '@/lib/cases/question';
import { denominators, isThin, nearestCases, thinWords } from '@/lib/cases/standing';
import type { SpeciesCase } from '@/lib/cases/schema';
import { CASES } from '@/lib/severity/severity';

const seen = (entries: number, growers = entries) => ({
  entries,
  growers,
  orchards: growers,
  branches: entries * 4,
  rate: entries > 0 ? 5 : null,
  sd: null,
  perMetre: null,
  none: null,
});
const cases = (counts: readonly number[]): SpeciesCase[] =>
  CASES.map((one, index) => ({ ...one, seen: seen(counts[index] ?? 0), expected: null }));

describe('the question in the address', () => {
  it('comes back from the address it makes', () => {
    const question = readQuestion({
      species: 'malus-domestica',
      severity: '0.333333',
      tip: 'kept',
      weeks: '12',
    });
    expect(question).toMatchObject({ species: 'malus-domestica', class: 'moderate', tip: 'kept', weeks: 12 });
    const params = Object.fromEntries(new URL(questionHref(question), 'http://x').searchParams);
    expect(readQuestion(params)).toEqual(question);
  });

  it('keeps the tip of a branch that is not cut', () => {
    expect(readQuestion({ severity: '0', tip: 'removed' })).toMatchObject({ class: 'uncut', tip: 'kept' });
  });

  it('never fails, whatever stands there', () => {
    const value = fc.oneof(fc.string(), fc.array(fc.string(), { maxLength: 2 }), fc.constant(undefined));
    fc.assert(
      fc.property(fc.record({ species: value, severity: value, tip: value, weeks: value }), (params) => {
        const { weeks, severity } = readQuestion(params);
        return weeks >= 1 && weeks <= 104 && severity >= 0 && severity <= 1;
      }),
    );
  });
});

describe('what stands behind a figure', () => {
  it('is named by its denominators', () => {
    expect(denominators(seen(1))).toBe('4 branches in 1 record by 1 grower in 1 orchard');
  });

  it('is called thin under five records, or with one grower', () => {
    expect([isThin(seen(4)), isThin(seen(9, 1)), isThin(seen(5))]).toEqual([true, true, false]);
    expect(thinWords(seen(5))).toBe('');
    expect(thinWords(seen(1))).toContain('story');
  });
});

describe('the nearest cases to one that nobody recorded', () => {
  it('are of the same species, same tip and depth first, and hold records', () => {
    // uncut | light kept, removed | moderate kept, removed | heavy kept, removed | severe kept, removed
    const all = cases([3, 0, 2, 0, 6, 9, 0, 0, 1]);
    const asked = all.findIndex((one) => one.class === 'heavy' && one.tip === 'removed');
    expect(nearestCases(all, asked).map((one) => `${one.class} ${one.tip}`)).toEqual([
      'moderate removed',
      'severe removed',
      'heavy kept',
    ]);
  });

  it('are none where the species has no record', () => {
    expect(nearestCases(cases([]), 3)).toEqual([]);
  });
});
