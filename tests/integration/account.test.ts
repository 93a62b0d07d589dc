import { expect, it, beforeEach } from 'vitest';
import * as account from '@/app/api/account/route';
import { makePerson, type TestPerson } from './setup/people';
import { call, read } from './setup/request';

let person: TestPerson;
beforeEach(async () => {
  person = await makePerson('grower', 'Ana');
});
const get = (actor: { id: string } | null = person) => call(account, 'GET', '/api/account', { actor });
const put = (body: unknown, headers = {}, actor: { id: string } | null = person) =>
  call(account, 'PUT', '/api/account', { body, headers, actor });

it('shows a person their own account', async () => {
  const answer = await get();
  expect(answer.headers.get('etag')).toBe('"1"');
  expect(await read(answer)).toEqual({ ...person, revision: 1, units: 'metric' });
  expect((await get(null)).status).toBe(401);
  expect((await put({ name: 'x', units: 'metric' }, {}, null)).status).toBe(401);
});

it('changes a name and units under the revision that was read', async () => {
  const body = { name: 'Ana Field', units: 'imperial' };
  expect((await put({ name: 'Ana', units: 'metric' })).status).toBe(200);
  expect((await put(body)).status).toBe(428);
  expect((await put(body, { 'if-match': '"2"' })).status).toBe(412);
  const answer = await put(body, { 'if-match': '"1"' });
  expect([answer.status, answer.headers.get('etag')]).toEqual([200, '"2"']);
  expect(await read(await get())).toMatchObject({ ...body, revision: 2 });
});

it.each([
  ['name', { name: '' }],
  ['units', { units: 'cubits' }],
  ['role', { role: 'admin' }],
  ['email', { email: 'other@people.example' }],
])('refuses at %s what is not a person’s to change like that: %j', async (path, change) => {
  const answer = await put({ name: 'Ana', units: 'metric', ...change }, { 'if-match': '"1"' });
  expect(answer.status).toBe(422);
  expect(await read(answer)).toMatchObject({ errors: [{ path }] });
  expect(await read(await get())).toMatchObject({ name: 'Ana', role: 'grower', revision: 1 });
});
