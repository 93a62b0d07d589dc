import { z } from 'zod';
import { Invalid } from '@/lib/errors/errors';
import { Cursor, Limit, writeCursor } from '@/lib/lists/cursor';
import { handler, json, route } from '@/lib/http/handler';
import { findSpecies } from '@/lib/species/find';
import { SpeciesView, speciesView } from '@/lib/species/view';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    {
      as: 'all',
      summary: 'The catalogue: found by scientific, English, Spanish and French names and synonyms',
      query: z.strictObject({
        q: z.string().max(500, 'must have at most 500 characters').default(''),
        limit: Limit.default(50),
        cursor: Cursor.optional(),
      }),
      output: z.object({ items: z.array(SpeciesView), nextCursor: z.string().nullable() }),
    },
    async ({ query }) => {
      const found = findSpecies(query.q);
      // The catalogue does not change while the process runs, so a place in it is the slug that came last.
      const last = query.cursor?.[1];
      const start = found.findIndex(({ slug }) => slug === last) + 1;
      if (last !== undefined && start === 0) {
        throw new Invalid([
          { path: 'cursor', message: 'is not a cursor of this list; leave it out to start again' },
        ]);
      }
      const items = found.slice(start, start + query.limit);
      const ending = start + query.limit < found.length ? items.at(-1) : undefined;
      return json({
        items: items.map(speciesView),
        nextCursor: ending ? writeCursor(['species', ending.slug]) : null,
      });
    },
  ),
});
