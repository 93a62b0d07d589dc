import { v7 as newId } from 'uuid';
import { database } from '@/lib/database';
import type { Role } from '@/lib/people/actor';
import { hashPassword } from '@/lib/people/passwords';

export const PASSWORD = 'plum gravel lantern';

export type TestPerson = { id: string; email: string; name: string; role: Role };

let hash: Promise<string> | undefined;

/** Makes somebody with an account and the password `PASSWORD`. */
export async function makePerson(role: Role = 'grower', name = 'Somebody'): Promise<TestPerson> {
  const id = newId();
  const person = { id, email: `${id}@people.example`, name, role };
  const passwordHash = await (hash ??= hashPassword(PASSWORD));
  await database()('people').insert({ ...person, password_hash: passwordHash });
  return person;
}

/** Makes an orchard of somebody's, with helpers. Gives its id. */
export async function makeOrchard(
  owner: { id: string },
  { helpers = [], name = 'A terrace' }: { helpers?: readonly { id: string }[]; name?: string } = {},
): Promise<string> {
  const id = newId();
  await database()('orchards').insert({
    id,
    owner_id: owner.id,
    name,
    latitude: 12.3456,
    longitude: -45.6789,
    elevation_m: 420,
    time_zone: 'Etc/UTC',
    sun: 'full',
    wind: 'sheltered',
    water: 'moderate',
  });
  if (helpers.length > 0) {
    await database()('orchard_members').insert(
      helpers.map((helper) => ({ orchard_id: id, person_id: helper.id })),
    );
  }
  return id;
}
