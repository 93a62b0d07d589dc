import type { EntryContent } from '@/lib/entries/schema';
import { severityClass, type SeverityClass } from '@/lib/severity/severity';
import { seededRandom } from './random';
import { ringSpecies } from './species';

/**
 * The invented process behind the demo's counts, on the log scale: what a fit of the demo should find again.
 * The sizes are ours; only their directions are the trade's (a tip removed flushes more, a deeper cut not always,
 * near full at eight weeks).
 */
export const TRUTH = {
  /** Shoots on a lightly cut branch, tip kept, in full sun, at eight weeks. */
  baseShoots: 2.4,
  wood: { soft: 0.25, medium: 0, hard: -0.25 },
  class: { uncut: -1.1, light: 0, moderate: 0.3, heavy: 0.55, severe: 0.45 } satisfies Record<
    SeverityClass,
    number
  >,
  tip: { kept: 0, removed: 0.7 },
  kind: { heading: 0, reduction: 0, none: 0, thinning: -0.5, pollarding: 0.5, coppicing: 0.8 },
  logWeeks: 0.3,
  logWeeks2: -0.25,
  sun: { full: 0, part: -0.15, shade: -0.45 },
  wind: { sheltered: 0, breezy: -0.05, exposed: -0.15 },
  water: { dry: -0.15, moderate: 0, wet: 0.15 },
  dormant: 0.12,
  resprouts: { freely: 0, moderately: -0.35, weakly: -1 },
  /** On a severe cut, where little but old wood is left. */
  oldWood: { yes: 0, weak: -0.4, no: -1.6 },
  sd: { genus: 0.3, species: 0.3, case: 0.2, grower: 0.2, orchard: 0.25, entry: 0.2 },
  /** Size of the negative binomial of one branch at one visit. */
  theta: 3.5,
  /** How much of a branch's luck, on the Gaussian scale, is the same at every visit. */
  lasting: 0.85,
} as const;

/**
 * Log of the mean shoots per branch of that entry at that many weeks after its cut.
 * @throws Error where the entry names no species, cut or place.
 */
export function logMean(
  seed: number,
  entryId: string,
  ownerId: string,
  content: EntryContent,
  weeks: number,
): number {
  const { cut, place } = content;
  const { severity, tip, kind, stage } = cut;
  const { sun, wind, water } = place;
  if (content.species === null || severity === null || !tip || !kind || !sun || !wind || !water) {
    throw new Error('the flush of an entry without species, cut or place is not known');
  }
  const species = ringSpecies(content.species);
  const depth = severityClass(severity);
  const lasting = (group: keyof typeof TRUTH.sd, name: string) =>
    seededRandom(seed, `truth/${group}/${name}`).normal(0, TRUTH.sd[group]);
  const logWeeks = Math.log(Math.max(weeks, 0.5) / 8);
  return (
    Math.log(TRUTH.baseShoots) +
    TRUTH.wood[species.wood ?? 'medium'] +
    TRUTH.class[depth] +
    TRUTH.tip[tip] +
    TRUTH.kind[kind] +
    TRUTH.logWeeks * logWeeks +
    TRUTH.logWeeks2 * logWeeks ** 2 +
    TRUTH.sun[sun] +
    TRUTH.wind[wind] +
    TRUTH.water[water] +
    (stage === 'dormant' ? TRUTH.dormant : 0) +
    TRUTH.resprouts[species.resprouts] +
    (depth === 'severe' ? TRUTH.oldWood[species.fromOldWood] : 0) +
    lasting('genus', species.genus) +
    lasting('species', species.slug) +
    lasting('case', `${species.slug} ${depth} ${tip}`) +
    lasting('grower', ownerId) +
    lasting('orchard', content.orchard ?? '') +
    lasting('entry', entryId)
  );
}
