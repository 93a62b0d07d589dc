import type { Db } from '@/lib/database';
import { Conflict, NotFound } from '@/lib/errors/errors';
import { writeCursor, type Page } from '@/lib/lists/cursor';
import type { Role } from './actor';
import type { Person } from './schema';

const columns = {
  id: 'id',
  email: 'email',
  name: 'name',
  role: 'role',
  disabledAt: 'disabled_at',
} as const;
type Row = Omit<Person, 'disabled'> & { disabledAt: Date | null };

const asPerson = ({ disabledAt, ...row }: Row): Person => ({ ...row, disabled: disabledAt !== null });

export type PeopleQuery = { q?: string | undefined; limit: number; cursor?: [string, string] | undefined };

/** People by e-mail address, `q` being part of the address or the name. */
export async function listPeople(db: Db, { q, limit, cursor }: PeopleQuery): Promise<Page<Person>> {
  const query = db('people')
    .orderBy('email')
    .limit(limit + 1)
    .select<Row[]>(columns);
  if (cursor) query.where('email', '>', cursor[0]);
  const wanted = q?.trim();
  if (wanted) {
    const part = `%${wanted.replace(/[\\%_]/g, '\\$&')}%`;
    query.where((any) => any.where('email', 'like', part).orWhere('name', 'like', part));
  }
  const rows = await query;
  const items = rows.slice(0, limit).map(asPerson);
  const last = items.at(-1);
  return { items, nextCursor: rows.length > limit && last ? writeCursor([last.email, last.id]) : null };
}

/**
 * The person's row, held until the transaction ends. The enabled admins' rows are held before it, in one order, so that
 * two admins who step down at once are asked one after the other.
 * @throws NotFound
 */
export async function lockPerson(db: Db, id: string): Promise<Person & { otherAdmins: number }> {
  const admins = await db('people')
    .where({ role: 'admin' })
    .whereNull('disabled_at')
    .orderBy('id')
    .forUpdate()
    .select<{ id: string }[]>('id');
  const row = await db('people').where({ id }).forUpdate().first<Row | undefined>(columns);
  if (!row) throw new NotFound();
  return { ...asPerson(row), otherAdmins: admins.filter((admin) => admin.id !== id).length };
}

/**
 * Gives a person another role. They stay signed in: their row is read at each request, so the new role counts from the
 * next one.
 * @throws Conflict when nobody would be left to manage people
 */
export async function changeRole(
  db: Db,
  person: Person & { otherAdmins: number },
  role: Role,
): Promise<Person> {
  if (role !== 'admin') keepAnAdmin(person);
  await db('people').where({ id: person.id }).update({ role });
  return { ...person, role };
}

/**
 * Closes an account for as long as it is disabled, and ends every session of it for good.
 * @throws Conflict when nobody would be left to manage people
 */
export async function disablePerson(db: Db, person: Person & { otherAdmins: number }): Promise<Person> {
  if (person.disabled) return person;
  keepAnAdmin(person);
  await db('people')
    .where({ id: person.id })
    .update({ disabled_at: new Date() })
    .increment('session_version', 1);
  return { ...person, disabled: true };
}

export async function enablePerson(db: Db, person: Person): Promise<Person> {
  await db('people').where({ id: person.id }).update({ disabled_at: null });
  return { ...person, disabled: false };
}

function keepAnAdmin(person: Person & { otherAdmins: number }): void {
  if (person.role === 'admin' && !person.disabled && person.otherAdmins === 0) {
    throw new Conflict('This is the last admin. Make somebody else an admin first.');
  }
}
