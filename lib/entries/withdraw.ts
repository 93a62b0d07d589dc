import type { Db } from '@/lib/database';
import { Conflict } from '@/lib/errors/errors';
import { requireRevisionToRemove } from '@/lib/http/condition';
import { loadRevision } from './load';
import { raiseAccepted } from './raise-accepted';
import { dropRevision } from './revisions';
import { updateEntry, type EntryRow } from './table';

/**
 * Deletes a draft that nobody else has read; anything further along is withdrawn and kept.
 * @param row the entry's row, locked
 * @throws Stale, ConditionRequired
 */
export async function removeEntry(
  db: Db,
  row: EntryRow,
  ifMatch: number | null,
): Promise<'deleted' | 'withdrawn'> {
  requireRevisionToRemove(ifMatch, row.revision);
  if (row.status === 'withdrawn') return 'withdrawn';
  if (row.status === 'merged')
    throw new Conflict('A merged entry lives on in another; undo the merge first.');
  if (row.status === 'draft' && row.acceptedId === null) {
    await updateEntry(db, row.id, { workingId: null, waitingId: null });
    await db('entries').where({ id: row.id }).delete();
    return 'deleted';
  }
  if (row.status === 'accepted')
    await raiseAccepted(db, [(await loadRevision(db, row.acceptedId)).content.species]);
  await updateEntry(db, row.id, { status: 'withdrawn', waitingId: null, waitingSince: null });
  if (row.waitingId !== null && row.waitingId !== row.workingId) await dropRevision(db, row.waitingId);
  return 'withdrawn';
}

/** Makes a withdrawn entry a draft again; a draft stays one. */
export async function redraftEntry(db: Db, row: EntryRow): Promise<void> {
  if (row.status === 'draft') return;
  if (row.status !== 'withdrawn') throw new Conflict('Only a withdrawn entry can be made a draft again.');
  await updateEntry(db, row.id, { status: 'draft' });
}
