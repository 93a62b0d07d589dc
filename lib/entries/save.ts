import { isDeepStrictEqual } from 'node:util';
import type { Db } from '@/lib/database';
import { validateDocument } from '@/lib/documents/validate';
import { Conflict, Forbidden, Invalid, type FieldError } from '@/lib/errors/errors';
import { requireAbsence, requireRevision } from '@/lib/http/condition';
import type { Actor } from '@/lib/people/actor';
import { isSpeciesSlug } from '@/lib/species/catalogue';
import { contradictions, lacks } from './consistency';
import { loadRevision } from './load';
import { insertRevision, plainContent, replaceRevision, type Revision } from './revisions';
import type { EntryBody, EntryContent, Reading } from './schema';
import { insertEntry, lockEntry, updateEntry, type EntryRow } from './table';

export type Saved = { row: EntryRow; revision: Revision; created: boolean };

/**
 * Creates a draft or saves over what its owner last wrote. An accepted entry keeps its accepted revision; the change
 * waits beside it until it is submitted and accepted.
 * @param row the entry's row, locked, or null for a new one; the caller has asked whether this person may.
 * @throws Invalid, Stale, ConditionRequired, Conflict
 */
export async function saveEntry(
  db: Db,
  actor: Actor,
  id: string,
  row: EntryRow | null,
  body: EntryBody,
  ifMatch: number | null,
): Promise<Saved> {
  if (!row) {
    requireAbsence(ifMatch);
    const content: EntryContent = { ...body, readings: body.readings ?? [] };
    await check(db, actor, content, { isNew: true });
    if (await insertEntry(db, id, actor.id)) return create(db, actor, id, content);
    // The same draft, sent twice at once: the other request was first, so this one changes what it made.
    row = await lockEntry(db, id);
    if (!row || row.ownerId !== actor.id)
      throw new Conflict('An entry of this id exists already. Choose another id.');
  }
  if (row.status === 'withdrawn' || row.status === 'merged') {
    throw new Conflict(`A ${row.status} entry does not change. Make it a draft again first.`);
  }
  const working = await loadRevision(db, row.workingId);
  const before = plainContent(working);
  const given: EntryContent = { ...body, readings: body.readings ?? before.readings };
  await check(db, actor, given, { isNew: false });
  const content = ordered(given);
  const same = isDeepStrictEqual(content, before);
  requireRevision(ifMatch, row.revision, same);
  if (same) return { row, revision: working, created: false };
  if (row.status === 'waiting') demandComplete(content);
  const workingId = await writeWorking(db, row, working, actor.id, content);
  return { ...(await reread(db, id, workingId)), created: false };
}

async function create(db: Db, actor: Actor, id: string, content: EntryContent): Promise<Saved> {
  const head = { entryId: id, number: 1, authorId: actor.id };
  const workingId = await insertRevision(db, head, ordered(content), []);
  await updateEntry(db, id, { workingId, revision: 1 });
  return { ...(await reread(db, id, workingId)), created: true };
}

async function reread(db: Db, id: string, workingId: number): Promise<{ row: EntryRow; revision: Revision }> {
  const row = await lockEntry(db, id);
  if (!row) throw new Error(`entry ${id} vanished while it was locked`);
  return { row, revision: await loadRevision(db, workingId) };
}

/**
 * Writes the owner's latest content as the working revision: over the old one, unless that one is accepted or is what
 * the bench has before it. Gives the id of the row that now holds it.
 */
export async function writeWorking(
  db: Db,
  row: EntryRow,
  working: Revision,
  authorId: string,
  content: EntryContent,
): Promise<number> {
  const head = { entryId: row.id, number: row.revision + 1, authorId };
  const heldByBench = row.status === 'accepted' && row.waitingId === working.id;
  let workingId = working.id;
  if (working.acceptedAt !== null || heldByBench) {
    workingId = await insertRevision(db, head, content, working.content.readings);
  } else {
    await replaceRevision(db, working.id, head, content, working.content.readings);
  }
  await updateEntry(db, row.id, { workingId, revision: head.number });
  return workingId;
}

/** Readings stand in the order of their dates, the undated first, as they are read back. */
export function ordered(content: EntryContent): EntryContent {
  const key = (reading: Reading) => `${reading.date ?? ''} ${reading.id}`;
  return { ...content, readings: [...content.readings].sort((a, b) => (key(a) < key(b) ? -1 : 1)) };
}

export function demandComplete(content: EntryContent): void {
  const missing = lacks(content);
  if (missing.length > 0) throw new Invalid(missing);
}

async function check(
  db: Db,
  actor: Actor,
  content: EntryContent,
  { isNew }: { isNew: boolean },
): Promise<void> {
  const errors: FieldError[] = [...contradictions(content), ...validateDocument(content.doc)];
  if (content.species !== null && !isSpeciesSlug(content.species)) {
    errors.push({ path: 'species', message: 'is not in the catalogue; GET /api/species lists what is' });
  }
  errors.push(...(await placeErrors(db, actor, content, isNew)));
  if (errors.length > 0) throw new Invalid(errors);
}

async function placeErrors(
  db: Db,
  actor: Actor,
  content: EntryContent,
  isNew: boolean,
): Promise<FieldError[]> {
  const { orchard, tree } = content;
  if (orchard === null) {
    return tree === null ? [] : [{ path: 'tree', message: 'needs its orchard beside it' }];
  }
  const owned = await db('orchards').where({ id: orchard, owner_id: actor.id }).first('id');
  if (!owned) {
    const helps = await db('orchard_members')
      .where({ orchard_id: orchard, person_id: actor.id })
      .first('orchard_id');
    if (helps && isNew) {
      throw new Forbidden(
        'In this orchard you help: you can add readings to its entries, but not write new ones.',
      );
    }
    return [{ path: 'orchard', message: 'is not one of your orchards' }];
  }
  if (tree === null) return [];
  const stands = await db('trees').where({ id: tree, orchard_id: orchard }).first('id');
  return stands ? [] : [{ path: 'tree', message: 'does not stand in this orchard' }];
}
