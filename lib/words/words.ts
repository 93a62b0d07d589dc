import type { Cut, EntryStatus } from '@/lib/entries/schema';

/** How the stored values are said on a page. */
export const KIND_WORDS: Record<NonNullable<Cut['kind']>, string> = {
  heading: 'heading cut',
  reduction: 'reduction cut',
  thinning: 'thinning cut',
  pollarding: 'pollarding',
  coppicing: 'coppicing',
  none: 'uncut control',
};

export const STAGE_WORDS: Record<NonNullable<Cut['stage']>, string> = {
  dormant: 'dormant',
  'bud-break': 'at bud break',
  growing: 'growing',
  flowering: 'in flower',
  fruiting: 'in fruit',
  'after-harvest': 'after harvest',
};

export const AIM_WORDS: Record<NonNullable<Cut['aim']>, string> = {
  size: 'to keep its size',
  width: 'for width',
  fruit: 'for fruit',
  shade: 'for shade or light',
  shape: 'for shape',
  health: 'for health',
  rejuvenation: 'to rejuvenate',
  other: 'another aim',
};

export const SUN_WORDS = { full: 'full sun', part: 'part sun', shade: 'shade' } as const;
export const WIND_WORDS = { sheltered: 'sheltered', breezy: 'breezy', exposed: 'exposed to wind' } as const;
export const WATER_WORDS = { dry: 'dry', moderate: 'watered now and then', wet: 'wet' } as const;

export const STATUS_WORDS: Record<EntryStatus, string> = {
  draft: 'draft, seen by you alone',
  waiting: 'waiting on the bench',
  returned: 'sent back with a note',
  accepted: 'accepted',
  withdrawn: 'withdrawn',
  merged: 'merged into another',
};

const DATE = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'long',
  year: 'numeric',
  timeZone: 'UTC',
});
const MONTH = new Intl.DateTimeFormat('en-GB', { month: 'long', year: 'numeric', timeZone: 'UTC' });

/** A calendar date, "3 March 2026"; one that is known to the month or season alone says so. */
export function dateInWords(date: string, approximate: 'month' | 'season' | null = null): string {
  const day = new Date(`${date}T00:00:00Z`);
  if (approximate === null) return DATE.format(day);
  return approximate === 'month' ? MONTH.format(day) : `around ${MONTH.format(day)}`;
}

/** "8 weeks", "3 days", "8.4 weeks": whole where it is, else one decimal. */
export function weeksInWords(weeks: number): string {
  if (weeks < 2) return plural(Math.round(weeks * 7), 'day');
  const said = Number(weeks.toFixed(1));
  return `${said} weeks`;
}

/** "1 branch", "4 branches"; figures over 9,999 get a comma. */
export function plural(count: number, one: string, many = `${one}s`): string {
  return `${count.toLocaleString('en-GB')} ${count === 1 ? one : many}`;
}

/** A rate of shoots: one decimal below 10, whole above. */
export function rateInWords(rate: number): string {
  return rate < 9.95 ? String(Number(rate.toFixed(1))) : String(Math.round(rate));
}

/** "3 %", "under 1 %", "none". */
export function shareInWords(share: number): string {
  if (share === 0) return 'none';
  return share < 0.005 ? 'under 1 %' : `${Math.round(share * 100)} %`;
}

export function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
