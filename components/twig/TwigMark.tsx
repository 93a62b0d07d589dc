import { cachedTwig } from './cached-twig';
import type { Twig, TwigOptions } from '@/lib/twig/twig';

export interface TwigMarkProps extends Twig, TwigOptions {
  /** Sets the width; the height follows. */
  readonly className?: string;
}

/** The twig mark on a page made by the server: a cut and its flush at a glance, with the same said in words. */
export function TwigMark({ size, label, className = '', ...twig }: TwigMarkProps) {
  return (
    <span
      className={`block ${className}`}
      dangerouslySetInnerHTML={{ __html: cachedTwig(twig, { size, label }) }}
    />
  );
}
