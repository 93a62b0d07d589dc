import { z } from 'zod';
import { handler, json, route } from '@/lib/http/handler';
import { Cursor, Limit } from '@/lib/lists/cursor';
import { listOrchards } from '@/lib/orchards/list';
import { Orchard } from '@/lib/orchards/schema';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    {
      as: 'grower',
      summary: 'The orchards you own or help in, by name',
      query: z.strictObject({ limit: Limit.default(50), cursor: Cursor.optional() }),
      output: z.object({ items: z.array(Orchard), nextCursor: z.string().nullable() }),
    },
    async ({ db, actor, query }) => json(await listOrchards(db, actor, query)),
  ),
});
