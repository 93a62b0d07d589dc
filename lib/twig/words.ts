import { severityInWords, type Tip } from '@/lib/severity/severity';

/** What the twig mark shows, in words: its text alternative. */

export interface TwigCase {
  /** 0 to 1, of the branch with the tip removed, of its side growth with the tip kept. */
  readonly severity: number;
  readonly tip: Tip;
  /** Shoots a branch, expected or counted; null where nothing is known. */
  readonly middle: number | null;
  /** Upper end of the range, in shoots a branch; null or left out where there is none. */
  readonly high?: number | null;
}

/** "Two fifths of the branch taken, tip removed. 8 new shoots, up to 18." */
export function twigInWords({ severity, tip, middle, high = null }: TwigCase): string {
  return `${cutInWords(severity, tip)}. ${shootsInWords(middle, high)}.`;
}

function cutInWords(severity: number, tip: Tip): string {
  const share = severityInWords(severity);
  if (share === 'nothing') return tip === 'kept' ? 'Uncut branch' : 'Only the tip removed';
  const capital = share[0]?.toUpperCase() + share.slice(1);
  const of = share === 'all' || share === 'half' || share === 'nearly all' ? ' ' : ' of ';
  return `${capital}${of}${tip === 'kept' ? 'the side growth' : 'the branch'} taken, tip ${tip}`;
}

function shootsInWords(middle: number | null, high: number | null): string {
  if (middle === null) return 'New shoots not known';
  const count = round(middle);
  const said =
    middle > 0 && count === '0'
      ? 'Hardly a new shoot'
      : count === '0'
        ? 'No new shoot'
        : count === '1'
          ? '1 new shoot'
          : `${count} new shoots`;
  const upper = high === null ? count : round(high);
  return high !== null && high > middle && upper !== count ? `${said}, up to ${upper}` : said;
}

/** One decimal under 10, where it tells something; whole numbers from there on. */
function round(shoots: number): string {
  return String(shoots < 10 ? Math.round(shoots * 10) / 10 : Math.round(shoots));
}
