import { notFound } from 'next/navigation';
import type { Db } from '@/lib/database';
import { NotFound } from '@/lib/errors/errors';
import type { Actor } from '@/lib/people/actor';
import type { EntryFacts } from '@/lib/policy/policy';
import { Uuid, type EntryView } from './schema';
import { entryViews } from './view';
import { findEntry } from './visibility';

export type EntryPage = { view: EntryView; facts: EntryFacts };

/** One entry for a page: what this person may not see is the page that is not there. */
export async function readEntryPage(db: Db, actor: Actor | null, id: string): Promise<EntryPage> {
  const parsed = Uuid.safeParse(id);
  if (!parsed.success) notFound();
  try {
    const found = await findEntry(db, actor, parsed.data);
    const [view] = await entryViews(db, actor, [found]);
    if (!view) notFound();
    return { view, facts: found.facts };
  } catch (error) {
    if (error instanceof NotFound) notFound();
    throw error;
  }
}
