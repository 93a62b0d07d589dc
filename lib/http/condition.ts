import { ConditionRequired, Stale } from '@/lib/errors/errors';

/**
 * Whether a change to something that stands at revision `current` may go ahead. `sameBody` says that what was sent is
 * already what is stored, after validation.
 *
 * | `If-Match` | body | outcome |
 * |---|---|---|
 * | the current revision | different | `change`: write it and raise the revision |
 * | the current revision, or none | the same | `unchanged`: answer 200 with what stands, write nothing |
 * | none | different | 428 |
 * | any other revision | either | 412 with the current one |
 *
 * Read the row `FOR UPDATE` first, so that what is compared is what is overwritten.
 * @throws Stale, ConditionRequired
 */
export function requireRevision(
  ifMatch: number | null,
  current: number,
  sameBody: boolean,
): 'change' | 'unchanged' {
  if (ifMatch !== null && ifMatch !== current) throw new Stale(current);
  if (sameBody) return 'unchanged';
  if (ifMatch === null) throw new ConditionRequired();
  return 'change';
}

/**
 * For a removal: the revision must be named, for something would be lost.
 * @throws Stale, ConditionRequired
 */
export function requireRevisionToRemove(ifMatch: number | null, current: number): void {
  requireRevision(ifMatch, current, false);
}

/**
 * For a change that may carry `If-Match` without needing one.
 * @throws Stale
 */
export function allowRevision(ifMatch: number | null, current: number): void {
  if (ifMatch !== null && ifMatch !== current) throw new Stale(current);
}

/**
 * For something that is about to be made: whoever names a revision believes that it exists already, so it was removed
 * in between (RFC 9110, 13.1.1: the condition is false where there is no current representation).
 * @throws Stale with revision null
 */
export function requireAbsence(ifMatch: number | null): void {
  if (ifMatch !== null) throw new Stale(null);
}
