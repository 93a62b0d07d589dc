import { v4 as anyId, v7 as newId } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/lib/database';
import { acceptedEntry, entries, entryBody, expectView, readingBody } from './setup/entries';
import { makeOrchard, makePerson, type TestPerson } from './setup/people';
import { read } from './setup/request';

let owner: TestPerson;
let helper: TestPerson;
let stranger: TestPerson;
let moderator: TestPerson;
let orchard: string;
beforeAll(async () => {
  owner = await makePerson('grower', 'Olive Owner');
  helper = await makePerson('grower', 'Hal Helper');
  stranger = await makePerson('grower', 'Sam Stranger');
  moderator = await makePerson('moderator', 'Mo Moderator');
  orchard = await makeOrchard(owner, { helpers: [helper], name: 'Quillstone Terrace' });
});

type Problem = { status: number; errors?: { path: string; message: string }[]; revision?: number };
const paths = async (answer: Response) => (await read<Problem>(answer)).errors?.map(({ path }) => path);
const saved = async (body: unknown = entryBody(orchard)) => {
  const id = newId();
  return expectView(await entries.put(owner, id, body), 201);
};

describe('saving an entry', () => {
  it('creates it once, however often the same is sent', async () => {
    const id = newId();
    const body = entryBody(orchard);
    const first = await entries.put(owner, id, body);
    expect([first.status, first.headers.get('etag')]).toEqual([201, '"1"']);
    const again = await entries.put(owner, id, body);
    expect([again.status, again.headers.get('etag')]).toEqual([200, '"1"']);
  });

  it('sent twice at the same moment makes one', async () => {
    const id = newId();
    const body = entryBody(orchard);
    const statuses = (await Promise.all([1, 2, 3].map(() => entries.put(owner, id, body)))).map(
      ({ status }) => status,
    );
    expect(statuses.sort()).toEqual([200, 200, 201]);
    expect(await database()('revisions').where({ entry_id: id })).toHaveLength(1);
  });

  it('gives back what was sent, to the digit', async () => {
    const body = entryBody(orchard, {}, { severity: 0.333333, retainedLength: 1.234567 });
    const view = await saved(body);
    expect(view).toMatchObject(body);
    expect(view).toMatchObject({
      status: 'draft',
      class: 'moderate',
      owner: 'Olive Owner',
      credits: [{ name: 'Olive Owner' }],
    });
  });

  it('replaces under If-Match; a stale one is 412 with the current revision, and nothing is overwritten', async () => {
    const { id } = await saved();
    const changed = await entries.put(owner, id, entryBody(orchard, { title: 'Second' }), 1);
    expect([changed.status, changed.headers.get('etag')]).toEqual([200, '"2"']);
    const stale = await entries.put(owner, id, entryBody(orchard, { title: 'Third' }), 1);
    expect(stale.status).toBe(412);
    expect(await read(stale)).toMatchObject({ revision: 2 });
    expect((await entries.put(owner, id, entryBody(orchard, { title: 'Third' }))).status).toBe(428);
    expect((await expectView(await entries.get(owner, id))).title).toBe('Second');
  });

  it('takes a draft with anything missing', async () => {
    const view = await saved({});
    expect(view).toMatchObject({
      title: null,
      species: null,
      readings: [],
      doc: { type: 'doc', content: [] },
    });
    expect((await entries.put(owner, view.id, { cut: { tip: 'kept' } }, 1)).status).toBe(200);
  });

  it('leaves readings alone when none are given, and replaces them all when some are', async () => {
    const { id, readings } = await saved();
    const { readings: left, ...rest } = entryBody(orchard, { title: 'Other' });
    void left;
    const kept = await expectView(await entries.put(owner, id, rest, 1));
    expect(kept.readings).toEqual(readings);
    const other = readingBody({ counts: [1, 2] });
    const replaced = await expectView(await entries.put(owner, id, { ...rest, readings: [other] }, 2));
    expect(replaced.readings.map((one) => one.id)).toEqual([other.id]);
  });

  it.each([
    ['a reading before its cut', { readings: [readingBody({ date: '2026-03-02' })] }, {}, 'readings.0.date'],
    ['a date after tomorrow', {}, { date: '2999-01-01' }, 'cut.date'],
    ['501 branches', {}, { branches: 501 }, 'cut.branches'],
    ['half a branch', {}, { branches: 1.5 }, 'cut.branches'],
    ['a length of 101 m', {}, { retainedLength: 101 }, 'cut.retainedLength'],
    ['a diameter of 6 m', {}, { diameter: 6 }, 'cut.diameter'],
    ['a severity of 1.2', {}, { severity: 1.2 }, 'cut.severity'],
    [
      'more counts than branches',
      { readings: [readingBody({ counts: [1, 2, 3, 4, 5] })] },
      {},
      'readings.0.counts',
    ],
    ['a count of 1000', { readings: [readingBody({ counts: [1000] })] }, {}, 'readings.0.counts.0'],
    ['a negative count', { readings: [readingBody({ counts: [-1] })] }, {}, 'readings.0.counts.0'],
    ['counts and a total', { readings: [readingBody({ total: 22, branches: 4 })] }, {}, 'readings.0.total'],
    ['a cut of nothing that is no control', {}, { severity: 0 }, 'cut.kind'],
    ['a control with a severity', {}, { kind: 'none', tip: 'kept' }, 'cut.severity'],
    ['a control without its tip', {}, { kind: 'none', severity: 0 }, 'cut.tip'],
    ['a depth beyond the highest land', { place: { elevation: 9001 } }, {}, 'place.elevation'],
    ['a species that is not in the catalogue', { species: 'ficus-imaginaria' }, {}, 'species'],
    ['a field that does not exist', { colour: 'green' }, {}, 'colour'],
    ['a field of the cut that does not exist', {}, { depth: 1 }, 'cut.depth'],
    ['another document version', { schemaVersion: 2 }, {}, 'schemaVersion'],
    ['a title of 201 characters', { title: 'x'.repeat(201) }, {}, 'title'],
    ['a kind that nobody knows', {}, { kind: 'lopping' }, 'cut.kind'],
  ])('refuses %s, even in a draft, and stores nothing', async (_, change, cut, path) => {
    const id = newId();
    const answer = await entries.put(owner, id, entryBody(orchard, change, cut));
    expect(answer.status).toBe(422);
    expect(await paths(answer)).toContain(path);
    expect((await entries.get(owner, id)).status).toBe(404);
  });

  it.each([
    ['an image', { type: 'image', attrs: { src: 'https://elsewhere.example/x.png' } }],
    [
      'a link that runs',
      {
        type: 'paragraph',
        content: [
          { type: 'text', text: 'x', marks: [{ type: 'link', attrs: { href: 'javascript:alert(1)' } }] },
        ],
      },
    ],
    [
      'a mark that nobody knows',
      { type: 'paragraph', content: [{ type: 'text', text: 'x', marks: [{ type: 'blink' }] }] },
    ],
  ])('refuses a document with %s', async (_, node) => {
    const answer = await entries.put(
      owner,
      newId(),
      entryBody(orchard, { doc: { type: 'doc', content: [node] } }),
    );
    expect(answer.status).toBe(422);
    expect((await paths(answer))?.every((path) => path.startsWith('doc'))).toBe(true);
  });

  it('asks for JSON, of at most a megabyte', async () => {
    const { call } = await import('./setup/request');
    const route = await import('@/app/api/entries/[id]/route');
    const send = (body: string, type: string) => {
      const id = newId();
      return call(route, 'PUT', `/api/entries/${id}`, {
        params: { id },
        actor: owner,
        body,
        headers: { 'content-type': type },
      });
    };
    expect((await send('{}', 'text/plain')).status).toBe(415);
    expect((await send('{"title": ', 'application/json')).status).toBe(400);
    expect((await send(JSON.stringify({ title: 'x'.repeat(1_100_000) }), 'application/json')).status).toBe(
      413,
    );
  });

  it('takes no orchard of somebody else: 403 for its helper, else a field to mend', async () => {
    expect((await entries.put(helper, newId(), entryBody(orchard))).status).toBe(403);
    const refused = await entries.put(stranger, newId(), entryBody(orchard));
    expect([refused.status, await paths(refused)]).toEqual([422, ['orchard']]);
    const unknown = await entries.put(owner, newId(), entryBody(anyId()));
    expect([unknown.status, await paths(unknown)]).toEqual([422, ['orchard']]);
    const noTree = await entries.put(owner, newId(), entryBody(orchard, { tree: anyId() }));
    expect([noTree.status, await paths(noTree)]).toEqual([422, ['tree']]);
  });

  it('is the owner’s alone: 404 while it is private, 403 once it is public', async () => {
    const draft = await saved();
    for (const who of [stranger, moderator])
      expect((await entries.put(who, draft.id, {}, 1)).status).toBe(404);
    expect((await entries.put(helper, draft.id, {}, 1)).status).toBe(403);
    const open = await acceptedEntry(owner, moderator, entryBody(orchard));
    for (const who of [stranger, helper, moderator])
      expect((await entries.put(who, open.id, {}, 1)).status).toBe(403);
    expect((await entries.put(null, open.id, {}, 1)).status).toBe(401);
  });
});

describe('one reading', () => {
  it('is added, replaced and removed under its own revision, by owner and helper, and raises the entry’s', async () => {
    const { id } = await saved();
    const { id: readingId, ...body } = readingBody({ date: '2026-05-26', counts: [8, null, 5, 12] });
    const added = await entries.putReading(helper, id, readingId, body);
    expect([added.status, added.headers.get('etag')]).toEqual([201, '"1"']);
    expect((await entries.putReading(helper, id, readingId, body)).status).toBe(200);
    expect((await expectView(await entries.get(owner, id))).revision).toBe(2);
    const changed = await entries.putReading(owner, id, readingId, { ...body, note: 'again' }, 1);
    expect([changed.status, changed.headers.get('etag')]).toEqual([200, '"2"']);
    expect((await entries.putReading(owner, id, readingId, body, 1)).status).toBe(412);
    expect((await entries.removeReading(owner, id, readingId, 1)).status).toBe(412);
    expect((await entries.removeReading(helper, id, readingId, 2)).status).toBe(204);
    expect((await expectView(await entries.get(owner, id))).readings).toHaveLength(1);
  });

  it('is nobody else’s to touch', async () => {
    const { id } = await saved();
    const { id: readingId, ...body } = readingBody();
    expect((await entries.putReading(stranger, id, readingId, body)).status).toBe(404);
    expect((await entries.putReading(null, id, readingId, body)).status).toBe(401);
    const open = await acceptedEntry(owner, moderator, entryBody(orchard));
    expect((await entries.putReading(stranger, open.id, readingId, body)).status).toBe(403);
    expect((await entries.putReading(moderator, open.id, readingId, body)).status).toBe(403);
  });

  it('cannot take the id of a reading elsewhere, nor a body of another id', async () => {
    const one = await saved();
    const two = await saved();
    const taken = one.readings[0]?.id ?? '';
    const { id: other, ...body } = readingBody();
    expect((await entries.putReading(owner, two.id, taken, body)).status).toBe(409);
    expect((await entries.putReading(owner, two.id, newId(), { ...body, id: other })).status).toBe(422);
    expect((await expectView(await entries.get(owner, one.id))).readings).toHaveLength(1);
  });

  it('before the cut or on more branches than were marked is refused with its own field', async () => {
    const { id } = await saved();
    const { id: readingId, ...body } = readingBody({ date: '2026-01-01' });
    expect(await paths(await entries.putReading(owner, id, readingId, body))).toEqual(['date']);
    const many = await entries.putReading(owner, id, readingId, {
      ...body,
      date: '2026-05-01',
      counts: [1, 2, 3, 4, 5],
    });
    expect(await paths(many)).toEqual(['counts']);
  });

  it('after flush was taken off is thinned, and the visit itself is not', async () => {
    const early = readingBody({ removed: 9 });
    const late = readingBody({ date: '2026-06-30' });
    const view = await saved(entryBody(orchard, { readings: [late, early] }));
    expect(view.readings.map(({ id, thinned, weeks }) => [id, thinned, weeks])).toEqual([
      [early.id, false, 8],
      [late.id, true, 17],
    ]);
  });
});

describe('who sees an entry', () => {
  it('depends on where it stands', async () => {
    const { id } = await saved();
    const statuses = async () =>
      Promise.all(
        [null, stranger, helper, owner, moderator].map(async (who) => (await entries.get(who, id)).status),
      );
    expect(await statuses()).toEqual([404, 404, 200, 200, 404]);
    await entries.submit(owner, id);
    expect(await statuses()).toEqual([404, 404, 200, 200, 200]);
    await entries.decide(moderator, id, { decision: 'accept' });
    expect(await statuses()).toEqual([200, 200, 200, 200, 200]);
    const { revision } = await expectView(await entries.get(owner, id));
    expect((await entries.remove(owner, id, revision)).status).toBe(204);
    expect(await statuses()).toEqual([404, 404, 404, 200, 200]);
  });

  it.each([
    ['an ordinary place', 12.3456, -45.6789, { latitude: 12.35, longitude: -45.65 }],
    ['south and west', -0.04, -0.04, { latitude: -0.05, longitude: -0.05 }],
    ['the pole and the date line', 90, 180, { latitude: 89.95, longitude: 179.95 }],
    ['the other pole', -90, -180, { latitude: -89.95, longitude: -179.95 }],
  ])('never tells strangers more than a cell of the place: %s', async (_, latitude, longitude, cell) => {
    const place = await makeOrchard(owner, { helpers: [helper], name: 'Secretname Hollow' });
    await database()('orchards').where({ id: place }).update({ latitude, longitude });
    const tree = newId();
    await database()('trees').insert({ id: tree, orchard_id: place, label: 'Secretlabel 7' });
    const { id } = await acceptedEntry(owner, moderator, entryBody(place, { tree }));
    for (const who of [null, stranger, moderator]) {
      const text = await (await entries.get(who, id)).text();
      const view = JSON.parse(text) as Record<string, unknown>;
      expect(view).toMatchObject({ cell, place: { elevation: 400 } });
      expect(Object.keys(view)).not.toContain('orchard');
      const listed = await (await entries.list(who, '?limit=200')).text();
      for (const secret of [place, tree, 'Secretname', 'Secretlabel', '12.3456', '45.6789']) {
        expect(text).not.toContain(secret);
        expect(listed).not.toContain(secret);
      }
    }
    for (const who of [owner, helper]) {
      expect(await expectView(await entries.get(who, id))).toMatchObject({
        orchard: place,
        tree,
        place: { elevation: 420 },
      });
    }
  });
});

describe('the list', () => {
  it('gives every entry once, page by page, and takes its filters', async () => {
    const grower = await makePerson();
    const place = await makeOrchard(grower);
    const ids = new Set<string>();
    for (let index = 0; index < 7; index += 1) {
      const body = entryBody(place, { species: 'olea-europaea' }, { severity: index < 3 ? 0.2 : 0.6 });
      ids.add((await acceptedEntry(grower, moderator, body)).id);
    }
    const seen: string[] = [];
    let cursor = '';
    do {
      const page = await read<{ items: { id: string }[]; nextCursor: string | null }>(
        await entries.list(null, `?species=olea-europaea&limit=2${cursor}`),
      );
      expect(page.items.length).toBeLessThanOrEqual(2);
      seen.push(...page.items.map(({ id }) => id));
      cursor = page.nextCursor ? `&cursor=${page.nextCursor}` : '';
    } while (cursor);
    expect(seen).toHaveLength(7);
    expect(new Set(seen)).toEqual(ids);
    const count = async (query: string, actor: TestPerson | null = null) =>
      (await read<{ items: unknown[] }>(await entries.list(actor, query))).items.length;
    expect(await count('?species=olea-europaea&class=light')).toBe(3);
    expect(await count('?species=olea-europaea&class=severe&tip=removed')).toBe(4);
    expect(await count('?species=olea-europaea&tip=kept')).toBe(0);
    expect(await count('?mine=1', grower)).toBe(7);
    expect(await count(`?orchard=${place}`, grower)).toBe(7);
    expect(await count(`?orchard=${place}`, stranger)).toBe(0);
    expect(await count(`?orchard=${place}`)).toBe(0);
    expect(await count('?mine=1')).toBe(0);
  });

  it('shows drafts to nobody but their people', async () => {
    const grower = await makePerson();
    const place = await makeOrchard(grower, { helpers: [helper] });
    const id = newId();
    await entries.put(grower, id, entryBody(place));
    const has = async (who: TestPerson | null) =>
      (
        await read<{ items: { id: string }[] }>(await entries.list(who, '?status=draft&limit=200'))
      ).items.some((one) => one.id === id);
    expect([
      await has(grower),
      await has(helper),
      await has(stranger),
      await has(moderator),
      await has(null),
    ]).toEqual([true, true, false, false, false]);
  });

  it.each([
    '?limit=0',
    '?limit=201',
    '?limit=two',
    '?species=nothing',
    '?class=deep',
    '?tip=cut',
    '?orchard=x',
    '?status=new',
    '?cursor=!!',
    '?sort=x',
  ])('refuses %s', async (query) => {
    expect((await entries.list(null, query)).status).toBe(422);
  });
});
