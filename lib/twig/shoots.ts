import { along, woodEnd, LIMB, type Point } from './limb';
import type { Tip } from '@/lib/severity/severity';

/** The new shoots of the twig mark: how many are drawn and where they stand. */

/** No more than these are drawn, solid and faint together; what is likely beyond them is said as "+n". */
export const MOST_DRAWN = 12;

interface Stem {
  readonly foot: Point;
  readonly bend: Point;
  readonly top: Point;
}

export interface Shoot extends Stem {
  readonly likely: boolean;
  /** Which way its second leaf is turned. */
  readonly turn: 1 | -1;
}

export interface Ranks {
  readonly likely: number;
  readonly faint: number;
  /** Likely shoots that found no room. */
  readonly more: number;
}

/**
 * How many shoots of each rank are drawn for a middle value and the upper end of its range, in shoots a branch.
 * A middle value that rounds to nothing but is more than nothing gets one faint shoot.
 */
export function ranks(middle: number | null, high: number | null): Ranks {
  const rounded = Math.round(middle ?? 0);
  const least = middle !== null && middle > 0 ? 1 : 0;
  const upper = Math.max(rounded, least, Math.round(high ?? 0));
  const likely = Math.min(MOST_DRAWN, rounded);
  return { likely, faint: Math.min(MOST_DRAWN, upper) - likely, more: Math.max(0, rounded - MOST_DRAWN) };
}

/** Tops stand this far apart where the wood allows it, and closer, in two tiers, on a stump that is crowded. */
const TOP_GAP = 10;
const CROWDED_GAP = 7;
const LEFT_MOST = 7;
const RIGHT_MOST = 232;
const HANGING: readonly (readonly [drop: number, reach: number])[] = [
  [19, 15],
  [15, 10],
  [17, 21],
];

/**
 * Where each shoot stands: on the wood that was left, closer together toward the cut, the likely ones nearest to
 * it and the tallest, one in four from below. Tops keep apart, so that a short stump bears a fan.
 */
export function placeShoots(severity: number, tip: Tip, { likely, faint }: Ranks, seed: number): Shoot[] {
  const end = woodEnd(severity, tip);
  const wood = Math.max(end, 6 / LIMB.lengthX);
  const reach = tip === 'removed' ? end : 0.965;
  const stands = Array.from({ length: likely + faint }, (_, index) => {
    const back = 0.94 * wood * ((index + 0.45) / MOST_DRAWN) ** 1.3;
    const stagger = index === 0 ? 0 : (noise(seed, index) - 0.5) * 0.02 * wood;
    return { index, foot: along(reach - back + stagger), below: index % 4 === 2 };
  });
  const above = stands.filter(({ below }) => !below);
  const { tops, crowded } = spread(above.map(({ foot }) => foot.x));
  return stands.map(({ index, foot, below }) => {
    const rank = { likely: index < likely, turn: index % 2 === 0 ? 1 : -1 } as const;
    const wobble = noise(seed, index + 40) - 0.5;
    if (below) return { ...rank, ...hanging(foot, index, wobble) };
    const place = above.findIndex((one) => one.index === index);
    const tier = crowded && place % 2 === 1 ? 10 : 0;
    return {
      ...rank,
      ...rising(foot, tops[place] ?? foot.x, (crowded ? 42 : 37) - 0.8 * index - tier + 6 * wobble),
    };
  });
}

/** Leaves the wood leaning and turns up; the further it must lean, the straighter it goes. */
function rising(foot: Point, topX: number, height: number): Stem {
  const lean = topX - foot.x;
  const early = Math.abs(lean) < 10 ? 0.9 : 0.62;
  return {
    foot,
    bend: { x: foot.x + lean * early, y: foot.y - height * 0.45 },
    top: { x: topX, y: foot.y - height },
  };
}

/** Comes out below and turns to the light, three kinds in turn so that they do not lie on each other. */
function hanging(foot: Point, index: number, wobble: number): Stem {
  const [drop = 0, reach = 0] = HANGING[((index - 2) / 4) % HANGING.length] ?? [];
  return {
    foot,
    bend: { x: foot.x + 1, y: foot.y + (drop + 3 * wobble) * 1.12 },
    top: { x: Math.min(RIGHT_MOST, foot.x + reach), y: foot.y + drop + 3 * wobble },
  };
}

/** Where the tops of shoots go that stand on `feet`, given from the cut inward. */
function spread(feet: readonly number[]): { tops: number[]; crowded: boolean } {
  const first = feet[0] ?? 0;
  const room = first - (feet.at(-1) ?? first);
  const crowded = room + 12 < (feet.length - 1) * TOP_GAP;
  const gap = crowded ? CROWDED_GAP : TOP_GAP;
  const outward = Math.max(0, (feet.length - 1) * gap - room);
  const start = Math.min(RIGHT_MOST, first + 6 + outward * 0.6);
  let previous = start + gap;
  const tops = crowded
    ? feet.map((_, place) => start - place * gap)
    : feet.map((foot) => (previous = Math.min(foot + 7, previous - gap)));
  const leftMost = tops.at(-1) ?? LEFT_MOST;
  return { tops: leftMost < LEFT_MOST ? tops.map((top) => top + LEFT_MOST - leftMost) : tops, crowded };
}

/** A number from 0 to 1 that is always the same for the same seed and place. */
function noise(seed: number, place: number): number {
  let mixed = (Math.imul(seed | 0, 0x9e3779b1) + Math.imul(place + 1, 0x85ebca6b)) | 0;
  mixed = Math.imul(mixed ^ (mixed >>> 15), 0x2c1b3c6d);
  mixed = Math.imul(mixed ^ (mixed >>> 12), 0x297a2d39);
  return ((mixed ^ (mixed >>> 15)) >>> 0) / 2 ** 32;
}
