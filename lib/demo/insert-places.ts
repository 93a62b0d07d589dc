import type { Db } from '@/lib/database';
import { put } from './batches';
import type { Demo } from './types';

/** Writes who and where: people, orchards, their helpers and trees. */
export async function insertPlaces(
  db: Db,
  demo: Demo,
  passwordHashOf: (person: Demo['people'][number]) => string,
): Promise<void> {
  await put(
    db,
    'people',
    demo.people.map((person) => ({
      id: person.id,
      email: person.email,
      name: person.name,
      password_hash: passwordHashOf(person),
      role: person.role,
      units: person.units,
      email_confirmed_at: person.createdAt,
      created_at: person.createdAt,
    })),
  );
  await put(
    db,
    'orchards',
    demo.orchards.map((orchard) => ({
      id: orchard.id,
      owner_id: orchard.ownerId,
      name: orchard.name,
      latitude: orchard.latitude,
      longitude: orchard.longitude,
      elevation_m: orchard.elevationM,
      time_zone: orchard.timeZone,
      ...orchard.place,
      created_at: orchard.createdAt,
      updated_at: orchard.createdAt,
    })),
  );
  await put(
    db,
    'orchard_members',
    demo.members.map((member) => ({
      orchard_id: member.orchardId,
      person_id: member.personId,
      joined_at: member.joinedAt,
    })),
  );
  await put(
    db,
    'trees',
    demo.trees.map((tree) => ({
      id: tree.id,
      orchard_id: tree.orchardId,
      label: tree.label,
      species: tree.species,
      cultivar: tree.cultivar,
      year_planted: tree.yearPlanted,
      created_at: tree.createdAt,
      updated_at: tree.createdAt,
    })),
  );
}
