import { beforeAll, describe, expect, it } from 'vitest';
import { generateDemo } from '@/lib/demo/generate';
import { readHandwritten } from '@/lib/demo/handwritten';
import { insertDemo } from '@/lib/demo/insert';
import { DEMO_SEED, seedIfEmpty } from '@/lib/demo/seed';
import { database } from '@/lib/database';
import { loadRevisions } from '@/lib/entries/load';
import { plainContent } from '@/lib/entries/revisions';
import { NOBODYS_HASH, isPassword } from '@/lib/people/passwords';
import { emptyTables } from './setup/database';
import { syncSpecies } from '@/lib/species/sync';

const TODAY = '2026-12-01';
const settings = { DEMO: true, DEMO_PASSWORD: 'after-the-cut' };
const lines: string[] = [];

async function count(table: string): Promise<number> {
  const [row] = await database()(table).count<{ n: number }[]>({ n: '*' });
  return Number(row?.n);
}

describe('an empty database is filled with the demo', () => {
  beforeAll(() => seedIfEmpty(database(), settings, (line) => lines.push(line), TODAY));

  it('whole, and says how long it took', async () => {
    expect(await count('people')).toBe(62);
    expect(await count('orchards')).toBe(45);
    expect(await count('entries')).toBe(902);
    expect(lines.at(-1)).toMatch(/all invented \(\d+\.\d s\)/);
    console.log(lines.at(-1));
  });

  it('a second call changes nothing', async () => {
    const before = await database()('entries').max('updated_at');
    await seedIfEmpty(database(), settings, (line) => lines.push(line), '2027-01-01');
    expect(await count('people')).toBe(62);
    expect(await count('entries')).toBe(902);
    expect(await database()('entries').max('updated_at')).toEqual(before);
    expect(lines).toHaveLength(2);
  });

  it('the five sign in with the demo\u2019s password, the others with none', async () => {
    const people = await database()('people').select<{ email: string; hash: string }[]>({
      email: 'email',
      hash: 'password_hash',
    });
    const open = people.filter(({ hash }) => hash !== NOBODYS_HASH);
    expect(open.map(({ email }) => email).sort()).toEqual(
      ['admin', 'grower', 'helper', 'moderator', 'neighbour'].map((name) => `${name}@aftercut.example`),
    );
    for (const { hash } of open) expect(await isPassword(hash, 'after-the-cut')).toBe(true);
    expect(await isPassword(NOBODYS_HASH, 'after-the-cut')).toBe(false);
    expect(await database()('people').whereNull('email_confirmed_at')).toEqual([]);
  });

  it('what stands in the tables is what was generated, to the last count', async () => {
    const entries = await database()('entries').select<{ id: string; workingId: number }[]>({
      id: 'id',
      workingId: 'working_id',
    });
    const revisions = await loadRevisions(
      database(),
      entries.map(({ workingId }) => workingId),
    );
    const thinned = [...revisions.values()].flatMap(({ content }) =>
      content.readings.filter((one) => one.thinned),
    );
    expect(thinned.length).toBeGreaterThan(30);
    const demo = generateDemo({ seed: DEMO_SEED, today: TODAY, handwritten: readHandwritten() });
    const wanted = new Map(demo.entries.map((entry) => [entry.id, entry.pending ?? entry.content]));
    for (const { id, workingId } of entries) {
      const stored = revisions.get(workingId);
      if (!stored) throw new Error(`entry ${id} has no working revision`);
      expect(plainContent(stored)).toEqual(wanted.get(id));
    }
  });

  it('pointers agree with where each entry stands', async () => {
    const db = database();
    const entries = () => db('entries');
    expect(
      await entries().where('status', 'waiting').whereRaw('waiting_id = working_id').whereNull('accepted_id'),
    ).toHaveLength(3);
    expect(await entries().whereRaw('accepted_id IS NOT NULL AND accepted_id <> working_id')).toHaveLength(1);
    expect(
      await entries()
        .whereIn('status', ['draft', 'returned'])
        .whereRaw('(accepted_id IS NOT NULL OR waiting_id IS NOT NULL)'),
    ).toEqual([]);
    const wrong = await db('entries')
      .join('revisions', 'revisions.id', 'entries.accepted_id')
      .whereRaw(
        'NOT (revisions.entry_id = entries.id AND revisions.accepted_at <=> entries.accepted_at AND revisions.accepted_by <> entries.owner_id)',
      );
    expect(wrong).toEqual([]);
    const stale = await db('entries')
      .join('revisions', 'revisions.id', 'entries.working_id')
      .whereRaw('revisions.number <> entries.revision');
    expect(stale).toEqual([]);
  });

  it('every accepted species has a version for its figures', async () => {
    const species = await database()('entries')
      .join('revisions', 'revisions.id', 'entries.accepted_id')
      .where('entries.status', 'accepted')
      .distinct<{ species: string }[]>('revisions.species');
    const subjects = await database()('data_versions').pluck<string[]>('subject');
    expect(subjects.sort()).toEqual(['accepted', ...species.map((row) => `species:${row.species}`)].sort());
  });
});

describe('nobody is made up', () => {
  it('with DEMO off, though the catalogue is brought in step', async () => {
    await emptyTables();
    await seedIfEmpty(database(), { ...settings, DEMO: false }, () => undefined, TODAY);
    expect(await count('people')).toBe(0);
    expect(await count('species')).toBeGreaterThanOrEqual(200);
  });

  it('half: where one row is refused, nothing stays', async () => {
    await emptyTables();
    await syncSpecies(database());
    const demo = generateDemo({ seed: 1, today: TODAY, entries: 80, growers: 14, orchards: 12 });
    const last = demo.entries.at(-1);
    if (last) last.content = { ...last.content, species: 'no-such-tree' };
    const options = { acceptedBy: demo.people[3]?.id ?? '', passwordHashOf: () => NOBODYS_HASH };
    await expect(database().transaction((trx) => insertDemo(trx, demo, options))).rejects.toThrow(/species/);
    expect(await count('people')).toBe(0);
  });
});

describe('the species table follows the catalogue', () => {
  it('takes changes over, and keeps what left with a warning', async () => {
    const db = database();
    await syncSpecies(db);
    await db('species').where({ slug: 'ficus-carica' }).update({ scientific: 'Something else' });
    await db('species').insert({ slug: 'left-behind', scientific: 'Left behind', genus: 'Left', wood: null });
    const warnings = await syncSpecies(db);
    expect(warnings).toHaveLength(1);
    expect(warnings[0]).toContain('left-behind');
    expect(await db('species').where({ slug: 'ficus-carica' }).first()).toMatchObject({
      scientific: 'Ficus carica',
    });
    expect(await db('species').where({ slug: 'left-behind' }).first()).toBeDefined();
  });
});
