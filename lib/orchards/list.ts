import type { Db } from '@/lib/database';
import { writeCursor, type Page } from '@/lib/lists/cursor';
import type { Actor } from '@/lib/people/actor';
import type { Orchard } from './schema';
import { orchardsOf, orchardView } from './table';

/** The orchards that this person owns or helps in, by name, a page at a time. */
export async function listOrchards(
  db: Db,
  actor: Actor,
  query: { limit: number; cursor?: [string, string] | undefined },
): Promise<Page<Orchard>> {
  const found = await orchardsOf(db, actor, query);
  const items = found.slice(0, query.limit).map((orchard) => orchardView(actor, orchard));
  const last = found.length > query.limit ? items.at(-1) : undefined;
  return { items, nextCursor: last ? writeCursor([last.name, last.id]) : null };
}
