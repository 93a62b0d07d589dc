import type { Db } from '@/lib/database';
import type { Actor } from '@/lib/people/actor';
import { loadRevisions } from './load';
import type { EntryView } from './schema';
import { entryViews } from './view';
import type { EntryRow } from './table';

export type QueueItem = {
  /** Why it waits: an entry read for the first time, or a change to an accepted one. */
  reason: 'entry' | 'change';
  waitingSince: string;
  /** Written by this moderator, who therefore may not judge it. */
  yours: boolean;
  /** As it stands before the bench; its revision goes into `If-Match` of the decision. */
  entry: EntryView;
};

/** What waits on the bench, the longest first. */
export async function benchQueue(db: Db, moderator: Actor, limit = 200): Promise<QueueItem[]> {
  const rows = await db('entries')
    .whereNotNull('waiting_id')
    .orderBy(['waiting_since', 'id'])
    .limit(limit)
    .select<(EntryRow & { waitingSince: Date })[]>({
      id: 'id',
      ownerId: 'owner_id',
      status: 'status',
      revision: 'revision',
      workingId: 'working_id',
      waitingId: 'waiting_id',
      acceptedId: 'accepted_id',
      returnedNote: 'returned_note',
      createdAt: 'created_at',
      updatedAt: 'updated_at',
      waitingSince: 'waiting_since',
    });
  const revisions = await loadRevisions(
    db,
    rows.flatMap(({ waitingId }) => waitingId ?? []),
  );
  const found = rows.flatMap((row) => {
    const shown = row.waitingId === null ? undefined : revisions.get(row.waitingId);
    return shown ? [{ row, shown }] : [];
  });
  const views = await entryViews(db, moderator, found);
  return found.map(({ row }, index) => ({
    reason: row.status === 'accepted' ? 'change' : 'entry',
    waitingSince: row.waitingSince.toISOString(),
    yours: row.ownerId === moderator.id,
    entry: views[index] as EntryView,
  }));
}
