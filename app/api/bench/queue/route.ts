import { z } from 'zod';
import { benchQueue } from '@/lib/entries/queue';
import { EntryView } from '@/lib/entries/schema';
import { handler, json, route } from '@/lib/http/handler';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    {
      as: 'moderator',
      summary: 'What waits on the bench, the longest first',
      output: z.object({
        items: z.array(
          z.object({
            reason: z.enum(['entry', 'change']),
            waitingSince: z.string(),
            yours: z.boolean(),
            entry: EntryView,
          }),
        ),
        nextCursor: z.null(),
      }),
    },
    async ({ db, actor }) => json({ items: await benchQueue(db, actor), nextCursor: null }),
  ),
});
