import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatCounts, parseCounts, type Counted } from '@/lib/counts/parse';
import { countsInWords, countsSummary } from '@/lib/counts/summary';

const counts = (typed: string, marked?: number) => {
  const parsed = parseCounts(typed, marked ?? null);
  return parsed.ok ? parsed.value : parsed.message;
};

describe('counts as they are shouted down a ladder', () => {
  it.each([
    ['7 9 - 11', [7, 9, null, 11]],
    ['7, 9, -, 11', [7, 9, null, 11]],
    ['7,9,4,11', [7, 9, 4, 11]],
    ['7;9;x;11', [7, 9, null, 11]],
    ['7 + 9 + LOST + 11', [7, 9, null, 11]],
    ['  7\t9 – 11 ', [7, 9, null, 11]],
    ['7 9 — 11', [7, 9, null, 11]],
    ['0', [0]],
    ['0 0 0', [0, 0, 0]],
    ['-', [null]],
    ['999', [999]],
  ])('“%s” is one number a branch', (typed, expected) => {
    expect(counts(typed)).toEqual({ counts: expected });
  });

  it.each([
    ['31 on 4', 31, 4],
    ['31/4', 31, 4],
    ['31 / 4', 31, 4],
    ['31 on 4 branches', 31, 4],
    ['0 on 1 branch', 0, 1],
  ])('“%s” is a total with its branches', (typed, total, branches) => {
    expect(counts(typed)).toEqual({ total, branches });
  });

  it('nothing typed is nothing, not zero', () => {
    expect(counts('   ')).toBeNull();
  });

  it.each([
    ['1000', /999 at most/],
    ['7 -3', /lost branch/],
    ['7 9.5', /whole shoots/],
    ['7 .5', /whole shoots/],
    ['many', /not a count/],
    ['7-9', /not a count/],
    ['31 on 0', /1 or more/],
    ['5000 on 4', /999 a branch/],
    [',;+', /number for each branch/],
    ['99999999', /at most/],
  ])('“%s” cannot be, and the refusal says why', (typed, message) => {
    expect(counts(typed)).toMatch(message);
  });

  it('more counts than branches were marked cannot be', () => {
    expect(counts('1 2 3', 2)).toMatch(/counts for 3 branches, but 2 were marked/);
    expect(counts('9 on 3', 2)).toMatch(/3 branches/);
    expect(counts('1 2', 2)).toEqual({ counts: [1, 2] });
    expect(counts('1', 2)).toEqual({ counts: [1] });
  });

  const counted: fc.Arbitrary<Counted> = fc.oneof(
    fc.record({
      counts: fc.array(fc.option(fc.integer({ min: 0, max: 999 })), { minLength: 1, maxLength: 500 }),
    }),
    fc
      .integer({ min: 1, max: 500 })
      .chain((branches) =>
        fc.record({ total: fc.integer({ min: 0, max: 999 * branches }), branches: fc.constant(branches) }),
      ),
  );

  it('what is written down is read back as the same counts', () => {
    fc.assert(
      fc.property(counted, (value) => {
        expect(counts(formatCounts(value))).toEqual(value);
      }),
    );
  });

  it('no text whatever breaks it, and no count that cannot be comes out', () => {
    fc.assert(
      fc.property(fc.string({ unit: fc.constantFrom(...'0123456789 ,;+-–x./on lost') }), (typed) => {
        const parsed = parseCounts(typed);
        if (!parsed.ok || !parsed.value || !('counts' in parsed.value)) return;
        for (const count of parsed.value.counts) {
          expect(count === null || (Number.isInteger(count) && count >= 0 && count <= 999)).toBe(true);
        }
      }),
    );
  });
});

describe('what the counts come to', () => {
  it('leaves lost branches out of the mean and bare ones in', () => {
    expect(countsSummary({ counts: [7, null, 0, 11] })).toEqual({ sum: 18, branches: 3, lost: 1, mean: 6 });
  });

  it.each<[Counted, string]>([
    [{ counts: [7, 9, 4, 11] }, '31 on 4 branches, 7.8 each'],
    [{ counts: [7, null, 4] }, '11 on 2 branches, 5.5 each, 1 lost'],
    [{ counts: [0] }, '0 on 1 branch'],
    [{ counts: [null, null] }, 'All 2 branches were lost'],
    [{ total: 31, branches: 4 }, '31 on 4 branches, 7.8 each'],
  ])('%j is said as “%s”', (value, words) => {
    expect(countsInWords(value)).toBe(words);
  });
});
