import { z } from 'zod';
import { EntryQuery, listEntries } from '@/lib/entries/list';
import { EntryView } from '@/lib/entries/schema';
import { handler, json, route } from '@/lib/http/handler';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    {
      as: 'all',
      summary: 'Entries you may see, newest first',
      query: EntryQuery,
      output: z.object({ items: z.array(EntryView), nextCursor: z.string().nullable() }),
    },
    async ({ db, actor, query }) => json(await listEntries(db, actor, query)),
  ),
});
