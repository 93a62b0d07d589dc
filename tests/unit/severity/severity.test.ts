import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  CASES,
  CLASS_MIDPOINT,
  SEVERITY_CLASSES,
  roundSeverity,
  severityClass,
  severityFromLengths,
} from '@/lib/severity/severity';

const fraction = fc.double({ min: 0, max: 1, noNaN: true });

describe('the class of a severity', () => {
  it.each([
    [0, 'uncut'],
    [0.0003, 'light'],
    [0.25, 'light'],
    [0.2505, 'light'],
    [0.250501, 'moderate'],
    [1 / 3, 'moderate'],
    [0.3334, 'moderate'],
    [0.3338, 'moderate'],
    [0.3339, 'heavy'],
    [0.5, 'heavy'],
    [0.5005, 'heavy'],
    [0.5006, 'severe'],
    [1, 'severe'],
  ])('reads %d as %s', (severity, name) => {
    expect(severityClass(severity)).toBe(name);
  });

  it('is the class whose midpoint it is', () => {
    for (const name of SEVERITY_CLASSES) {
      expect(severityClass(CLASS_MIDPOINT[name])).toBe(name);
      expect(severityClass(roundSeverity(CLASS_MIDPOINT[name]))).toBe(name);
    }
  });

  it('never falls as the cut goes deeper', () => {
    const rank = (severity: number) => SEVERITY_CLASSES.indexOf(severityClass(severity));
    fc.assert(fc.property(fraction, fraction, (a, b) => rank(Math.min(a, b)) <= rank(Math.max(a, b))));
  });

  it('is the same before and after it is stored', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 1_000_000 }), (millionths) => {
        const stored = roundSeverity(millionths / 1e6);
        expect(severityClass(stored)).toBe(severityClass(millionths / 1e6));
      }),
    );
  });

  it.each([-0.1, 1.001, Number.NaN, Number.POSITIVE_INFINITY])('refuses %d', (severity) => {
    expect(() => severityClass(severity)).toThrow(RangeError);
  });
});

describe('severity from lengths', () => {
  it('is what was taken over the whole branch, to six decimals', () => {
    expect(severityFromLengths(1.2, 1.8)).toBe(0.4);
    expect(severityFromLengths(1, 2)).toBe(0.333333);
    expect(severityFromLengths(0, 2)).toBe(0);
    expect(severityFromLengths(2, 0)).toBe(1);
  });

  it('reads a third by tape as a third, in any unit', () => {
    expect(severityClass(severityFromLengths(0.6, 1.2))).toBe('moderate');
    expect(severityClass(severityFromLengths(2, 4))).toBe('moderate');
  });

  it('stays between 0 and 1 for any two lengths', () => {
    const length = fc.double({ min: 0.001, max: 100, noNaN: true });
    fc.assert(
      fc.property(length, length, (removedM, retainedM) => {
        const severity = severityFromLengths(removedM, retainedM);
        return severity >= 0 && severity <= 1;
      }),
    );
  });

  it.each([
    [0, 0],
    [-1, 2],
    [1, -2],
    [Number.NaN, 1],
    [Number.POSITIVE_INFINITY, 1],
  ])('refuses %d taken and %d left', (removedM, retainedM) => {
    expect(() => severityFromLengths(removedM, retainedM)).toThrow(RangeError);
  });
});

it('a species has nine cases, uncut with its tip first', () => {
  expect(CASES.map((one) => `${one.class} ${one.tip}`)).toEqual([
    'uncut kept',
    'light kept',
    'light removed',
    'moderate kept',
    'moderate removed',
    'heavy kept',
    'heavy removed',
    'severe kept',
    'severe removed',
  ]);
});
