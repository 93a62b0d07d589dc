import type { Db } from '@/lib/database';
import type { Actor, Role } from './actor';

/** The person of this id, if the account is enabled and the session was not ended since. */
export async function activePerson(db: Db, id: string, sessionVersion: number): Promise<Actor | null> {
  const row = await db('people')
    .where({ id, session_version: sessionVersion })
    .whereNull('disabled_at')
    .first<{ id: string; role: Role; name: string; units: Actor['units'] }>('id', 'role', 'name', 'units');
  return row ?? null;
}
