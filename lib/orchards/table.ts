import type { Knex } from 'knex';
import type { Db } from '@/lib/database';
import type { Actor } from '@/lib/people/actor';
import type { OrchardFacts } from '@/lib/policy/policy';
import type { Member, Orchard, OrchardBody, Tree } from './schema';

/** An orchard with all that is known of it, for the rooms and pages of its members. */
export type StoredOrchard = {
  id: string;
  revision: number;
  facts: OrchardFacts;
  owner: string;
  createdAt: Date;
  updatedAt: Date;
  content: Omit<OrchardBody, 'latitude' | 'longitude' | 'place'> & {
    latitude: number | null;
    longitude: number | null;
    place: Orchard['place'];
  };
};

type Row = {
  id: string;
  ownerId: string;
  owner: string;
  revision: number;
  createdAt: Date;
  updatedAt: Date;
  name: string;
  latitude: string | number | null;
  longitude: string | number | null;
  elevation: string | number | null;
  timeZone: string;
  sun: Orchard['place']['sun'];
  wind: Orchard['place']['wind'];
  water: Orchard['place']['water'];
};

const columns = {
  id: 'orchards.id',
  ownerId: 'orchards.owner_id',
  revision: 'orchards.revision',
  createdAt: 'orchards.created_at',
  updatedAt: 'orchards.updated_at',
  name: 'orchards.name',
  latitude: 'orchards.latitude',
  longitude: 'orchards.longitude',
  elevation: 'orchards.elevation_m',
  timeZone: 'orchards.time_zone',
  sun: 'orchards.sun',
  wind: 'orchards.wind',
  water: 'orchards.water',
};

/** The orchard of this id, or null; with `lock`, held until the transaction ends. */
export async function readOrchard(
  db: Db,
  id: string,
  { lock = false }: { lock?: boolean } = {},
): Promise<StoredOrchard | null> {
  const query = db('orchards').where('orchards.id', id).first<Omit<Row, 'owner'> | undefined>(columns);
  const row = await (lock ? query.forUpdate() : query);
  if (!row) return null;
  const [owner, helpers] = await Promise.all([
    db('people').where({ id: row.ownerId }).first<{ name: string } | undefined>('name'),
    db('orchard_members').where({ orchard_id: id }).select<{ personId: string }[]>({ personId: 'person_id' }),
  ]);
  const helperIds = helpers.map(({ personId }) => personId);
  return stored({ ...row, owner: owner?.name ?? '' }, helperIds);
}

/** The orchards somebody owns or helps in, by name; from after `cursor`, one more than `limit`. */
export async function orchardsOf(
  db: Db,
  actor: Actor,
  { limit, cursor }: { limit: number; cursor?: [string, string] | undefined },
): Promise<StoredOrchard[]> {
  const helped = (query: Knex.QueryBuilder) =>
    query.from('orchard_members').where({ person_id: actor.id }).select('orchard_id');
  const rows = await db('orchards')
    .join('people', 'people.id', 'orchards.owner_id')
    .where((any) => any.where('orchards.owner_id', actor.id).orWhereIn('orchards.id', helped))
    .modify((query) => {
      if (cursor) query.whereRaw('(orchards.name, orchards.id) > (?, ?)', cursor);
    })
    .orderBy(['orchards.name', 'orchards.id'])
    .limit(limit + 1)
    .select<Row[]>({ ...columns, owner: 'people.name' });
  return rows.map((row) => stored(row, row.ownerId === actor.id ? [] : [actor.id]));
}

function stored(row: Row, helperIds: string[]): StoredOrchard {
  const number = (value: string | number | null) => (value === null ? null : Number(value));
  return {
    id: row.id,
    revision: row.revision,
    facts: { ownerId: row.ownerId, helperIds },
    owner: row.owner,
    createdAt: row.createdAt,
    updatedAt: row.updatedAt,
    content: {
      name: row.name,
      latitude: number(row.latitude),
      longitude: number(row.longitude),
      elevation: number(row.elevation),
      timeZone: row.timeZone,
      place: { sun: row.sun, wind: row.wind, water: row.water },
    },
  };
}

/** What of a body stands in which column. */
export function orchardColumns(body: OrchardBody): Record<string, string | number | null> {
  return {
    name: body.name,
    latitude: body.latitude,
    longitude: body.longitude,
    elevation_m: body.elevation,
    time_zone: body.timeZone,
    ...body.place,
  };
}

/** The orchard as this member sees it. */
export function orchardView(actor: Actor, orchard: StoredOrchard): Orchard {
  return {
    id: orchard.id,
    revision: orchard.revision,
    owner: orchard.owner,
    role: orchard.facts.ownerId === actor.id ? 'owner' : 'helper',
    createdAt: orchard.createdAt.toISOString(),
    updatedAt: orchard.updatedAt.toISOString(),
    ...orchard.content,
  };
}

const treeColumns = {
  id: 'id',
  revision: 'revision',
  label: 'label',
  species: 'species',
  cultivar: 'cultivar',
  yearPlanted: 'year_planted',
};

/** The trees of an orchard, by label. */
export async function treesOf(db: Db, orchardId: string): Promise<Tree[]> {
  return db('trees').where({ orchard_id: orchardId }).orderBy(['label', 'id']).select<Tree[]>(treeColumns);
}

/** The tree of this id wherever it stands, held until the transaction ends, or null. */
export async function lockTree(db: Db, id: string): Promise<(Tree & { orchardId: string }) | null> {
  const row = await db('trees')
    .where({ id })
    .forUpdate()
    .first<(Tree & { orchardId: string }) | undefined>({ ...treeColumns, orchardId: 'orchard_id' });
  return row ?? null;
}

/** Who belongs to an orchard: its owner, then its helpers by name. */
export async function membersOf(db: Db, { ownerId, helperIds }: OrchardFacts): Promise<Member[]> {
  const people = await db('people')
    .whereIn('id', [ownerId, ...helperIds])
    .orderBy(['name', 'id'])
    .select<{ id: string; name: string }[]>('id', 'name');
  const members = people.map(
    ({ id, name }) => ({ id, name, role: id === ownerId ? 'owner' : 'helper' }) as const,
  );
  return members.sort((a, b) => Number(b.role === 'owner') - Number(a.role === 'owner'));
}
