import { z } from 'zod';
import { Uuid } from '@/lib/entries/schema';
import { handler, json, route } from '@/lib/http/handler';
import { changeRole, lockPerson } from '@/lib/people/admin';
import { Person, RoleBody } from '@/lib/people/schema';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  PUT: handler(
    {
      as: 'admin',
      summary: 'Give a person a role; it counts from their next request',
      params: z.object({ id: Uuid }),
      body: RoleBody,
      output: Person,
      find: ({ db, params }) => lockPerson(db, params.id),
    },
    async ({ db, subject, body, audit }) => {
      if (subject.role === body.role) return json(subject);
      const person = await changeRole(db, subject, body.role);
      const detail = { from: subject.role, to: body.role };
      await audit({ action: 'person.role', subject: { kind: 'person', id: person.id }, detail });
      return json(person);
    },
  ),
});
