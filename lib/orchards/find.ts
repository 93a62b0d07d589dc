import type { Db } from '@/lib/database';
import { Uuid } from '@/lib/entries/schema';
import { Forbidden, NotFound } from '@/lib/errors/errors';
import type { Actor } from '@/lib/people/actor';
import { mayChangeOrchard, mayReadOrchard } from '@/lib/policy/policy';
import { readOrchard, type StoredOrchard } from './table';

/**
 * The orchard, for one of its members.
 * @throws NotFound when it is absent or this person is no member
 */
export async function findOrchard(db: Db, actor: Actor | null, id: string): Promise<StoredOrchard> {
  const orchard = await readOrchard(db, id);
  if (!orchard || !mayReadOrchard(actor, orchard.facts)) throw new NotFound();
  return orchard;
}

/**
 * The orchard to be changed, held until the transaction ends, or null where nobody has one of this id.
 * @throws NotFound for somebody who is no member, Forbidden for a helper
 */
export async function findOwnOrchardIfAny(db: Db, actor: Actor, id: string): Promise<StoredOrchard | null> {
  // Only what is there is held: two who make the same orchard at once would wait for each other's empty place.
  if (!(await readOrchard(db, id))) return null;
  const orchard = await readOrchard(db, id, { lock: true });
  if (!orchard) return null;
  if (!mayReadOrchard(actor, orchard.facts)) throw new NotFound();
  if (!mayChangeOrchard(actor, orchard.facts)) {
    throw new Forbidden('In this orchard you help: its owner alone changes it, its trees and its members.');
  }
  return orchard;
}

/** As `findOwnOrchardIfAny`, but throws NotFound when there is none. */
export async function findOwnOrchard(db: Db, actor: Actor, id: string): Promise<StoredOrchard> {
  const orchard = await findOwnOrchardIfAny(db, actor, id);
  if (!orchard) throw new NotFound();
  return orchard;
}

/** The orchard at a page's address, for one of its members; else null. */
export async function orchardForPage(db: Db, actor: Actor | null, id: string): Promise<StoredOrchard | null> {
  const known = Uuid.safeParse(id);
  const orchard = known.success ? await readOrchard(db, known.data) : null;
  return orchard && mayReadOrchard(actor, orchard.facts) ? orchard : null;
}
