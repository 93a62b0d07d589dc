import { isDeepStrictEqual } from 'node:util';
import type { Db } from '@/lib/database';
import { Conflict, Invalid, NotFound } from '@/lib/errors/errors';
import { allowRevision, requireAbsence } from '@/lib/http/condition';
import type { Actor } from '@/lib/people/actor';
import { contradictions, readingLacks } from './consistency';
import { loadRevision } from './load';
import {
  dropRevision,
  insertRevision,
  plainContent,
  plainReading,
  type Revision,
  type StoredReading,
} from './revisions';
import { demandComplete, ordered, writeWorking } from './save';
import type { EntryContent, Reading, ReadingBody } from './schema';
import { lockEntry, updateEntry, type EntryRow } from './table';

export type SavedReading = {
  reading: StoredReading;
  entryRevision: number;
  cutDate: string | null;
  created: boolean;
};
type Edit = (content: EntryContent) => EntryContent;

/**
 * Adds or replaces one reading, by the entry's owner or a helper. On an accepted entry it goes to the bench by itself,
 * while what its owner is still writing stays theirs.
 * @param row the entry's row, locked
 * @throws Invalid, Stale, Conflict
 */
export async function saveReading(
  db: Db,
  actor: Actor,
  row: EntryRow,
  readingId: string,
  body: ReadingBody,
  ifMatch: number | null,
): Promise<SavedReading> {
  demandOpen(row);
  const reading: Reading = { ...body, id: readingId };
  const working = await loadRevision(db, row.workingId);
  const stored = working.content.readings.find(({ id }) => id === readingId);
  if (stored) allowRevision(ifMatch, stored.revision);
  else requireAbsence(ifMatch);
  const cutDate = working.content.cut.date;
  if (stored && isDeepStrictEqual(plainReading(stored), reading)) {
    return { reading: stored, entryRevision: row.revision, cutDate, created: false };
  }
  if (row.status === 'accepted') {
    const missing = readingLacks(reading, '');
    if (missing.length > 0) throw new Invalid(missing);
  }
  const put: Edit = (content) => {
    const others = content.readings.filter(({ id }) => id !== readingId);
    return ordered({ ...content, readings: [...others, reading] });
  };
  const saved = await applyEdit(db, actor, row, working, put, readingId);
  const now = saved.content.readings.find(({ id }) => id === readingId);
  if (!now) throw new Error(`reading ${readingId} was not stored`);
  return { reading: now, entryRevision: saved.number, cutDate, created: !stored };
}

/**
 * Takes one reading out.
 * @throws NotFound, Stale, Invalid where a submitted entry would be left without any
 */
export async function deleteReading(
  db: Db,
  actor: Actor,
  row: EntryRow,
  readingId: string,
  ifMatch: number | null,
): Promise<void> {
  demandOpen(row);
  const working = await loadRevision(db, row.workingId);
  const stored = working.content.readings.find(({ id }) => id === readingId);
  if (!stored) throw new NotFound('There is no such reading in this entry.');
  allowRevision(ifMatch, stored.revision);
  const remove: Edit = (content) => ({
    ...content,
    readings: content.readings.filter(({ id }) => id !== readingId),
  });
  await applyEdit(db, actor, row, working, remove, readingId);
}

function demandOpen(row: EntryRow): void {
  if (row.status === 'withdrawn' || row.status === 'merged') {
    throw new Conflict(`A ${row.status} entry takes no readings.`);
  }
}

async function applyEdit(
  db: Db,
  actor: Actor,
  row: EntryRow,
  working: Revision,
  edit: Edit,
  readingId: string,
): Promise<Revision> {
  const content = edit(plainContent(working));
  const errors = contradictions(content).filter(({ path }) => path.startsWith('readings.'));
  const index = content.readings.findIndex(({ id }) => id === readingId);
  const own = errors.filter(({ path }) => path.startsWith(`readings.${index}.`));
  if (own.length > 0)
    throw new Invalid(own.map((error) => ({ ...error, path: error.path.split('.').slice(2).join('.') })));
  if (row.status === 'waiting') demandComplete(content);
  if (row.status === 'accepted') return editAccepted(db, actor, row, working, content, edit);
  return loadRevision(db, await writeWorking(db, row, working, actor.id, content));
}

/**
 * Sends the edit to the bench on top of what it has or of what is accepted. What the owner was still writing, if
 * anything, gets the same edit and stays unsent.
 */
async function editAccepted(
  db: Db,
  actor: Actor,
  row: EntryRow,
  working: Revision,
  content: EntryContent,
  edit: Edit,
): Promise<Revision> {
  const base = await loadRevision(db, row.waitingId ?? row.acceptedId);
  const writing = working.id !== base.id;
  const sent = edit(plainContent(base));
  demandComplete(sent);
  const number = row.revision + 1;
  const head = { entryId: row.id, number, authorId: actor.id };
  const waitingId = await insertRevision(db, head, sent, base.content.readings);
  await updateEntry(db, row.id, { waitingId, waitingSince: new Date() });
  let workingId = waitingId;
  if (writing) {
    const current = await lockEntry(db, row.id);
    if (!current) throw new Error(`entry ${row.id} vanished while it was locked`);
    workingId = await writeWorking(db, current, working, row.ownerId, content);
  }
  await updateEntry(db, row.id, { workingId, revision: number });
  if (row.waitingId !== null && row.waitingId !== workingId) await dropRevision(db, row.waitingId);
  return loadRevision(db, workingId);
}
