import { z } from 'zod';
import { Uuid } from '@/lib/entries/schema';
import { handler, json, route } from '@/lib/http/handler';
import { enablePerson, lockPerson } from '@/lib/people/admin';
import { Person } from '@/lib/people/schema';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handler(
    {
      as: 'admin',
      summary: 'Open a disabled account again',
      params: z.object({ id: Uuid }),
      output: Person,
      find: ({ db, params }) => lockPerson(db, params.id),
    },
    async ({ db, subject, audit }) => {
      if (!subject.disabled) return json(subject);
      const person = await enablePerson(db, subject);
      await audit({ action: 'person.enable', subject: { kind: 'person', id: person.id } });
      return json(person);
    },
  ),
});
