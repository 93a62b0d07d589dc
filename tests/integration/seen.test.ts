import { parse } from 'csv-parse/sync';
import { beforeAll, describe, expect, it } from 'vitest';
import * as codebookRoute from '@/app/api/data/codebook.json/route';
import * as csvRoute from '@/app/api/data/readings.csv/route';
import * as responseRoute from '@/app/api/species/[slug]/response/route';
import type { SpeciesResponse } from '@/lib/cases/schema';
import { database } from '@/lib/database';
import { acceptedEntry, entries, entryBody, expectView, readingBody } from './setup/entries';
import { makeOrchard, makePerson, type TestPerson } from './setup/people';
import { call, read } from './setup/request';

let one: TestPerson;
let two: TestPerson;
let moderator: TestPerson;
let orchardOne: string;
let orchardTwo: string;
beforeAll(async () => {
  one = await makePerson('grower', 'Nameworthy One');
  two = await makePerson('grower', 'Nameworthy Two');
  moderator = await makePerson('moderator');
  orchardOne = await makeOrchard(one, { name: 'Secretname Hollow' });
  orchardTwo = await makeOrchard(two, { name: 'Secretname Ridge' });
});

async function response(slug: string, query = ''): Promise<SpeciesResponse> {
  const path = `/api/species/${slug}/response${query}`;
  return read<SpeciesResponse>(await call(responseRoute, 'GET', path, { params: { slug } }));
}
const heavyRemoved = (all: SpeciesResponse) =>
  all.cases.find((one) => one.class === 'heavy' && one.tip === 'removed')?.seen;

describe('what was seen', () => {
  const species = 'corylus-avellana';
  const nobody = {
    entries: 0,
    growers: 0,
    orchards: 0,
    branches: 0,
    rate: null,
    sd: null,
    perMetre: null,
    none: null,
  };

  it('has all nine cases, empty where nobody recorded one', async () => {
    const all = await response('taxus-baccata');
    expect(all.cases.map((one) => `${one.class} ${one.tip}`)).toEqual([
      'uncut kept',
      'light kept',
      'light removed',
      'moderate kept',
      'moderate removed',
      'heavy kept',
      'heavy removed',
      'severe kept',
      'severe removed',
    ]);
    expect(
      all.cases.every(
        ({ seen, expected }) => expected === null && JSON.stringify(seen) === JSON.stringify(nobody),
      ),
    ).toBe(true);
    expect(all.otherCuts).toEqual([]);
  });

  it('follows each accept and withdrawal at once, to hand-computed figures', async () => {
    // 7 + 4 + 11 on 3 of 4 branches, one lost; 1.8 m left of each: 22 / 3 a branch, 22 / 5.4 a metre.
    const first = await acceptedEntry(one, moderator, entryBody(orchardOne, { species }));
    expect(heavyRemoved(await response(species))).toEqual({
      entries: 1,
      growers: 1,
      orchards: 1,
      branches: 3,
      rate: 22 / 3,
      sd: null,
      perMetre: expect.closeTo(22 / 5.4, 12) as number,
      none: 0,
    });
    // A total over 4 branches, no length: it adds 2 shoots, 4 branches, and says nothing of bare ones.
    const total = readingBody({ counts: null, total: 2, branches: 4 });
    await acceptedEntry(
      two,
      moderator,
      entryBody(orchardTwo, { species, readings: [total] }, { retainedLength: null, removedLength: null }),
    );
    const rates = [22 / 3, 2 / 4];
    const mean = (22 / 3 + 2 / 4) / 2;
    const sd = Math.sqrt(rates.reduce((sum, rate) => sum + (rate - mean) ** 2, 0));
    expect(heavyRemoved(await response(species))).toMatchObject({
      entries: 2,
      growers: 2,
      orchards: 2,
      branches: 7,
      rate: 24 / 7,
      sd: expect.closeTo(sd, 12) as number,
      perMetre: expect.closeTo(22 / 5.4, 12) as number,
      none: 0,
    });
    await entries.remove(one, first.id, first.revision);
    expect(heavyRemoved(await response(species))).toMatchObject({ entries: 1, branches: 4, rate: 0.5 });
  });

  it('takes the last unthinned reading within fourteen days of the week, both ends included', async () => {
    const slug = 'juglans-regia';
    const readings = [
      readingBody({ date: '2026-03-31', counts: [1, 1, 1, 1] }), // 28 days
      readingBody({ date: '2026-04-14', counts: [2, 2, 2, 2] }), // 42 days
      readingBody({ date: '2026-05-12', counts: [0, 0, 8, 8], removed: 5 }), // 70 days
      readingBody({ date: '2026-05-13', counts: [9, 9, 9, 9] }), // 71 days, thinned
    ];
    await acceptedEntry(one, moderator, entryBody(orchardOne, { species: slug, readings }));
    const rate = async (weeks: number) => heavyRemoved(await response(slug, `?weeks=${weeks}`))?.rate;
    expect(await rate(8)).toBe(4); // 42 to 70 days: the last is at 70
    expect(heavyRemoved(await response(slug))?.none).toBe(0.5);
    expect(await rate(4)).toBe(2); // 14 to 42
    expect(await rate(2)).toBe(1); // 0 to 28
    expect(await rate(12)).toBe(4); // 70 to 98: 71 is thinned
    expect(await rate(13)).toBeNull();
  });

  it('leaves out what the bench set aside, drafts, and what waits', async () => {
    const slug = 'punica-granatum';
    const id = (
      await expectView(
        await entries.put(one, crypto.randomUUID(), entryBody(orchardOne, { species: slug })),
        201,
      )
    ).id;
    expect(heavyRemoved(await response(slug))?.entries).toBe(0);
    const view = await expectView(await entries.submit(one, id));
    expect(heavyRemoved(await response(slug))?.entries).toBe(0);
    await entries.decide(moderator, id, { decision: 'accept', setAside: [view.readings[0]?.id] });
    expect(heavyRemoved(await response(slug))?.entries).toBe(0);
  });

  it('keeps pollards, coppice and thinning cuts apart, and moves with a changed species', async () => {
    const slug = 'salix-alba';
    const { id } = await acceptedEntry(
      one,
      moderator,
      entryBody(orchardOne, { species: slug }, { kind: 'pollarding', severity: 0.9 }),
    );
    const all = await response(slug);
    expect(all.otherCuts).toEqual([{ kind: 'pollarding', entries: 1, branches: 3, rate: 22 / 3 }]);
    expect(all.cases.every(({ seen }) => seen.entries === 0)).toBe(true);
    const { readings: left, ...moved } = entryBody(orchardOne, { species: 'salix-viminalis' });
    void left;
    await expectView(await entries.put(one, id, moved, 1));
    await entries.submit(one, id);
    await entries.decide(moderator, id, { decision: 'accept' });
    expect((await response(slug)).otherCuts).toEqual([]);
    expect(heavyRemoved(await response('salix-viminalis'))?.entries).toBe(1);
  });

  it.each(['?weeks=0', '?weeks=105', '?weeks=x', '?week=8'])('refuses %s', async (query) => {
    const slug = 'ficus-carica';
    expect(
      (await call(responseRoute, 'GET', `/api/species/${slug}/response${query}`, { params: { slug } }))
        .status,
    ).toBe(422);
  });
});

describe('the open data', () => {
  it('hold every accepted reading once, by the columns of the codebook, without names or places', async () => {
    await acceptedEntry(
      two,
      moderator,
      entryBody(orchardTwo, { species: 'morus-nigra', cultivar: '=HYPERLINK("x")' }),
    );
    const text = await (await call(csvRoute, 'GET', '/api/data/readings.csv')).text();
    const rows = parse(text, { columns: true }) as Record<string, string>[];
    const { readings: columns } = await read<{ readings: { name: string }[] }>(
      await call(codebookRoute, 'GET', '/api/data/codebook.json'),
    );
    expect(Object.keys(rows[0] ?? {})).toEqual(columns.map(({ name }) => name));
    const accepted = await database()('readings')
      .join('entries', 'entries.accepted_id', 'readings.revision_id')
      .where({ status: 'accepted', set_aside: false })
      .pluck<string[]>('readings.id');
    expect(rows.map(({ reading }) => reading).sort()).toEqual(accepted.sort());
    const row = rows.find(({ species }) => species === 'morus-nigra');
    expect(row).toMatchObject({
      genus: 'Morus',
      severity: '0.4',
      class: 'heavy',
      tip: 'removed',
      weeks: '8',
      stage: 'dormant',
      branches: '3',
      count: '22',
      counts: '7;;4;11',
      thinned: '0',
      cell_latitude: '12.35',
      cell_longitude: '-45.65',
      elevation: '400',
      cultivar: '\'=HYPERLINK("x")',
    });
    for (const secret of [
      'Secretname',
      'Nameworthy',
      one.id,
      two.id,
      orchardOne,
      orchardTwo,
      '12.3456',
      '45.6789',
    ]) {
      expect(text).not.toContain(secret);
    }
  });
});
