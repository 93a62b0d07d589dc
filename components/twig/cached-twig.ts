import { twigSvg, type Twig, type TwigOptions } from '@/lib/twig/twig';

/** A table shows few different drawings many times: the latest are kept as strings. */
const KEPT = 2000;
const drawings = new Map<string, string>();

/** `twigSvg` of the same case, rounded by less than the drawing or its words can show. */
export function cachedTwig(twig: Twig, options: TwigOptions = {}): string {
  const rounded = {
    severity: round(twig.severity, 1e6),
    tip: twig.tip,
    middle: twig.middle === null ? null : round(twig.middle, 100),
    high: twig.high == null ? null : round(twig.high, 100),
    seed: twig.seed ?? 0,
  };
  const { severity, tip, middle, high, seed } = rounded;
  const key = JSON.stringify([
    severity,
    tip,
    middle,
    high,
    seed,
    options.size ?? 'large',
    options.label ?? null,
  ]);
  const known = drawings.get(key);
  const svg = known ?? twigSvg(rounded, options);
  drawings.delete(key);
  drawings.set(key, svg);
  if (drawings.size > KEPT) {
    const oldest = drawings.keys().next().value;
    if (oldest !== undefined) drawings.delete(oldest);
  }
  return svg;
}

function round(value: number, parts: number): number {
  return Math.round(value * parts) / parts;
}
