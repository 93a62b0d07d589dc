import type { Db } from '@/lib/database';
import { Conflict } from '@/lib/errors/errors';
import { requireRevisionToRemove } from '@/lib/http/condition';
import type { StoredOrchard } from './table';

const STILL_REFERRED_TO = 1451;

/**
 * Removes an orchard with its trees and memberships. What was recorded there stays in the record, so an orchard that any
 * entry names, in whatever state, cannot be removed.
 * @param orchard as it stands, held
 * @throws Stale, ConditionRequired, Conflict
 */
export async function removeOrchard(db: Db, orchard: StoredOrchard, ifMatch: number | null): Promise<void> {
  requireRevisionToRemove(ifMatch, orchard.revision);
  try {
    await db('orchards').where({ id: orchard.id }).delete();
  } catch (error) {
    if ((error as { errno?: number }).errno !== STILL_REFERRED_TO) throw error;
    throw new Conflict(
      'Entries were written about this orchard, so it stays. Delete its drafts, or name another orchard in them, first.',
    );
  }
}
