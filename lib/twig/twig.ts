import { BOX, LIMB, along, edge, sideBranches, slopeAt, thicknessAt, woodEnd } from './limb';
import type { Curve, Point, TwigSize } from './limb';
import { placeShoots, ranks, type Shoot } from './shoots';
import { twigInWords, type TwigCase } from './words';

/** Five numbers that the drawing is made from. */
export interface Twig extends TwigCase {
  /** Any whole number: moves the shoots a little, so that neighbours in a table are not stamped alike. */
  readonly seed?: number;
}

export interface TwigOptions {
  /** 'small' for less than 160 px of width: thicker strokes, no detail. */
  readonly size?: TwigSize;
  /** Text alternative; left out it is `twigInWords`, empty it hides the drawing from assistive technology. */
  readonly label?: string;
}

/**
 * The twig mark as an SVG string of 240 x 96 units, the same for the same input, without ids or styles of its
 * own: its colours come from the classes in components/twig/twig.css.
 * @throws RangeError for a severity outside 0 to 1, or shoots that are negative or not finite.
 */
export function twigSvg(twig: Twig, { size = 'large', label = twigInWords(twig) }: TwigOptions = {}): string {
  const { severity, tip, middle, high = null, seed = 0 } = twig;
  for (const shoots of [middle, high]) {
    if (shoots !== null && !(shoots >= 0 && Number.isFinite(shoots)))
      throw new RangeError(`${shoots} shoots`);
  }
  const drawn = ranks(middle, high);
  const shoots = placeShoots(severity, tip, drawn, seed);
  const sides = tip === 'kept' ? sideBranches(severity) : { left: [], taken: [] };
  const removed = tip === 'removed';
  return [
    `<svg class="twig twig-${size}" viewBox="0 0 ${BOX.width} ${BOX.height}" width="${BOX.width}" height="${BOX.height}" `,
    label === '' ? 'aria-hidden="true">' : `role="img" aria-label="${escaped(label)}">`,
    path('twig-taken', removed ? takenLimb(severity, size) : sides.taken.map(curve).join('')),
    path('twig-side', sides.left.map(curve).join('')),
    rank(
      shoots.filter(({ likely }) => !likely),
      size,
      'twig-faint',
    ),
    rank(
      shoots.filter(({ likely }) => likely),
      size,
    ),
    path('twig-wood', wood(woodEnd(severity, tip), size)),
    removed ? (size === 'large' ? cutFace(1 - severity) : '') : bud(size),
    drawn.more > 0 ? `<text class="twig-more" x="238" y="94" text-anchor="end">+${drawn.more}</text>` : '',
    '</svg>',
  ].join('');
}

function wood(end: number, size: TwigSize): string {
  const upper = edge(0, end, -1, size);
  const lower = edge(0, end, 1, size);
  const flare = thicknessAt(0, size) / 2 + 3;
  const [top, low] = [upper[0], lower[0]];
  const middleY = (top.y + low.y) / 2;
  return (
    `M${LIMB.collarX} ${n(middleY - flare + 1)}Q4 ${n(top.y)} ${p(top)}${bend(upper)}` +
    `L${p(lower[2])}Q${p(lower[1])} ${p(low)}Q4 ${n(low.y)} ${LIMB.collarX} ${n(middleY + flare + 1)}Z`
  );
}

/** The part that was taken, open toward the cut, its bud closing it at the end. */
function takenLimb(severity: number, size: TwigSize): string {
  if (severity * LIMB.lengthX < 3) return '';
  const from = 1 - severity;
  const upper = edge(from, 1, -1, size);
  const [start, control, end] = edge(from, 1, 1, size);
  const tip = along(1);
  return `${curve(upper)}Q${n(tip.x + 6)} ${n(upper[2].y)} ${n(tip.x + 9)} ${n(tip.y)}Q${n(tip.x + 6)} ${n(end.y)} ${p(end)}Q${p(control)} ${p(start)}`;
}

function cutFace(end: number): string {
  const { x, y } = along(end);
  const half = thicknessAt(end, 'large') / 2;
  return `<ellipse class="twig-face" cx="${n(x)}" cy="${n(y)}" rx="${n(half * 0.42 + 0.4)}" ry="${n(half + 0.4)}" transform="rotate(${n(slopeAt(end))} ${n(x)} ${n(y)})"/>`;
}

function bud(size: TwigSize): string {
  const { x, y } = along(1);
  const [long, half] = size === 'large' ? [12, 3.4] : [14, 6];
  const shape = path(
    'twig-leaf',
    `M${n(x - 2)} ${n(y - half * 0.6)}Q${n(x + long * 0.35)} ${n(y - half * 1.5)} ${n(x + long)} ${n(y - 0.6)}Q${n(x + long * 0.4)} ${n(y + half * 1.3)} ${n(x - 2)} ${n(y + half * 0.6)}Z`,
  );
  return size === 'small'
    ? shape
    : shape +
        path('twig-scale', `M${n(x + 1.5)} ${n(y + 1.7)}Q${n(x + 5)} ${n(y + 1)} ${n(x + 7)} ${n(y - 1.6)}`);
}

function rank(shoots: readonly Shoot[], size: TwigSize, faint = ''): string {
  if (shoots.length === 0) return '';
  const stems = path('twig-shoot', shoots.map(({ foot, bend: by, top }) => curve([foot, by, top])).join(''));
  const leaves = path('twig-leaf', shoots.map((shoot) => foliage(shoot, size)).join(''));
  return faint ? `<g class="${faint}">${stems}${leaves}</g>` : stems + leaves;
}

/** Two small leaves at the top of a shoot, one going on and one turned aside; the small mark has one blunt leaf. */
function foliage({ bend: by, top, turn }: Shoot, size: TwigSize): string {
  const heading = Math.atan2(top.y - by.y, top.x - by.x);
  if (size === 'small') return leaf(top, heading, 11, 4, 3);
  return leaf(top, heading - 0.32 * turn, 9, 1.9) + leaf(top, heading + 0.98 * turn, 8, 1.8);
}

function leaf(at: Point, heading: number, long: number, half: number, back = 0.6): string {
  const [cos, sin] = [Math.cos(heading), Math.sin(heading)];
  const turn = (x: number, y: number) => `${n(at.x + x * cos - y * sin)} ${n(at.y + x * sin + y * cos)}`;
  return `M${turn(-back, 0)}Q${turn(long * 0.4, -2 * half)} ${turn(long, 0)}Q${turn(long * 0.4, 2 * half)} ${turn(-back, 0)}Z`;
}

function path(name: string, d: string): string {
  return d === '' ? '' : `<path class="${name}" d="${d}"/>`;
}

function curve(whole: Curve): string {
  return `M${p(whole[0])}${bend(whole)}`;
}

function bend([, control, to]: Curve): string {
  return `Q${p(control)} ${p(to)}`;
}

function p({ x, y }: Point): string {
  return `${n(x)} ${n(y)}`;
}

function n(value: number): string {
  return String(Math.round(value * 10) / 10);
}

function escaped(text: string): string {
  return text.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;').replace(/"/g, '&quot;');
}
