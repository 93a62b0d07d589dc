import { readdirSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { v7 as newId } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import * as openapiRoute from '@/app/api/openapi.json/route';
import * as restRoute from '@/app/api/[...rest]/route';
import { database } from '@/lib/database';
import type { Handler, Method } from '@/lib/http/handler';
import { acceptedEntry, entries, entryBody, expectView } from './setup/entries';
import { makeOrchard, makePerson, type TestPerson } from './setup/people';
import { call, read } from './setup/request';

/** Everybody there is, by their part in the orchard and the entries of the table. */
const KINDS = ['visitor', 'owner', 'stranger', 'helper', 'moderator', 'admin', 'disabled'] as const;
type Kind = (typeof KINDS)[number];
type Row = {
  method: Method;
  body?: unknown;
  expect: Record<Kind, number>;
  subject?: 'draft' | 'accepted' | 'waiting';
};

const all = (status: number): Record<Kind, number> =>
  Object.fromEntries(KINDS.map((kind) => [kind, status])) as Record<Kind, number>;
const but = (status: number, others: Partial<Record<Kind, number>>) => ({ ...all(status), ...others });
/** Anyone who is signed in; a disabled account is nobody. */
const signedIn = (status: number, others: Partial<Record<Kind, number>> = {}) =>
  but(status, { visitor: 401, disabled: 401, ...others });

/**
 * Every route and method, tried by everybody. Where a row says 422, 409, 412 or 428 the person got past every rule on who may, and
 * was stopped by what they sent, so that nothing changes between two tries.
 */
const TABLE: Record<string, Row[]> = {
  account: [
    { method: 'GET', expect: signedIn(200) },
    { method: 'PUT', body: {}, expect: signedIn(422) },
  ],
  'admin/people': [{ method: 'GET', expect: signedIn(403, { admin: 200 }) }],
  'admin/people/[id]/role': [{ method: 'PUT', body: {}, expect: signedIn(403, { admin: 404 }) }],
  'admin/people/[id]/disable': [{ method: 'POST', expect: signedIn(403, { admin: 404 }) }],
  'admin/people/[id]/enable': [{ method: 'POST', expect: signedIn(403, { admin: 404 }) }],
  'bench/queue': [{ method: 'GET', expect: signedIn(403, { moderator: 200, admin: 200 }) }],
  'bench/entries/[id]/decision': [
    { method: 'POST', body: {}, subject: 'waiting', expect: signedIn(403, { moderator: 422, admin: 422 }) },
  ],
  'data/codebook.json': [{ method: 'GET', expect: all(200) }],
  'data/readings.csv': [{ method: 'GET', expect: all(200) }],
  entries: [{ method: 'GET', expect: all(200) }],
  'entries/[id]': [
    { method: 'GET', subject: 'accepted', expect: all(200) },
    { method: 'GET', subject: 'draft', expect: but(404, { owner: 200, helper: 200 }) },
    {
      method: 'GET',
      subject: 'waiting',
      expect: but(404, { owner: 200, helper: 200, moderator: 200, admin: 200 }),
    },
    { method: 'PUT', body: { x: 1 }, subject: 'draft', expect: signedIn(404, { owner: 422, helper: 403 }) },
    { method: 'PUT', body: { x: 1 }, subject: 'accepted', expect: signedIn(403, { owner: 422 }) },
    { method: 'DELETE', subject: 'draft', expect: signedIn(404, { owner: 428, helper: 403 }) },
    { method: 'DELETE', subject: 'accepted', expect: signedIn(403, { owner: 428 }) },
  ],
  'entries/[id]/draft': [{ method: 'POST', subject: 'accepted', expect: signedIn(403, { owner: 409 }) }],
  'entries/[id]/submit': [{ method: 'POST', subject: 'accepted', expect: signedIn(403, { owner: 409 }) }],
  'entries/[id]/readings/[readingId]': [
    {
      method: 'PUT',
      body: { x: 1 },
      subject: 'accepted',
      expect: signedIn(403, { owner: 422, helper: 422 }),
    },
    { method: 'PUT', body: { x: 1 }, subject: 'draft', expect: signedIn(404, { owner: 422, helper: 422 }) },
    { method: 'DELETE', subject: 'accepted', expect: signedIn(403, { owner: 404, helper: 404 }) },
  ],
  'entries/[id]/revisions': [
    { method: 'GET', subject: 'accepted', expect: signedIn(403, { owner: 200, moderator: 200, admin: 200 }) },
    { method: 'GET', subject: 'draft', expect: signedIn(404, { owner: 200, helper: 403 }) },
  ],
  health: [{ method: 'GET', expect: all(200) }],
  'measure/constant': [{ method: 'GET', expect: all(404) }],
  'openapi.json': [{ method: 'GET', expect: all(200) }],
  orchards: [{ method: 'GET', expect: signedIn(200) }],
  'orchards/[id]': [
    { method: 'GET', expect: signedIn(404, { owner: 200, helper: 200 }) },
    { method: 'PUT', body: {}, expect: signedIn(404, { owner: 422, helper: 403 }) },
    { method: 'DELETE', expect: signedIn(404, { owner: 428, helper: 403 }) },
  ],
  'orchards/[id]/members': [{ method: 'GET', expect: signedIn(404, { owner: 200, helper: 200 }) }],
  'orchards/[id]/trees/[treeId]': [
    { method: 'PUT', body: {}, expect: signedIn(404, { owner: 422, helper: 403 }) },
    { method: 'DELETE', expect: signedIn(404, { owner: 404, helper: 403 }) },
  ],
  'sign-up': [{ method: 'POST', body: {}, expect: all(422) }],
  species: [{ method: 'GET', expect: all(200) }],
  'species/[slug]': [{ method: 'GET', expect: all(200) }],
  'species/[slug]/response': [{ method: 'GET', expect: all(200) }],
};

/** Those of next-auth, tried in sign-in.test.ts, and the address for all that is not there. */
const ELSEWHERE = ['auth/[...nextauth]', '[...rest]'];

type Routes = Record<Method, Handler>;
const load = (path: string) =>
  import(/* @vite-ignore */ resolve('app/api', path, 'route.ts')) as Promise<Routes>;

const people: Partial<Record<Kind, TestPerson>> = {};
const subjects: Record<string, string> = {};
let orchard: string;
beforeAll(async () => {
  for (const kind of KINDS) {
    if (kind !== 'visitor')
      people[kind] = await makePerson(kind === 'moderator' || kind === 'admin' ? kind : 'grower');
  }
  await database()('people').where({ id: people.disabled?.id }).update({ disabled_at: new Date() });
  const [owner, helper, moderator] = [people.owner, people.helper, people.moderator] as TestPerson[];
  orchard = await makeOrchard(owner as TestPerson, { helpers: [helper as TestPerson] });
  subjects.draft = newId();
  await expectView(await entries.put(owner as TestPerson, subjects.draft, entryBody(orchard)), 201);
  subjects.waiting = newId();
  await expectView(await entries.put(owner as TestPerson, subjects.waiting, entryBody(orchard)), 201);
  await expectView(await entries.submit(owner as TestPerson, subjects.waiting));
  subjects.accepted = (
    await acceptedEntry(owner as TestPerson, moderator as TestPerson, entryBody(orchard))
  ).id;
});

function paramsOf(path: string, subject?: string): Record<string, string> {
  const id =
    path.startsWith('entries') || path.startsWith('bench')
      ? (subjects[subject ?? ''] ?? '')
      : path.startsWith('orchards')
        ? orchard
        : newId();
  return { id, readingId: newId(), treeId: newId(), slug: 'ficus-carica' };
}
const address = (path: string, params: Record<string, string>) =>
  `/api/${path.replace(/\[(\w+)\]/g, (_, name: string) => params[name] ?? '')}`;

function routeFolders(folder = 'app/api'): string[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((one) =>
    one.isDirectory()
      ? routeFolders(join(folder, one.name))
      : one.name === 'route.ts'
        ? [folder.slice('app/api/'.length)]
        : [],
  );
}

describe('every route', () => {
  it('has a row here for each of its methods', async () => {
    expect(routeFolders().sort()).toEqual([...Object.keys(TABLE), ...ELSEWHERE].sort());
    for (const [path, rows] of Object.entries(TABLE)) {
      const routes = await load(path);
      const offered = (['GET', 'POST', 'PUT', 'PATCH', 'DELETE'] as const).filter(
        (method) => routes[method].spec,
      );
      expect([...new Set(rows.map(({ method }) => method))].sort(), path).toEqual([...offered].sort());
    }
  });

  it('stands in the OpenAPI document, with a summary', async () => {
    const document = await read<{
      openapi: string;
      paths: Record<string, Record<string, { summary?: string }>>;
    }>(await call(openapiRoute, 'GET', '/api/openapi.json'));
    expect(document.openapi).toBe('3.1.0');
    const described = Object.keys(document.paths).map((path) =>
      path.slice('/api/'.length).replace(/\{(\w+)\}/g, '[$1]'),
    );
    expect(described.sort()).toEqual(
      Object.keys(TABLE)
        .filter((path) => path !== 'openapi.json')
        .sort(),
    );
    for (const operations of Object.values(document.paths)) {
      for (const operation of Object.values(operations)) expect(operation.summary).toBeTruthy();
    }
  });
});

const rows = Object.entries(TABLE).flatMap(([path, list]) => list.map((row) => [path, row] as const));

describe.each(
  rows.map(
    ([path, row]) => [`${row.method} ${path}${row.subject ? ` of ${row.subject}` : ''}`, path, row] as const,
  ),
)('%s', (_, path, row) => {
  it.each(KINDS)('%s', async (kind) => {
    const params = paramsOf(path, row.subject);
    const answer = await call(await load(path), row.method, address(path, params), {
      params,
      body: row.body,
      actor: people[kind] ?? null,
    });
    expect(answer.status).toBe(row.expect[kind]);
    if (answer.status >= 400) await expectPlainProblem(answer);
  });
});

describe.each(
  rows
    .filter(([, { method }]) => method !== 'GET')
    .map(([path, row]) => [`${row.method} ${path} of ${row.subject ?? 'it'}`, path, row] as const),
)('a change asked for by another site: %s', (_, path, row) => {
  it('is 403, whoever is signed in', async () => {
    for (const origin of ['https://elsewhere.example', 'null', 'http://127.0.0.1:3999']) {
      const params = paramsOf(path, row.subject);
      const answer = await call(await load(path), row.method, address(path, params), {
        params,
        body: row.body,
        actor: people.owner ?? null,
        headers: { origin },
      });
      expect(answer.status).toBe(403);
      await expectPlainProblem(answer);
    }
  });

  it('is asked on when it comes from the app’s own address, by either name', async () => {
    for (const origin of ['http://127.0.0.1:3000', 'http://localhost:3000']) {
      const params = paramsOf(path, row.subject);
      const answer = await call(await load(path), row.method, address(path, params), {
        params,
        body: row.body,
        actor: people.owner ?? null,
        headers: { origin },
      });
      expect(answer.status).toBe(row.expect.owner);
    }
  });
});

describe('what is not offered', () => {
  it.each(Object.keys(TABLE))('%s refuses other methods with 405 and says which there are', async (path) => {
    const routes = await load(path);
    const params = paramsOf(path, 'accepted');
    const answer = await call(routes, 'PATCH', address(path, params), { params, body: {} });
    expect(answer.status).toBe(405);
    expect(answer.headers.get('allow')).toBeTruthy();
    await expectPlainProblem(answer);
  });

  it('is 404 as a problem document, for any method', async () => {
    for (const method of ['GET', 'POST', 'DELETE'] as const) {
      const answer = await call(restRoute, method, '/api/nothing/here');
      expect(answer.status).toBe(404);
      await expectPlainProblem(answer);
    }
  });

  it.each(Object.keys(TABLE).filter((path) => path.includes('[id]')))(
    '%s says 400 to a malformed id, to anyone',
    async (path) => {
      const routes = await load(path);
      const method = TABLE[path]?.[0]?.method ?? 'GET';
      const params = { ...paramsOf(path, 'accepted'), id: "1' OR '1'='1" };
      const answer = await call(routes, method, '/api/x', {
        params,
        ...(method === 'GET' ? {} : { body: {} }),
      });
      expect(answer.status).toBe(400);
      await expectPlainProblem(answer);
    },
  );
});

describe('after all these tries', () => {
  it('nothing has changed', async () => {
    expect(await database()('entries').where({ owner_id: people.owner?.id }).count({ n: '*' })).toEqual([
      { n: 3 },
    ]);
    for (const [status, id] of Object.entries(subjects)) {
      expect(await database()('entries').where({ id }).first('status', 'revision')).toEqual({
        status,
        revision: 1,
      });
    }
    expect(await database()('trees').count({ n: '*' })).toEqual([{ n: 0 }]);
    expect(await database()('orchards').where({ id: orchard }).first('revision')).toEqual({ revision: 1 });
  });
});

/** A problem document in words, without a stack, a path on disk or SQL. */
async function expectPlainProblem(answer: Response): Promise<void> {
  expect(answer.headers.get('content-type')).toBe('application/problem+json');
  const text = await answer.text();
  expect(JSON.parse(text)).toMatchObject({
    type: expect.any(String) as string,
    title: expect.any(String) as string,
    status: answer.status,
    detail: expect.any(String) as string,
  });
  expect(text).not.toMatch(/node_modules|\.tsx?:|\bat \w+ \(|SELECT |INSERT |UPDATE /);
}
