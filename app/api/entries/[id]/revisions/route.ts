import { z } from 'zod';
import { entryHistory } from '@/lib/entries/history';
import { EntryParams, findToRead } from '@/lib/entries/routes';
import { demand } from '@/lib/entries/visibility';
import { handler, json, route } from '@/lib/http/handler';
import { mayReadRevisions } from '@/lib/policy/policy';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    {
      as: 'grower',
      summary: 'What changed in an entry, when, by whom',
      params: EntryParams,
      output: z.object({
        items: z.array(
          z.object({
            revision: z.number().int(),
            savedAt: z.string(),
            by: z.string(),
            acceptedAt: z.string().nullable(),
            acceptedBy: z.string().nullable(),
            state: z.enum(['accepted', 'superseded', 'waiting', 'draft']),
          }),
        ),
        nextCursor: z.null(),
      }),
      find: async (asked) => {
        const found = await findToRead(asked);
        demand(
          mayReadRevisions(asked.actor, found.facts),
          'Its owner and the bench read an entry’s history.',
        );
        return found;
      },
    },
    async ({ db, params }) => json({ items: await entryHistory(db, params.id), nextCursor: null }),
  ),
});
