import { plural } from '@/lib/words/words';
import type { SpeciesCase } from './schema';

/** Fewer than this, and what was seen is told as single stories. */
const FEW_ENTRIES = 5;
const FEW_GROWERS = 2;

type Seen = SpeciesCase['seen'];

/** Whether so little stands behind a figure that it must be said beside it. */
export function isThin(seen: Seen): boolean {
  return seen.entries < FEW_ENTRIES || seen.growers < FEW_GROWERS;
}

/** "170 branches in 41 records by 4 growers in 4 orchards" */
export function denominators(seen: Seen): string {
  return (
    `${plural(seen.branches, 'branch', 'branches')} in ${plural(seen.entries, 'record')} ` +
    `by ${plural(seen.growers, 'grower')} in ${plural(seen.orchards, 'orchard')}`
  );
}

/** What to think of so few, or an empty text where they are not few. */
export function thinWords(seen: Seen): string {
  if (seen.entries === 1) return 'One record is a story, not a rule.';
  if (seen.growers < FEW_GROWERS) return 'All by one grower: one hand and one place.';
  return isThin(seen) ? 'Too few to lean on.' : '';
}

/** Cases nearest to one that nobody has recorded: of the same species, the same tip first, then by depth. */
export function nearestCases(cases: readonly SpeciesCase[], index: number, most = 3): SpeciesCase[] {
  const asked = cases[index];
  const depth = (one: SpeciesCase) => ['uncut', 'light', 'moderate', 'heavy', 'severe'].indexOf(one.class);
  if (!asked) return [];
  const distance = (one: SpeciesCase) =>
    Math.abs(depth(one) - depth(asked)) + (one.tip === asked.tip ? 0 : 1.5);
  return cases
    .filter((one) => one.seen.entries > 0 && one !== asked)
    .sort((a, b) => distance(a) - distance(b))
    .slice(0, most);
}
