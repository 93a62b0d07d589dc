import { isDeepStrictEqual } from 'node:util';
import type { Db } from '@/lib/database';
import { requireAbsence, requireRevision } from '@/lib/http/condition';
import type { Actor } from '@/lib/people/actor';
import { findOwnOrchard } from './find';
import type { OrchardBody } from './schema';
import { orchardColumns, readOrchard, type StoredOrchard } from './table';

export type SavedOrchard = { orchard: StoredOrchard; outcome: 'created' | 'changed' | 'unchanged' };

const DUPLICATE = 1062;

/**
 * Makes an orchard, or changes one.
 * @param existing the orchard as it stands, held, or null; the caller has asked whether this person may change it
 * @throws Stale, ConditionRequired, and NotFound or Forbidden where somebody else was quicker with this id
 */
export async function saveOrchard(
  db: Db,
  actor: Actor,
  id: string,
  existing: StoredOrchard | null,
  body: OrchardBody,
  ifMatch: number | null,
): Promise<SavedOrchard> {
  if (existing) return change(db, existing, body, ifMatch);
  requireAbsence(ifMatch);
  try {
    await db('orchards').insert({ id, owner_id: actor.id, ...orchardColumns(body) });
  } catch (error) {
    if ((error as { errno?: number }).errno !== DUPLICATE) throw error;
    // The same request twice at once: the other one was first.
    return change(db, await findOwnOrchard(db, actor, id), body, ifMatch);
  }
  return { orchard: await reread(db, id), outcome: 'created' };
}

async function change(
  db: Db,
  orchard: StoredOrchard,
  body: OrchardBody,
  ifMatch: number | null,
): Promise<SavedOrchard> {
  const isSame = isDeepStrictEqual(orchard.content, body);
  if (requireRevision(ifMatch, orchard.revision, isSame) === 'unchanged') {
    return { orchard, outcome: 'unchanged' };
  }
  await db('orchards')
    .where({ id: orchard.id })
    .update({ ...orchardColumns(body), revision: orchard.revision + 1, updated_at: new Date() });
  return { orchard: await reread(db, orchard.id), outcome: 'changed' };
}

async function reread(db: Db, id: string): Promise<StoredOrchard> {
  const orchard = await readOrchard(db, id);
  if (!orchard) throw new Error(`orchard ${id} vanished while it was held`);
  return orchard;
}
