import { z } from 'zod';
import { Uuid } from '@/lib/entries/schema';
import { handler, json, route } from '@/lib/http/handler';
import { findOrchard } from '@/lib/orchards/find';
import { Member } from '@/lib/orchards/schema';
import { membersOf } from '@/lib/orchards/table';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    {
      as: 'grower',
      summary: 'Who belongs to an orchard, for its members',
      params: z.object({ id: Uuid }),
      output: z.object({ items: z.array(Member), nextCursor: z.null() }),
      find: ({ db, actor, params }) => findOrchard(db, actor, params.id),
    },
    async ({ db, subject }) => json({ items: await membersOf(db, subject.facts), nextCursor: null }),
  ),
});
