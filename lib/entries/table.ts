import type { Db } from '@/lib/database';
import type { EntryStatus } from './schema';

/** An entry's own row: who wrote it, where it stands, and which revision is which. */
export type EntryRow = {
  id: string;
  ownerId: string;
  status: EntryStatus;
  /** Number of the working revision: the ETag its owner holds. */
  revision: number;
  /** What its owner last wrote. */
  workingId: number | null;
  /** What the bench is asked about, where anything waits. */
  waitingId: number | null;
  /** What everyone sees, once accepted. */
  acceptedId: number | null;
  returnedNote: string | null;
  createdAt: Date;
  updatedAt: Date;
};

const COLUMNS = {
  id: 'entries.id',
  ownerId: 'entries.owner_id',
  status: 'entries.status',
  revision: 'entries.revision',
  workingId: 'entries.working_id',
  waitingId: 'entries.waiting_id',
  acceptedId: 'entries.accepted_id',
  returnedNote: 'entries.returned_note',
  createdAt: 'entries.created_at',
  updatedAt: 'entries.updated_at',
};

export async function entryRow(db: Db, id: string): Promise<EntryRow | null> {
  return (await db('entries').where('entries.id', id).first<EntryRow>(COLUMNS)) ?? null;
}

/** The row, locked until the transaction ends: changes of one entry queue up behind each other. */
export async function lockEntry(db: Db, id: string): Promise<EntryRow | null> {
  return (await db('entries').where('entries.id', id).forUpdate().first<EntryRow>(COLUMNS)) ?? null;
}

/** Makes the row of a new draft. False where another request made it first. */
export async function insertEntry(db: Db, id: string, ownerId: string): Promise<boolean> {
  const [outcome] = await db.raw<{ affectedRows: number }[]>(
    'INSERT IGNORE INTO entries (id, owner_id, revision) VALUES (?, ?, 0)',
    [id, ownerId],
  );
  return outcome?.affectedRows === 1;
}

type Change = Partial<Omit<EntryRow, 'id' | 'ownerId' | 'createdAt' | 'updatedAt'>> & {
  waitingSince?: Date | null;
  acceptedAt?: Date;
};

/** Changes the row of an entry that the caller has locked. */
export async function updateEntry(db: Db, id: string, change: Change): Promise<void> {
  const row = {
    status: change.status,
    revision: change.revision,
    working_id: change.workingId,
    waiting_id: change.waitingId,
    accepted_id: change.acceptedId,
    waiting_since: change.waitingSince,
    accepted_at: change.acceptedAt,
    returned_note: change.returnedNote,
    updated_at: new Date(),
  };
  const given = Object.fromEntries(Object.entries(row).filter(([, value]) => value !== undefined));
  const touched = await db('entries').where({ id }).update(given);
  if (touched !== 1) throw new Error(`entry ${id} vanished while it was locked`);
}

/** Members of an orchard who help there, its owner left out. */
export async function helperIds(db: Db, orchardId: string | null): Promise<string[]> {
  if (!orchardId) return [];
  const rows = await db('orchard_members')
    .where({ orchard_id: orchardId })
    .select<{ id: string }[]>('person_id as id');
  return rows.map(({ id }) => id);
}
