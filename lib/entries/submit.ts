import type { Db } from '@/lib/database';
import { Conflict } from '@/lib/errors/errors';
import { loadRevision } from './load';
import { dropRevision, plainContent } from './revisions';
import { demandComplete } from './save';
import { updateEntry, type EntryRow } from './table';

/**
 * Sends what its owner last wrote to the bench. Sent twice, it is sent once.
 * @param row the entry's row, locked
 * @throws Invalid naming all that lacks, Conflict where there is nothing to send
 */
export async function submitEntry(db: Db, row: EntryRow): Promise<void> {
  if (row.status === 'withdrawn' || row.status === 'merged') {
    throw new Conflict(`A ${row.status} entry cannot be sent to the bench. Make it a draft again first.`);
  }
  if (row.waitingId !== null && row.waitingId === row.workingId) return;
  if (row.status === 'accepted' && row.workingId === row.acceptedId) {
    throw new Conflict('This entry is accepted as it stands; there is no change to send.');
  }
  demandComplete(plainContent(await loadRevision(db, row.workingId)));
  await updateEntry(db, row.id, {
    waitingId: row.workingId,
    waitingSince: new Date(),
    returnedNote: null,
    ...(row.status === 'accepted' ? {} : { status: 'waiting' }),
  });
  if (row.waitingId !== null) await dropRevision(db, row.waitingId);
}
