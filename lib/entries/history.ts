import type { Db } from '@/lib/database';

export type RevisionLine = {
  revision: number;
  savedAt: string;
  by: string;
  acceptedAt: string | null;
  acceptedBy: string | null;
  state: 'accepted' | 'superseded' | 'waiting' | 'draft';
};

/** All revisions kept of an entry, newest first, by whom and when. */
export async function entryHistory(db: Db, entryId: string): Promise<RevisionLine[]> {
  const rows = await db('revisions')
    .join('entries', 'entries.id', 'revisions.entry_id')
    .join('people as author', 'author.id', 'revisions.author_id')
    .leftJoin('people as accepter', 'accepter.id', 'revisions.accepted_by')
    .where('revisions.entry_id', entryId)
    .orderBy('revisions.number', 'desc')
    .select<
      {
        id: number;
        number: number;
        savedAt: Date;
        by: string;
        acceptedAt: Date | null;
        acceptedBy: string | null;
        acceptedId: number | null;
        waitingId: number | null;
      }[]
    >({
      id: 'revisions.id',
      number: 'revisions.number',
      savedAt: 'revisions.saved_at',
      by: 'author.name',
      acceptedAt: 'revisions.accepted_at',
      acceptedBy: 'accepter.name',
      acceptedId: 'entries.accepted_id',
      waitingId: 'entries.waiting_id',
    });
  return rows.map((row) => ({
    revision: row.number,
    savedAt: row.savedAt.toISOString(),
    by: row.by,
    acceptedAt: row.acceptedAt?.toISOString() ?? null,
    acceptedBy: row.acceptedBy,
    state: stateOf(row),
  }));
}

function stateOf(row: {
  id: number;
  acceptedAt: Date | null;
  acceptedId: number | null;
  waitingId: number | null;
}) {
  if (row.id === row.waitingId) return 'waiting';
  if (row.id === row.acceptedId) return 'accepted';
  return row.acceptedAt ? 'superseded' : 'draft';
}
