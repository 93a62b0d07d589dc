import type { Db } from '@/lib/database';
import { EntryQuery, listEntries } from './list';
import type { EntryView } from './schema';

/** The newest accepted entries of a species, as any visitor sees them. */
export async function newestAccepted(db: Db, species: string, limit = 20): Promise<EntryView[]> {
  const page = await listEntries(db, null, EntryQuery.parse({ species, status: 'accepted', limit }));
  return page.items;
}
