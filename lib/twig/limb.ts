import type { Tip } from '@/lib/severity/severity';

/** The limb of the twig mark, in the units of its box: 240 wide, 96 high, the trunk at left. */

export const BOX = { width: 240, height: 96 } as const;
export type TwigSize = 'large' | 'small';

export interface Point {
  readonly x: number;
  readonly y: number;
}

/** A quadratic curve: from, control, to. */
export type Curve = readonly [Point, Point, Point];

/** Where the limb's length is measured from and how long it is; the collar lies before it, the bud beyond. */
export const LIMB = { startX: 8, lengthX: 216, collarX: 1 } as const;
const RISE: readonly [number, number, number] = [69, 56, 52];
const THICKNESS = { large: [10, 3], small: [15, 7] } as const;

/** The middle of the limb at fraction `at` of its length from the trunk (x runs evenly with it). */
export function along(at: number): Point {
  const [start, bend, end] = RISE;
  const rest = 1 - at;
  return {
    x: LIMB.startX + LIMB.lengthX * at,
    y: rest * rest * start + 2 * rest * at * bend + at * at * end,
  };
}

export function thicknessAt(at: number, size: TwigSize): number {
  const [trunk, end] = THICKNESS[size];
  return trunk + (end - trunk) * at;
}

/** Direction of the limb at `at`, in degrees as SVG turns (up is negative). */
export function slopeAt(at: number): number {
  const [start, bend, end] = RISE;
  const rise = 2 * ((1 - at) * (bend - start) + at * (end - bend));
  return (Math.atan2(rise, LIMB.lengthX) * 180) / Math.PI;
}

/** One edge of the limb between two fractions; `side` -1 is the upper, 1 the lower. */
export function edge(from: number, to: number, side: -1 | 1, size: TwigSize): Curve {
  const point = (at: number): Point => {
    const { x, y } = along(at);
    return { x, y: y + (side * thicknessAt(at, size)) / 2 };
  };
  const [first, middle, last] = [point(from), point((from + to) / 2), point(to)];
  return [
    first,
    { x: 2 * middle.x - (first.x + last.x) / 2, y: 2 * middle.y - (first.y + last.y) / 2 },
    last,
  ];
}

/** How far from the trunk wood was left, as a fraction of the limb. */
export function woodEnd(severity: number, tip: Tip): number {
  return tip === 'removed' ? 1 - severity : 1;
}

/** Side branches, the one nearest the trunk first: where, on which side, how long along and up. */
const SIDES: readonly { at: number; side: -1 | 1; reach: number; lift: number }[] = [
  { at: 0.13, side: -1, reach: 27, lift: 25 },
  { at: 0.25, side: 1, reach: 27, lift: 16 },
  { at: 0.38, side: -1, reach: 24, lift: 22 },
  { at: 0.5, side: 1, reach: 24, lift: 15 },
  { at: 0.63, side: -1, reach: 20, lift: 19 },
  { at: 0.76, side: 1, reach: 20, lift: 13 },
];

/**
 * What a cut that kept the tip left of the side branches and what it took of them. The share by length that
 * was taken is the severity: whole branches from the end of the limb inward, and a part of the last one.
 */
export function sideBranches(severity: number): { left: Curve[]; taken: Curve[] } {
  const curves = SIDES.map(({ at, side, reach, lift }): Curve => {
    const foot = along(at);
    return [
      foot,
      { x: foot.x + reach * 0.55, y: foot.y + side * lift * 0.36 },
      { x: foot.x + reach, y: foot.y + side * lift },
    ];
  });
  let toTake = severity * curves.reduce((sum, curve) => sum + chord(curve), 0);
  const left: Curve[] = [];
  const taken: Curve[] = [];
  for (const curve of [...curves].reverse()) {
    const share = Math.min(1, toTake / chord(curve));
    toTake = Math.max(0, toTake - chord(curve));
    const [kept, gone] = split(curve, 1 - share);
    if (share < 1) left.push(kept);
    if (share > 0) taken.push(gone);
  }
  return { left, taken };
}

/** Length of a curve as gently bent as a side branch: the mean of its chord and its two legs. */
export function chord([from, control, to]: Curve): number {
  const legs = distance(from, control) + distance(control, to);
  return (2 * distance(from, to) + legs) / 3;
}

function distance(a: Point, b: Point): number {
  return Math.hypot(a.x - b.x, a.y - b.y);
}

function split([from, control, to]: Curve, at: number): [Curve, Curve] {
  const mix = (a: Point, b: Point): Point => ({ x: a.x + (b.x - a.x) * at, y: a.y + (b.y - a.y) * at });
  const [first, second] = [mix(from, control), mix(control, to)];
  const middle = mix(first, second);
  return [
    [from, first, middle],
    [middle, second, to],
  ];
}
