import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sumUpPlants, wilson95, type CutPlant } from '@/lib/seen/plants';

const plant = (resprouted: boolean | null, shoots: number | null, group: string | null = null): CutPlant => ({
  resprouted,
  shoots,
  group,
});

describe('plants that were cut', () => {
  it('are summed up per plant that resprouted and per plant cut (by hand)', () => {
    const { all } = sumUpPlants([
      plant(true, 4),
      plant(true, 8),
      plant(true, null),
      plant(false, 0),
      plant(false, null),
      plant(null, null),
      plant(null, 7),
    ]);
    expect(all).toMatchObject({ cut: 5, resprouted: 3, share: 0.6 });
    expect(all.perResprouting).toEqual({ n: 2, mean: 6, sd: Math.sqrt(8) });
    expect(all.perCut).toEqual({ n: 4, mean: 3, sd: Math.sqrt((1 + 25 + 9 + 9) / 3) });
  });

  it('that died have no shoot, whatever their count says', () => {
    expect(sumUpPlants([plant(false, 5), plant(true, 5)]).all.perCut.mean).toBe(2.5);
  });

  it('of nobody knows what fate give no figure at all', () => {
    const none = { n: 0, mean: null, sd: null };
    expect(sumUpPlants([plant(null, 3)]).all).toEqual({
      cut: 0,
      resprouted: 0,
      share: null,
      wilson95: null,
      perResprouting: none,
      perCut: none,
    });
  });

  it('stand in their groups, whatever those are called', () => {
    const { groups } = sumUpPlants([
      plant(true, 3, '__proto__'),
      plant(false, 0, 'La Vall, "d\'Or"'),
      plant(true, 1),
    ]);
    expect(Object.keys(groups)).toEqual(['__proto__', 'La Vall, "d\'Or"']);
    expect(groups['La Vall, "d\'Or"']).toMatchObject({
      cut: 1,
      resprouted: 0,
      share: 0,
      perResprouting: { n: 0, mean: null, sd: null },
      perCut: { n: 1, mean: 0, sd: null },
    });
  });

  it('never give a number that JSON does not have', () => {
    const anyPlant = fc.record({
      resprouted: fc.option(fc.boolean()),
      shoots: fc.option(fc.nat(500)),
      group: fc.option(fc.string({ maxLength: 3 })),
    });
    const check = (value: unknown): void => {
      if (typeof value === 'number') expect(Number.isFinite(value)).toBe(true);
      else if (value !== null && typeof value === 'object') Object.values(value).forEach(check);
    };
    fc.assert(fc.property(fc.array(anyPlant), (plants) => check(sumUpPlants(plants))));
  });
});

describe("Wilson's interval", () => {
  it('is the textbook one for 81 of 263 (Newcombe 1998, Stat. Med. 17:857-872, table I, method 3: 0.2553, 0.3662; from memory)', () => {
    const [low, high] = wilson95(81, 263) ?? [0, 0];
    expect(low.toFixed(4)).toBe('0.2553');
    expect(high.toFixed(4)).toBe('0.3662');
  });

  it('ends at 0 for none and at 1 for all', () => {
    expect(wilson95(0, 10)?.[0]).toBe(0);
    expect(wilson95(10, 10)?.[1]).toBe(1);
    expect(wilson95(0, 0)).toBeNull();
  });

  it('holds the share between its ends, within 0 and 1', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 5000 }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (all, part) => {
          const some = Math.round(all * part);
          const [low, high] = wilson95(some, all) ?? [NaN, NaN];
          expect(low).toBeGreaterThanOrEqual(0);
          expect(high).toBeLessThanOrEqual(1);
          expect(low).toBeLessThanOrEqual(some / all);
          expect(high).toBeGreaterThanOrEqual(some / all);
        },
      ),
    );
  });
});
