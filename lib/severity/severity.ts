/** How deep a cut went, its classes and its words. Imports nothing, so that the pure rooms may use it. */

export const SEVERITY_CLASSES = ['uncut', 'light', 'moderate', 'heavy', 'severe'] as const;
export type SeverityClass = (typeof SEVERITY_CLASSES)[number];

export const TIPS = ['kept', 'removed'] as const;
export type Tip = (typeof TIPS)[number];

/** So that a third by tape (0.3334) is still a third. */
export const CLASS_TOLERANCE = 0.0005;

/** Largest severity of each class of cut; a fraction at a bound belongs to the lower class. */
const UPPER_BOUND: readonly [SeverityClass, number][] = [
  ['light', 1 / 4],
  ['moderate', 1 / 3],
  ['heavy', 1 / 2],
];

/** The severity that stands in, marked as estimated, where only a class is known. */
export const CLASS_MIDPOINT: Readonly<Record<SeverityClass, number>> = {
  uncut: 0,
  light: 0.125,
  moderate: 7 / 24,
  heavy: 5 / 12,
  severe: 0.75,
};

export interface Case {
  readonly class: SeverityClass;
  readonly tip: Tip;
}

/** The nine cases of a species, in the order they are shown: uncut has its tip and nothing else. */
export const CASES: readonly Case[] = SEVERITY_CLASSES.flatMap<Case>((name) =>
  name === 'uncut' ? [{ class: name, tip: 'kept' }] : TIPS.map((tip) => ({ class: name, tip })),
);

/** A severity as it is stored: six decimals. */
export function roundSeverity(severity: number): number {
  return Math.round(severity * 1e6) / 1e6;
}

/**
 * The class of a severity from 0 to 1, compared with a tolerance of 0.0005. Uncut is 0 alone, for it goes with
 * kind none: the least nick is a light cut.
 * @throws RangeError for anything outside 0 to 1.
 */
export function severityClass(severity: number): SeverityClass {
  if (!(severity >= 0 && severity <= 1)) throw new RangeError(`severity ${severity} is not between 0 and 1`);
  if (roundSeverity(severity) === 0) return 'uncut';
  for (const [name, bound] of UPPER_BOUND) {
    if (roundSeverity(severity - bound) <= CLASS_TOLERANCE) return name;
  }
  return 'severe';
}

/**
 * Severity of a cut from what was taken off and what was left, in metres (any one unit does), as stored.
 * @throws RangeError for a negative length or two zeros.
 */
export function severityFromLengths(removedM: number, retainedM: number): number {
  const whole = removedM + retainedM;
  if (!(removedM >= 0 && retainedM >= 0 && whole > 0 && Number.isFinite(whole))) {
    throw new RangeError('lengths taken and left must be 0 or more, and not both 0');
  }
  return roundSeverity(removedM / whole);
}
/** How far a fraction said in words may lie from the severity it stands for. */
const NEAR = 0.015;
const NUMERATORS = ['', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine'];
const PARTS: Readonly<Record<number, string>> = {
  3: 'third',
  4: 'quarter',
  5: 'fifth',
  6: 'sixth',
  10: 'tenth',
};

interface Fraction {
  readonly value: number;
  readonly text: string;
}

const SIMPLE = [2, 3, 4, 5, 6].flatMap(fractionsOf);
const TENTHS = fractionsOf(10);

/**
 * A severity from 0 to 1 as a grower says it: "two fifths", "a third", "half", "nearly all", else "about 37 %".
 * A fraction is only said where it lies in the same class, so that the words never contradict the class.
 * @throws RangeError for anything outside 0 to 1.
 */
export function severityInWords(severity: number): string {
  const name = severityClass(severity);
  if (name === 'uncut') return 'nothing';
  if (severity >= 1 - CLASS_TOLERANCE) return 'all';
  const near = (fractions: Fraction[]) =>
    fractions
      .filter(({ value }) => Math.abs(value - severity) <= NEAR && severityClass(value) === name)
      .sort((a, b) => Math.abs(a.value - severity) - Math.abs(b.value - severity))[0]?.text;
  const said = near(SIMPLE) ?? near(TENTHS);
  if (said) return said;
  if (severity >= 0.95) return 'nearly all';
  return severity < 0.01 ? 'under 1 %' : `about ${Math.round(severity * 100)} %`;
}

function fractionsOf(denominator: number): Fraction[] {
  if (denominator === 2) return [{ value: 1 / 2, text: 'half' }];
  const part = PARTS[denominator] ?? '';
  return NUMERATORS.slice(1, denominator).flatMap((numerator, index) => {
    const count = index + 1;
    if (commonDivisor(count, denominator) > 1) return [];
    return [{ value: count / denominator, text: count === 1 ? `a ${part}` : `${numerator} ${part}s` }];
  });
}

function commonDivisor(a: number, b: number): number {
  return b === 0 ? a : commonDivisor(b, a % b);
}
