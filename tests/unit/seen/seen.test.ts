import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CASES } from '@/lib/severity/severity';
import { markThinned, sumsOfCounts, sumsOfTotal } from '@/lib/seen/reading';
import { seen, SeenTally, type SeenEntry } from '@/lib/seen/seen';
import { entry, reading, totalReading } from './entries';

const heavy = (entries: SeenEntry[], weeks = 8) => {
  const found = seen(entries, weeks).cases.find((one) => one.class === 'heavy' && one.tip === 'removed');
  if (!found) throw new Error('no such case');
  return found.seen;
};
const NOTHING = {
  entries: 0,
  growers: 0,
  orchards: 0,
  branches: 0,
  rate: null,
  sd: null,
  perMetre: null,
  none: null,
};

describe('what was seen in a case', () => {
  it('is all shoots over all branches, with the figures beside it (by hand)', () => {
    const figures = heavy([
      entry([reading(56, [7, null, 4, 11])], { growerId: 'g', orchardId: 'o', retainedLengthM: 2 }),
      entry([reading(58, [0, 3])], { growerId: 'g', orchardId: 'p' }),
      entry([totalReading(49, 20, 4)], { growerId: 'h', orchardId: 'p', retainedLengthM: 0.5 }),
    ]);
    // 22 on 3, 3 on 2, 20 on 4: 45 on 9; own rates 22/3, 3/2, 5 with mean 83/18;
    // squares (49^2 + 56^2 + 7^2)/18^2 = 5586/324; metres 2*3 + 0.5*4 = 8 under 42; one bare of 5 counted singly.
    expect(figures).toMatchObject({ entries: 3, growers: 2, orchards: 2, branches: 9, rate: 5 });
    expect(figures.sd).toBeCloseTo(Math.sqrt(5586 / 324 / 2), 12);
    expect(figures.perMetre).toBe(42 / 8);
    expect(figures.none).toBe(1 / 5);
  });

  it('stands for all nine cases, empty ones too', () => {
    const { cases, otherCuts } = seen([], 8);
    expect(cases).toEqual(CASES.map((one) => ({ ...one, seen: NOTHING })));
    expect(otherCuts).toEqual([]);
  });

  it('puts each entry into its own case and no other', () => {
    const entries = CASES.map((one, index) =>
      entry([reading(56, [index])], {
        severityClass: one.class,
        tip: one.tip,
        kind: one.class === 'uncut' ? 'none' : index % 2 ? 'heading' : 'reduction',
      }),
    );
    expect(seen(entries, 8).cases.map((one) => one.seen.rate)).toEqual([0, 1, 2, 3, 4, 5, 6, 7, 8]);
  });

  it('has no deviation for one entry, and one for two', () => {
    expect(heavy([entry([reading(56, [3, 9])])]).sd).toBeNull();
    expect(heavy([entry([reading(56, [3])]), entry([reading(56, [5])])]).sd).toBeCloseTo(Math.SQRT2, 12);
  });

  it('knows of bare branches only where they were counted singly or the total is 0', () => {
    expect(heavy([entry([totalReading(56, 12, 4)])]).none).toBeNull();
    expect(heavy([entry([totalReading(56, 0, 4)])]).none).toBe(1);
    expect(heavy([entry([totalReading(56, 0, 4)]), entry([reading(56, [1, 2])])]).none).toBe(4 / 6);
  });

  it('has no figure a metre where no retained length is known', () => {
    expect(
      heavy([entry([reading(56, [3])]), entry([reading(56, [3])], { retainedLengthM: 0 })]).perMetre,
    ).toBeNull();
  });

  it('refuses an entry that is in none of the nine cases', () => {
    expect(() => seen([entry([reading(56, [1])], { severityClass: 'uncut' })], 8)).toThrow(RangeError);
  });
});

describe('the reading that speaks for an entry', () => {
  it.each([
    [41, null],
    [42, 5],
    [56, 5],
    [70, 5],
    [71, null],
  ])('lies 14 days or less from the time asked for (day %d of 8 weeks)', (day, rate) => {
    expect(heavy([entry([reading(day, [5])])]).rate).toBe(rate);
  });

  it('is the last in the window, in whatever order they come', () => {
    const readings = [reading(45, [1]), reading(66, [9]), reading(56, [4]), reading(90, [30])];
    expect(heavy([entry(readings)]).rate).toBe(9);
    expect(heavy([entry([...readings].reverse())]).rate).toBe(9);
  });

  it('is neither thinned nor set aside', () => {
    const readings = [
      reading(50, [4]),
      reading(60, [9], { setAside: true }),
      reading(68, [2], { thinned: true }),
    ];
    expect(heavy([entry(readings)]).rate).toBe(4);
  });

  it('takes its entry out where no branch was left', () => {
    expect(heavy([entry([reading(50, [4]), reading(60, [null, null])])])).toEqual(NOTHING);
  });

  it('is another one at another time', () => {
    const one = entry([reading(28, [2]), reading(84, [8])]);
    expect(heavy([one], 4).rate).toBe(2);
    expect(heavy([one], 12).rate).toBe(8);
    expect(heavy([one], 8).rate).toBeNull();
  });
});

describe('other cuts', () => {
  it('are summed up apart, each under its own denominator, and only where there are some', () => {
    const { cases, otherCuts } = seen(
      [
        entry([reading(56, [4, 6])], { kind: 'coppicing', severityClass: 'severe' }),
        entry([reading(56, [20])], { kind: 'coppicing', severityClass: 'severe' }),
        entry([reading(56, [1, null])], { kind: 'pollarding' }),
        entry([reading(200, [1])], { kind: 'thinning' }),
      ],
      8,
    );
    expect(otherCuts).toEqual([
      { kind: 'pollarding', entries: 1, branches: 1, rate: 1 },
      { kind: 'coppicing', entries: 2, branches: 3, rate: 10 },
    ]);
    expect(cases.every((one) => one.seen.entries === 0)).toBe(true);
  });
});

describe('thinned', () => {
  it('is every reading after the day that flush was removed, not that day', () => {
    const readings = [
      { daysAfterCut: 56, removed: 0 },
      { daysAfterCut: 90, removed: null },
      { daysAfterCut: 70, removed: 3 },
      { daysAfterCut: 70, removed: null },
      { daysAfterCut: 71, removed: null },
    ];
    expect(markThinned(readings)).toEqual([false, true, false, false, true]);
    expect(markThinned(readings.slice(0, 2))).toEqual([false, false]);
  });
});

describe('sums of a reading', () => {
  it('leave lost branches out and keep bare ones in', () => {
    expect(sumsOfCounts([7, null, 0, 11])).toEqual({ shoots: 18, branches: 3, bare: 1 });
    expect(sumsOfCounts([null])).toEqual({ shoots: 0, branches: 0, bare: 0 });
    expect(sumsOfTotal(9, 3)).toEqual({ shoots: 9, branches: 3, bare: null });
    expect(sumsOfTotal(0, 3)).toEqual({ shoots: 0, branches: 3, bare: 3 });
  });
});

describe('for any record', () => {
  const counts = fc.array(fc.option(fc.integer({ min: 0, max: 40 })), { minLength: 1, maxLength: 6 });
  const anyReading = fc
    .record({ day: fc.integer({ min: 0, max: 120 }), counts, thinned: fc.boolean(), setAside: fc.boolean() })
    .map(({ day, counts: list, thinned, setAside }) => reading(day, list, { thinned, setAside }));
  const anyEntry = fc
    .record({
      readings: fc.uniqueArray(anyReading, { maxLength: 4, selector: (one) => one.daysAfterCut }),
      one: fc.constantFrom(...CASES),
      kind: fc.constantFrom('heading', 'reduction', 'coppicing', 'thinning'),
      retainedLengthM: fc.option(fc.integer({ min: 1, max: 16 }).map((quarters) => quarters / 4)),
      growerId: fc.constantFrom('a', 'b', 'c'),
      orchardId: fc.constantFrom('o', 'p'),
    })
    .map(({ readings, one, kind, ...rest }) =>
      entry(readings, { ...rest, severityClass: one.class, tip: one.tip, kind } as Partial<SeenEntry>),
    );
  const record = fc.array(anyEntry, { maxLength: 25 });

  /** To twelve decimals: sums of deviations may differ in their last digit by the order they are taken in. */
  const rounded = (value: unknown) =>
    JSON.parse(JSON.stringify(value), (_, one: unknown) =>
      typeof one === 'number' ? Number(one.toFixed(9)) : one,
    );

  it('the order of entries does not matter, nor whether they come one by one', () => {
    fc.assert(
      fc.property(record, (entries) => {
        const tally = new SeenTally(8);
        for (const one of [...entries].reverse()) tally.add(one);
        expect(rounded(tally.result())).toEqual(rounded(seen(entries, 8)));
      }),
    );
  });

  it('thinned readings and those set aside never matter', () => {
    fc.assert(
      fc.property(record, (entries) => {
        const without = entries.map((one) => ({
          ...one,
          readings: one.readings.filter(({ thinned, setAside }) => !thinned && !setAside),
        }));
        expect(seen(without, 8)).toEqual(seen(entries, 8));
      }),
    );
  });

  it('two halves of a record add up to the whole', () => {
    fc.assert(
      fc.property(record, record, (first, second) => {
        const whole = seen([...first, ...second], 8).cases;
        const [a, b] = [seen(first, 8).cases, seen(second, 8).cases];
        whole.forEach((one, index) => {
          const [x, y] = [a[index]?.seen, b[index]?.seen];
          const branches = (x?.branches ?? 0) + (y?.branches ?? 0);
          const shoots = (x?.rate ?? 0) * (x?.branches ?? 0) + (y?.rate ?? 0) * (y?.branches ?? 0);
          expect(one.seen.entries).toBe((x?.entries ?? 0) + (y?.entries ?? 0));
          expect(one.seen.branches).toBe(branches);
          expect((one.seen.rate ?? 0) * branches).toBeCloseTo(shoots, 8);
        });
      }),
    );
  });

  it('no figure is out of bounds, and none is invented where there is no entry', () => {
    fc.assert(
      fc.property(record, fc.integer({ min: 0, max: 16 }), (entries, weeks) => {
        for (const { seen: figures } of seen(entries, weeks).cases) {
          expect(JSON.stringify(figures)).not.toMatch(/NaN|Infinity/);
          if (figures.entries === 0) expect(figures).toEqual(NOTHING);
          else expect(figures.rate).toBeGreaterThanOrEqual(0);
          expect(figures.none ?? 0).toBeLessThanOrEqual(1);
          expect(figures.growers).toBeLessThanOrEqual(figures.entries);
          expect(figures.entries).toBeLessThanOrEqual(figures.branches);
        }
      }),
    );
  });
});
