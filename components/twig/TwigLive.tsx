'use client';

import { useMemo } from 'react';
import type { Tip } from '@/lib/severity/severity';
import { twigSvg } from '@/lib/twig/twig';
import type { TwigSize } from '@/lib/twig/limb';

export interface TwigLiveProps {
  /** Null, or anything that is no severity, while it is not yet said. */
  readonly severity: number | null;
  readonly tip: Tip | null;
  readonly middle?: number | null;
  readonly high?: number | null;
  readonly seed?: number;
  readonly size?: TwigSize;
  readonly className?: string;
}

/** The twig mark that moves with the severity while a cut is being written down. */
export function TwigLive({
  severity,
  tip,
  middle = null,
  high = null,
  seed = 0,
  size,
  className = '',
}: TwigLiveProps) {
  const svg = useMemo(() => {
    const said = severity !== null && severity >= 0 && severity <= 1;
    if (!said || tip === null) {
      return twigSvg(
        { severity: 0, tip: 'kept', middle: null, seed },
        { size, label: 'No cut described yet' },
      );
    }
    return twigSvg({ severity, tip, middle, high, seed }, { size });
  }, [severity, tip, middle, high, seed, size]);
  return <span className={`block ${className}`} dangerouslySetInnerHTML={{ __html: svg }} />;
}
