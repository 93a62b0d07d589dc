import { z } from 'zod';
import { handler, json, route } from '@/lib/http/handler';
import { Cursor, Limit } from '@/lib/lists/cursor';
import { listPeople } from '@/lib/people/admin';
import { Person } from '@/lib/people/schema';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    {
      as: 'admin',
      summary: 'People and their roles, by e-mail address; q is part of the address or the name',
      query: z.strictObject({
        q: z.string().max(254).optional(),
        limit: Limit.default(50),
        cursor: Cursor.optional(),
      }),
      output: z.object({ items: z.array(Person), nextCursor: z.string().nullable() }),
    },
    async ({ db, query }) => json(await listPeople(db, query)),
  ),
});
