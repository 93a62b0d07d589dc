import { z } from 'zod';
import type { Db } from '@/lib/database';
import { Conflict, Invalid } from '@/lib/errors/errors';
import { allowRevision } from '@/lib/http/condition';
import type { Actor } from '@/lib/people/actor';
import { loadRevision } from './load';
import { dropRevision, type Revision } from './revisions';
import { raiseAccepted } from './raise-accepted';
import { Uuid } from './schema';
import { updateEntry, type EntryRow } from './table';

export const Decision = z.strictObject({
  decision: z.enum(['accept', 'return'], 'must be accept or return'),
  note: z
    .string('must be text')
    .trim()
    .max(2000, 'must have at most 2000 characters')
    .nullable()
    .default(null),
  setAside: z.array(Uuid).max(200, 'must hold at most 200 readings').default([]),
});
export type Decision = z.output<typeof Decision>;

/**
 * Accepts what waits, or sends it back with a note. The caller has asked whether this moderator may judge it.
 * @param row the entry's row, locked
 * @param ifMatch the number of the revision that was read, if the decision holds for that one alone
 * @throws Conflict where nothing waits, Stale, Invalid
 */
export async function decideEntry(
  db: Db,
  moderator: Actor,
  row: EntryRow,
  decision: Decision,
  ifMatch: number | null,
): Promise<void> {
  if (row.waitingId === null) throw new Conflict('Nothing of this entry waits on the bench any more.');
  const waiting = await loadRevision(db, row.waitingId);
  allowRevision(ifMatch, waiting.number);
  if (decision.decision === 'return') await sendBack(db, row, decision);
  else await accept(db, moderator, row, waiting, decision);
}

async function sendBack(db: Db, row: EntryRow, { note, setAside }: Decision): Promise<void> {
  if (!note) throw new Invalid([{ path: 'note', message: 'is needed: say what the grower should look at' }]);
  if (setAside.length > 0) throw new Invalid([{ path: 'setAside', message: 'goes with an accept' }]);
  await updateEntry(db, row.id, {
    waitingId: null,
    waitingSince: null,
    returnedNote: note,
    ...(row.status === 'accepted' ? {} : { status: 'returned' }),
  });
  if (row.waitingId !== row.workingId && row.waitingId !== null) await dropRevision(db, row.waitingId);
}

async function accept(
  db: Db,
  moderator: Actor,
  row: EntryRow,
  waiting: Revision,
  { setAside }: Decision,
): Promise<void> {
  const known = new Set(waiting.content.readings.map(({ id }) => id));
  if (setAside.some((id) => !known.has(id))) {
    throw new Invalid([{ path: 'setAside', message: 'names a reading that this entry does not hold' }]);
  }
  const readings = () => db('readings').where({ revision_id: waiting.id });
  await readings().whereIn('id', setAside).update({ set_aside: true });
  const now = new Date();
  await db('revisions').where({ id: waiting.id }).update({ accepted_at: now, accepted_by: moderator.id });
  const before = row.status === 'accepted' ? await loadRevision(db, row.acceptedId) : null;
  await updateEntry(db, row.id, {
    status: 'accepted',
    acceptedId: waiting.id,
    acceptedAt: now,
    waitingId: null,
    waitingSince: null,
    returnedNote: null,
  });
  await raiseAccepted(db, [waiting.content.species, before?.content.species ?? null]);
}
