// @vitest-environment jsdom
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { twigSvg, type Twig } from '@/lib/twig/twig';
import type { TwigSize } from '@/lib/twig/limb';
import { chord, LIMB, type Curve } from '@/lib/twig/limb';

function draw(twig: Twig, size: TwigSize = 'large'): Element {
  const document = new DOMParser().parseFromString(
    twigSvg(twig, { size }).replace('<svg', '<svg xmlns="http://www.w3.org/2000/svg"'),
    'application/xml',
  );
  expect(document.querySelector('parsererror')).toBeNull();
  return document.documentElement;
}

/** The curves of a path that is made of "M x y Q x y x y" alone. */
function curves(svg: Element, selector: string): Curve[] {
  const d = svg.querySelector(selector)?.getAttribute('d') ?? '';
  return d
    .split('M')
    .slice(1)
    .map((one) => {
      const [a = 0, b = 0, c = 0, e = 0, f = 0, g = 0] = (one.match(/-?[\d.]+/g) ?? []).map(Number);
      return [
        { x: a, y: b },
        { x: c, y: e },
        { x: f, y: g },
      ];
    });
}

const likely = (svg: Element) => curves(svg, 'svg > .twig-shoot').length;
const faint = (svg: Element) => curves(svg, '.twig-faint > .twig-shoot').length;
const rightMost = (svg: Element) => {
  const numbers = (
    svg
      .querySelector('.twig-wood')
      ?.getAttribute('d')
      ?.match(/-?[\d.]+/g) ?? []
  ).map(Number);
  return Math.max(...numbers.filter((_, index) => index % 2 === 0));
};

const severity = fc.double({ min: 0, max: 1, noNaN: true });
const tip = fc.constantFrom('kept', 'removed');
const shoots = fc.option(fc.double({ min: 0, max: 999, noNaN: true }));
const twigs = fc.record({ severity, tip, middle: shoots, high: shoots, seed: fc.integer() }) as fc.Arbitrary<
  Required<Twig>
>;
const sizes = fc.constantFrom<TwigSize>('large', 'small');

describe('what was taken', () => {
  it.each([0, 0.05, 0.25, 1 / 3, 0.4, 0.5, 0.75, 0.95, 1])(
    'is the true fraction of the limb with the tip removed (%d)',
    (taken) => {
      const svg = draw({ severity: taken, tip: 'removed', middle: 3 });
      const share = (rightMost(svg) - LIMB.startX) / LIMB.lengthX;
      expect(share).toBeCloseTo(1 - taken, 3);
    },
  );

  it.each([0, 0.125, 0.25, 1 / 3, 0.4, 0.5, 0.75, 1])(
    'is the true fraction of the side growth by length with the tip kept (%d)',
    (taken) => {
      const svg = draw({ severity: taken, tip: 'kept', middle: 3 });
      const length = (selector: string) =>
        curves(svg, selector).reduce((sum, curve) => sum + chord(curve), 0);
      const [gone, left] = [length('.twig-taken'), length('.twig-side')];
      expect(gone / (gone + left)).toBeCloseTo(taken, 2);
      expect(rightMost(svg)).toBe(LIMB.startX + LIMB.lengthX);
    },
  );

  it('leaves a cut face where the tip is gone and a bud where it stayed', () => {
    const removed = draw({ severity: 0.4, tip: 'removed', middle: null });
    expect(removed.querySelectorAll('.twig-face')).toHaveLength(1);
    expect(removed.querySelector('.twig-leaf')).toBeNull();
    const kept = draw({ severity: 0.4, tip: 'kept', middle: null });
    expect(kept.querySelector('.twig-face')).toBeNull();
    expect(kept.querySelectorAll('.twig-leaf')).toHaveLength(1);
  });

  it('is nothing on an uncut branch', () => {
    expect(draw({ severity: 0, tip: 'kept', middle: 1 }).querySelector('.twig-taken')).toBeNull();
  });
});

describe('new shoots', () => {
  it.each([
    [0, 0, 0, 0, null],
    [0, null, 0, 0, null],
    [null, null, 0, 0, null],
    [0.3, null, 0, 1, null],
    [1, 3, 1, 2, null],
    [8, 18, 8, 4, null],
    [8.4, 9.4, 8, 1, null],
    [11, 24, 11, 1, null],
    [12, 20, 12, 0, null],
    [14, null, 12, 0, '+2'],
    [17, 36, 12, 0, '+5'],
    [5, 2, 5, 0, null],
  ])('of a middle %s up to %s are %s solid and %s faint, then %s', (middle, high, solid, behind, more) => {
    const svg = draw({ severity: 0.4, tip: 'removed', middle, high });
    expect([likely(svg), faint(svg)]).toEqual([solid, behind]);
    expect(svg.querySelector('.twig-more')?.textContent ?? null).toBe(more);
  });

  it('have two leaves each in the large drawing and one in the small', () => {
    const leaves = (size: TwigSize) =>
      draw({ severity: 0.4, tip: 'removed', middle: 6 }, size)
        .querySelector('.twig-leaf')
        ?.getAttribute('d')
        ?.split('M').length;
    expect(leaves('large')).toBe(13);
    expect(leaves('small')).toBe(7);
  });

  it('stand on the wood that was left, one in four from below, closer together toward the cut', () => {
    const feet = curves(draw({ severity: 0.4, tip: 'removed', middle: 12 }), '.twig-shoot');
    expect(feet.filter(([foot, , top]) => top.y > foot.y)).toHaveLength(3);
    const xs = feet.map(([foot]) => foot.x).sort((a, b) => b - a);
    const cut = LIMB.startX + 0.6 * LIMB.lengthX;
    expect(xs[0]).toBeLessThanOrEqual(cut);
    expect(xs.at(-1)).toBeGreaterThan(LIMB.startX);
    const nearHalf = xs.filter((x) => x > (cut + LIMB.startX) / 2).length;
    expect(nearHalf).toBeGreaterThan(6);
  });

  it('never stand beyond the cut, wherever it is', () => {
    fc.assert(
      fc.property(severity, fc.integer({ min: 1, max: 30 }), fc.integer(), (taken, middle, seed) => {
        const svg = draw({ severity: taken, tip: 'removed', middle, seed });
        const cut = LIMB.startX + (1 - taken) * LIMB.lengthX;
        for (const [foot] of curves(svg, '.twig-shoot')) {
          expect(foot.x).toBeLessThanOrEqual(cut + 0.1);
        }
      }),
    );
  });
});

describe('the drawing', () => {
  it('is whole, small, inside its box and without ids, styles or numbers that are none', () => {
    fc.assert(
      fc.property(twigs, sizes, (twig, size) => {
        const svg = twigSvg(twig, { size });
        expect(svg).not.toMatch(/NaN|Infinity|undefined|null|style=| id=|e-\d/);
        expect(svg.length).toBeLessThan(4000);
        const element = draw(twig, size);
        for (const path of element.querySelectorAll('path')) {
          const numbers = (path.getAttribute('d')?.match(/-?[\d.]+/g) ?? []).map(Number);
          numbers.forEach((number, index) => {
            expect(number).toBeGreaterThanOrEqual(-4);
            expect(number).toBeLessThanOrEqual(index % 2 === 0 ? 246 : 102);
          });
        }
      }),
    );
  });

  it('is the same for the same numbers, and moves a little with the seed', () => {
    const twig = { severity: 0.4, tip: 'removed', middle: 8, high: 18 } as const;
    expect(twigSvg({ ...twig, seed: 5 })).toBe(twigSvg({ ...twig, seed: 5 }));
    expect(twigSvg({ ...twig, seed: 5 })).not.toBe(twigSvg({ ...twig, seed: 6 }));
  });

  it('takes its label as text, never as markup', () => {
    const label = 'Fig "left" <b>of</b> R&D';
    const holder = document.createElement('div');
    holder.innerHTML = twigSvg({ severity: 0.4, tip: 'kept', middle: 2 }, { label });
    expect(holder.querySelector('svg')?.getAttribute('aria-label')).toBe(label);
    expect(holder.querySelector('b')).toBeNull();
  });

  it('is hidden from assistive technology where the label is empty', () => {
    const svg = twigSvg({ severity: 0.4, tip: 'kept', middle: 2 }, { label: '' });
    expect(svg).toContain('aria-hidden="true"');
    expect(svg).not.toContain('role=');
  });

  it.each([
    { severity: 1.2, tip: 'kept', middle: 1 },
    { severity: Number.NaN, tip: 'removed', middle: 1 },
    { severity: 0.4, tip: 'removed', middle: -1 },
    { severity: 0.4, tip: 'removed', middle: 1, high: Number.POSITIVE_INFINITY },
  ] as Twig[])('refuses $severity with $middle to $high', (twig) => {
    expect(() => twigSvg(twig)).toThrow(RangeError);
  });
});
