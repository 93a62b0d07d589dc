import type { Knex } from 'knex';
import type { Db } from '@/lib/database';
import { Forbidden, NotFound } from '@/lib/errors/errors';
import { isModerator, type Actor } from '@/lib/people/actor';
import { mayReadEntry, type EntryFacts } from '@/lib/policy/policy';
import { loadRevision } from './load';
import type { Revision } from './revisions';
import { entryRow, helperIds, lockEntry, type EntryRow } from './table';

/**
 * Which of an entry's revisions this person is shown. Of an accepted one everyone gets what was accepted, its owner what
 * they wrote last, the bench what waits for it, else what was written last.
 */
export function shownRevisionId(actor: Actor | null, row: EntryRow): number | null {
  if (row.status !== 'accepted' || actor?.id === row.ownerId) return row.workingId;
  return isModerator(actor) ? (row.waitingId ?? row.workingId) : row.acceptedId;
}

/** The same as SQL over `entries`, with the person's id as the one binding. */
export function shownRevisionSql(actor: Actor | null): string {
  const others = isModerator(actor)
    ? 'COALESCE(entries.waiting_id, entries.working_id)'
    : 'entries.accepted_id';
  return `IF(entries.status <> 'accepted' OR entries.owner_id = ?, entries.working_id, ${others})`;
}

/**
 * Narrows a query over `entries` (with `revisions` joined as shown) to what this person may see: the same rule as
 * `mayReadEntry`, tested against it for every kind of person.
 */
export function onlyVisible(query: Knex.QueryBuilder, actor: Actor | null): void {
  query.whereNot('entries.status', 'merged').where((any) => {
    any.where('entries.status', 'accepted');
    if (!actor) return;
    any.orWhere('entries.owner_id', actor.id);
    if (isModerator(actor)) any.orWhereIn('entries.status', ['waiting', 'returned', 'withdrawn']);
    any.orWhere((helped) =>
      helped
        .whereIn('entries.status', ['draft', 'waiting', 'returned'])
        .whereIn('revisions.orchard_id', (orchards) =>
          orchards.from('orchard_members').where('person_id', actor.id).select('orchard_id'),
        ),
    );
  });
}

export type FoundEntry = { row: EntryRow; shown: Revision; facts: EntryFacts };

/**
 * The entry as this person may see it; with `lock`, held until the transaction ends.
 * @throws NotFound when it is absent or not theirs to know of.
 */
export async function findEntry(
  db: Db,
  actor: Actor | null,
  id: string,
  { lock = false }: { lock?: boolean } = {},
): Promise<FoundEntry> {
  const found = await findEntryIfAny(db, actor, id, { lock });
  if (!found) throw new NotFound();
  return found;
}

/** As `findEntry`, but null when nobody has an entry of this id. */
export async function findEntryIfAny(
  db: Db,
  actor: Actor | null,
  id: string,
  { lock }: { lock: boolean },
): Promise<FoundEntry | null> {
  const row = lock ? await lockEntry(db, id) : await entryRow(db, id);
  if (!row) return null;
  const shown = await loadRevision(db, shownRevisionId(actor, row));
  const facts: EntryFacts = {
    status: row.status,
    ownerId: row.ownerId,
    helperIds: await helperIds(db, shown.content.orchard),
  };
  if (!mayReadEntry(actor, facts)) throw new NotFound();
  return { row, shown, facts };
}

/** @throws Forbidden with these words when the rule says no. */
export function demand(allowed: boolean, otherwise: string): void {
  if (!allowed) throw new Forbidden(otherwise);
}
