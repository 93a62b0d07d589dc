import { z } from 'zod';
import type { Db } from '@/lib/database';
import type { Actor } from '@/lib/people/actor';
import { mayAddReading, mayEditEntry } from '@/lib/policy/policy';
import { Uuid } from './schema';
import { demand, findEntry, type FoundEntry } from './visibility';

/** What the routes of one entry share: its address, and who gets past the door. */
export const EntryParams = z.object({ id: Uuid });
export const ReadingParams = z.object({ id: Uuid, readingId: Uuid });

type Asked<As> = { db: Db; actor: As; params: { id: string } };

export const findToRead = ({ db, actor, params }: Asked<Actor | null>): Promise<FoundEntry> =>
  findEntry(db, actor, params.id);

/** Its owner alone. */
export async function findToChange({ db, actor, params }: Asked<Actor>): Promise<FoundEntry> {
  const found = await findEntry(db, actor, params.id, { lock: true });
  demand(mayEditEntry(actor, found.facts), 'Only whoever wrote this entry may change it.');
  return found;
}

/** Its owner and the helpers of its orchard. */
export async function findToCount({ db, actor, params }: Asked<Actor>): Promise<FoundEntry> {
  const found = await findEntry(db, actor, params.id, { lock: true });
  demand(
    mayAddReading(actor, found.facts),
    'Only its owner and the helpers of its orchard add readings here.',
  );
  return found;
}
