import { z } from 'zod';
import type { Db } from '@/lib/database';
import { Cursor, Limit, writeCursor, type Page } from '@/lib/lists/cursor';
import { isSpeciesSlug } from '@/lib/species/catalogue';
import { SEVERITY_CLASSES, TIPS } from '@/lib/severity/severity';
import type { Actor } from '@/lib/people/actor';
import { loadRevisions } from './load';
import { STATUSES, Uuid, type EntryView } from './schema';
import type { EntryRow } from './table';
import { entryViews } from './view';
import { onlyVisible, shownRevisionSql } from './visibility';

export const EntryQuery = z.strictObject({
  species: z.string().refine(isSpeciesSlug, 'is not in the catalogue').optional(),
  class: z.enum(SEVERITY_CLASSES, `must be one of ${SEVERITY_CLASSES.join(', ')}`).optional(),
  tip: z.enum(TIPS, 'must be kept or removed').optional(),
  orchard: Uuid.optional(),
  status: z.enum(STATUSES, `must be one of ${STATUSES.join(', ')}`).optional(),
  mine: z.enum(['0', '1'], 'must be 0 or 1').optional(),
  limit: Limit.default(50),
  cursor: Cursor.optional(),
});
export type EntryQuery = z.output<typeof EntryQuery>;

/** Entries this person may see, newest first, a page at a time. */
export async function listEntries(db: Db, actor: Actor | null, query: EntryQuery): Promise<Page<EntryView>> {
  const nobody = '00000000-0000-0000-0000-000000000000';
  const rows = await db('entries')
    .joinRaw(`JOIN revisions ON revisions.id = ${shownRevisionSql(actor)}`, [actor?.id ?? nobody])
    .join('cuts', 'cuts.revision_id', 'revisions.id')
    .modify((some) => {
      onlyVisible(some, actor);
      if (query.species) some.where('revisions.species', query.species);
      if (query.class) some.where('cuts.severity_class', query.class);
      if (query.tip) some.where('cuts.tip', query.tip);
      if (query.status) some.where('entries.status', query.status);
      if (query.mine === '1') some.where('entries.owner_id', actor?.id ?? nobody);
      if (query.orchard) {
        // Which entries stand in an orchard is for its members to know.
        some.where('revisions.orchard_id', query.orchard).where((member) =>
          member
            .whereIn('revisions.orchard_id', (own) =>
              own
                .from('orchards')
                .where('owner_id', actor?.id ?? nobody)
                .select('id'),
            )
            .orWhereIn('revisions.orchard_id', (helped) =>
              helped
                .from('orchard_members')
                .where('person_id', actor?.id ?? nobody)
                .select('orchard_id'),
            ),
        );
      }
      if (query.cursor) {
        const [createdAt, id] = query.cursor;
        some.whereRaw('(entries.created_at, entries.id) < (?, ?)', [new Date(Number(createdAt)), id]);
      }
    })
    .orderBy([
      { column: 'entries.created_at', order: 'desc' },
      { column: 'entries.id', order: 'desc' },
    ])
    .limit(query.limit + 1)
    .select<(EntryRow & { shownId: number })[]>({
      id: 'entries.id',
      ownerId: 'entries.owner_id',
      status: 'entries.status',
      revision: 'entries.revision',
      workingId: 'entries.working_id',
      waitingId: 'entries.waiting_id',
      acceptedId: 'entries.accepted_id',
      returnedNote: 'entries.returned_note',
      createdAt: 'entries.created_at',
      updatedAt: 'entries.updated_at',
      shownId: 'revisions.id',
    });
  const page = rows.slice(0, query.limit);
  const revisions = await loadRevisions(
    db,
    page.map(({ shownId }) => shownId),
  );
  const found = page.map((row) => {
    const shown = revisions.get(row.shownId);
    if (!shown) throw new Error(`revision ${row.shownId} is missing`);
    return { row, shown };
  });
  const last = rows.length > query.limit ? page.at(-1) : undefined;
  return {
    items: await entryViews(db, actor, found),
    nextCursor: last ? writeCursor([String(last.createdAt.getTime()), last.id]) : null,
  };
}
