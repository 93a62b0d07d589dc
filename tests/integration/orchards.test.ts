import { v7 as newId } from 'uuid';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import * as list from '@/app/api/orchards/route';
import * as orchard from '@/app/api/orchards/[id]/route';
import * as membersRoute from '@/app/api/orchards/[id]/members/route';
import * as tree from '@/app/api/orchards/[id]/trees/[treeId]/route';
import { database } from '@/lib/database';
import { makeOrchard, makePerson, type TestPerson } from './setup/people';
import { call, read } from './setup/request';

type Someone = { id: string } | null;

const body = {
  name: 'Terrace above the mill',
  latitude: 12.3456,
  longitude: -45.6789,
  elevation: 420,
  timeZone: 'Etc/UTC',
  place: { sun: 'full', wind: 'sheltered', water: 'moderate' },
};
const matching = (revision: number) => ({ 'if-match': `"${revision}"` });

let owner: TestPerson;
let helper: TestPerson;
let stranger: TestPerson;
let moderator: TestPerson;
let admin: TestPerson;
beforeAll(async () => {
  [owner, helper, stranger, moderator, admin] = await Promise.all([
    makePerson('grower', 'Olive Owner'),
    makePerson('grower', 'Hal Helper'),
    makePerson('grower', 'Sam Stranger'),
    makePerson('moderator', 'Mo Moderator'),
    makePerson('admin', 'Ada Admin'),
  ]);
});

const get = (id: string, actor: Someone) =>
  call(orchard, 'GET', `/api/orchards/${id}`, { params: { id }, actor });
const put = (id: string, actor: Someone, sent: unknown = body, headers = {}) =>
  call(orchard, 'PUT', `/api/orchards/${id}`, { params: { id }, body: sent, actor, headers });
const remove = (id: string, actor: Someone, headers = {}) =>
  call(orchard, 'DELETE', `/api/orchards/${id}`, { params: { id }, actor, headers });
const members = (id: string, actor: Someone) =>
  call(membersRoute, 'GET', `/api/orchards/${id}/members`, { params: { id }, actor });
const putTree = (
  id: string,
  treeId: string,
  actor: Someone,
  sent: unknown = { label: 'Row 2, third' },
  headers = {},
) =>
  call(tree, 'PUT', `/api/orchards/${id}/trees/${treeId}`, {
    params: { id, treeId },
    body: sent,
    actor,
    headers,
  });
const removeTree = (id: string, treeId: string, actor: Someone, headers = {}) =>
  call(tree, 'DELETE', `/api/orchards/${id}/trees/${treeId}`, { params: { id, treeId }, actor, headers });

describe('an orchard', () => {
  it('is made by its first PUT and comes back as it was sent', async () => {
    const id = newId();
    const made = await put(id.toUpperCase(), owner);
    expect([made.status, made.headers.get('etag')]).toEqual([201, '"1"']);
    const answer = await get(id, owner);
    expect([answer.status, answer.headers.get('etag')]).toEqual([200, '"1"']);
    expect(await read(answer)).toMatchObject({
      ...body,
      id,
      revision: 1,
      owner: 'Olive Owner',
      role: 'owner',
      trees: [],
      createdAt: expect.stringMatching(/^\d{4}-\d\d-\d\dT[\d:.]+Z$/),
    });
  });

  it('sent again is the same orchard, unchanged', async () => {
    const id = newId();
    await put(id, owner);
    const again = await put(id, owner, { ...body, latitude: 12.34560000001, name: `  ${body.name} ` });
    expect([again.status, again.headers.get('etag')]).toEqual([200, '"1"']);
  });

  it('sent three times at once is made once', async () => {
    const id = newId();
    const answers = await Promise.all([put(id, owner), put(id, owner), put(id, owner)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 200, 201]);
  });

  it('changes under the revision that was read, and under no other', async () => {
    const id = newId();
    await put(id, owner);
    const changed = { ...body, name: 'Lower terrace', elevation: null };
    const without = await put(id, owner, changed);
    expect(without.status).toBe(428);
    const under = await put(id, owner, changed, matching(1));
    expect([under.status, under.headers.get('etag')]).toEqual([200, '"2"']);
    const stale = await put(id, owner, { ...body, name: 'Third' }, matching(1));
    expect([stale.status, stale.headers.get('etag')]).toEqual([412, '"2"']);
    expect(await read(stale)).toMatchObject({ revision: 2 });
    expect(await read(await get(id, owner))).toMatchObject({
      name: 'Lower terrace',
      elevation: null,
      revision: 2,
    });
  });

  it('saved from two devices at once keeps one and tells the other', async () => {
    const id = newId();
    await put(id, owner);
    const answers = await Promise.all(
      ['one', 'two', 'three'].map((name) => put(id, owner, { ...body, name }, matching(1))),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412, 412]);
    expect(await read(await get(id, owner))).toMatchObject({ revision: 2 });
  });

  it('that was removed in between is not made again unseen', async () => {
    const answer = await put(newId(), owner, body, matching(3));
    expect(answer.status).toBe(412);
    expect(await read(answer)).toMatchObject({ revision: null });
  });

  it.each([
    ['latitude', { latitude: 90.1 }],
    ['latitude', { latitude: null }],
    ['longitude', { longitude: '1' }],
    ['elevation', { elevation: 9001 }],
    ['timeZone', { timeZone: 'Nowhere/Here' }],
    ['place.sun', { place: { ...body.place, sun: 'bright' } }],
    ['name', { name: '' }],
    ['owner', { owner: 'somebody' }],
    ['place.soil', { place: { ...body.place, soil: 'clay' } }],
  ])('is refused at %s for %j, and nothing is stored', async (path, change) => {
    const id = newId();
    const answer = await put(id, owner, { ...body, ...change });
    expect(answer.status).toBe(422);
    const { errors } = await read<{ errors: { path: string }[] }>(answer);
    expect(errors.map((error) => error.path)).toEqual([path]);
    expect(await database()('orchards').where({ id }).first()).toBeUndefined();
  });

  it.each([
    [90, 180],
    [-90, -180],
    [-0.000001, 0.000001],
  ])('may lie at %d, %d', async (latitude, longitude) => {
    const id = newId();
    expect((await put(id, owner, { ...body, latitude, longitude })).status).toBe(201);
    expect(await read(await get(id, owner))).toMatchObject({ latitude, longitude });
    expect((await put(id, owner, { ...body, latitude, longitude })).status).toBe(200);
  });

  it('answers what cannot be read before it answers what is wrong', async () => {
    expect((await get('not-an-id', owner)).status).toBe(400);
    expect((await put(newId(), owner, '{', { 'content-type': 'application/json' })).status).toBe(400);
    expect((await put(newId(), owner, 'x', { 'content-type': 'text/plain' })).status).toBe(415);
    expect((await put(newId(), owner, body, { 'if-match': 'x' })).status).toBe(400);
    expect((await put(newId(), owner, body, { origin: 'https://elsewhere.example' })).status).toBe(403);
  });
});

describe('who may with an orchard', () => {
  let id = '';
  beforeEach(async () => {
    id = await makeOrchard(owner, { helpers: [helper] });
  });

  it('its members read it, with its exact place; a visitor is asked to sign in; to anyone else it is not there', async () => {
    for (const [actor, role] of [
      [owner, 'owner'],
      [helper, 'helper'],
    ] as const) {
      expect(await read(await get(id, actor))).toMatchObject({
        latitude: 12.3456,
        longitude: -45.6789,
        role,
      });
      expect((await members(id, actor)).status).toBe(200);
    }
    expect((await get(id, null)).status).toBe(401);
    expect((await members(id, null)).status).toBe(401);
    for (const actor of [stranger, moderator, admin]) {
      for (const answer of [await get(id, actor), await members(id, actor)]) {
        expect(answer.status).toBe(404);
        expect(await answer.text()).not.toContain('terrace');
      }
    }
  });

  it('its owner alone changes it', async () => {
    const changed = { ...body, name: 'Taken over' };
    const treeId = newId();
    for (const [actor, status] of [
      [null, 401],
      [helper, 403],
      [stranger, 404],
      [moderator, 404],
      [admin, 404],
    ] as const) {
      expect((await put(id, actor, changed, matching(1))).status).toBe(status);
      expect((await remove(id, actor, matching(1))).status).toBe(status);
      expect((await putTree(id, treeId, actor)).status).toBe(status);
      expect((await removeTree(id, treeId, actor)).status).toBe(status);
    }
    expect(await read(await get(id, owner))).toMatchObject({ name: 'A terrace', revision: 1, trees: [] });
  });

  it('who may is asked before what is sent', async () => {
    expect((await put(id, stranger, 'x', { 'content-type': 'text/plain' })).status).toBe(404);
    expect((await put(id, helper, { nonsense: true })).status).toBe(403);
  });

  it('members are told who the others are, by name alone', async () => {
    expect(await read(await members(id, helper))).toEqual({
      items: [
        { id: owner.id, name: 'Olive Owner', role: 'owner' },
        { id: helper.id, name: 'Hal Helper', role: 'helper' },
      ],
      nextCursor: null,
    });
  });
});

describe('the list of orchards', () => {
  it('holds those somebody owns or helps in, once each, page by page', async () => {
    const person = await makePerson();
    const own = await Promise.all(['c', 'a', 'b'].map((name) => makeOrchard(person, { name })));
    const helped = await makeOrchard(owner, { name: 'b', helpers: [person] });
    await makeOrchard(owner, { name: 'not theirs' });
    const names: string[] = [];
    const ids: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      type Page = { items: { id: string; name: string }[]; nextCursor: string | null };
      const query: string = `?limit=1${cursor && `&cursor=${cursor}`}`;
      const page: Page = await read<Page>(
        await call(list, 'GET', `/api/orchards${query}`, { actor: person }),
      );
      names.push(...page.items.map(({ name }) => name));
      ids.push(...page.items.map(({ id }) => id));
      cursor = page.nextCursor;
    }
    expect(names).toEqual(['a', 'b', 'b', 'c']);
    expect(ids.sort()).toEqual([...own, helped].sort());
  });

  it('is empty for a newcomer, and asks a visitor to sign in', async () => {
    const answer = await call(list, 'GET', '/api/orchards', { actor: await makePerson() });
    expect(await read(answer)).toEqual({ items: [], nextCursor: null });
    expect((await call(list, 'GET', '/api/orchards')).status).toBe(401);
    expect((await call(list, 'GET', '/api/orchards?limit=0', { actor: owner })).status).toBe(422);
  });
});

describe('removing an orchard', () => {
  it('takes its trees along, once the revision is named', async () => {
    const id = await makeOrchard(owner, { helpers: [helper] });
    const treeId = newId();
    await putTree(id, treeId, owner);
    expect((await remove(id, owner)).status).toBe(428);
    expect((await remove(id, owner, matching(2))).status).toBe(412);
    expect((await remove(id, owner, matching(1))).status).toBe(204);
    expect((await get(id, owner)).status).toBe(404);
    expect((await remove(id, owner, matching(1))).status).toBe(404);
    expect(await database()('trees').where({ id: treeId }).first()).toBeUndefined();
  });

  it('is refused while an entry names it, a draft too; its trees stay with it', async () => {
    const id = await makeOrchard(owner);
    const treeId = newId();
    await putTree(id, treeId, owner);
    await writeDraftIn(id, treeId);
    const answer = await remove(id, owner, matching(1));
    expect(answer.status).toBe(409);
    expect((await removeTree(id, treeId, owner)).status).toBe(409);
    expect(await read(await get(id, owner))).toMatchObject({ trees: [{ id: treeId }] });
  });
});

describe('a tree', () => {
  let id = '';
  beforeEach(async () => {
    id = await makeOrchard(owner);
  });

  it('is planted, changed under its own revision, and taken out', async () => {
    const treeId = newId();
    const sent = { label: 'Row 2, third', species: null, cultivar: 'Brown', yearPlanted: 2019 };
    const planted = await putTree(id, treeId, owner, sent);
    expect([planted.status, planted.headers.get('etag')]).toEqual([201, '"1"']);
    expect(await read(planted)).toEqual({ id: treeId, revision: 1, ...sent });
    expect((await putTree(id, treeId, owner, sent)).status).toBe(200);
    const changed = { ...sent, cultivar: null };
    expect((await putTree(id, treeId, owner, changed)).status).toBe(428);
    expect((await putTree(id, treeId, owner, changed, matching(7))).status).toBe(412);
    const answer = await putTree(id, treeId, owner, changed, matching(1));
    expect([answer.status, answer.headers.get('etag')]).toEqual([200, '"2"']);
    expect(await read(await get(id, owner))).toMatchObject({
      trees: [{ id: treeId, revision: 2, ...changed }],
    });
    expect((await removeTree(id, treeId, owner, matching(1))).status).toBe(412);
    expect((await removeTree(id, treeId, owner)).status).toBe(204);
    expect((await removeTree(id, treeId, owner)).status).toBe(404);
  });

  it('may be of a species in the catalogue, and of no other', async () => {
    expect((await putTree(id, newId(), owner, { label: 'a', species: 'ficus-carica' })).status).toBe(201);
    const answer = await putTree(id, newId(), owner, { label: 'a', species: 'arbor-nulla' });
    expect(answer.status).toBe(422);
    expect(await read(answer)).toMatchObject({ errors: [{ path: 'species' }] });
  });

  it('planted three times at once is one tree', async () => {
    const treeId = newId();
    const answers = await Promise.all([1, 2, 3].map(() => putTree(id, treeId, owner)));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 200, 201]);
  });

  it('of another orchard cannot be reached through this one', async () => {
    const other = await makeOrchard(stranger);
    const treeId = newId();
    await putTree(other, treeId, stranger);
    expect((await putTree(id, treeId, owner, { label: 'Mine now' }, matching(1))).status).toBe(404);
    expect((await removeTree(id, treeId, owner)).status).toBe(404);
    expect(await database()('trees').where({ id: treeId }).first()).toMatchObject({ orchard_id: other });
  });

  it('leaves a line in the log of who did what', async () => {
    const treeId = newId();
    await putTree(id, treeId, owner);
    await putTree(id, treeId, owner);
    await removeTree(id, treeId, owner);
    const lines = await database()('audit_log')
      .where({ subject_id: treeId })
      .orderBy('id')
      .select('action', 'actor_id');
    expect(lines).toEqual([
      { action: 'tree.created', actor_id: owner.id },
      { action: 'tree.removed', actor_id: owner.id },
    ]);
  });
});

/** As much of an entry as names an orchard. */
async function writeDraftIn(orchardId: string, treeId: string): Promise<void> {
  const id = newId();
  await database()('entries').insert({ id, owner_id: owner.id });
  await database()('revisions').insert({
    entry_id: id,
    number: 1,
    author_id: owner.id,
    orchard_id: orchardId,
    tree_id: treeId,
    doc: '{"type":"doc","content":[]}',
    schema_version: 1,
  });
}
