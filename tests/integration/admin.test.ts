import { v7 as newId } from 'uuid';
import { beforeEach, describe, expect, it } from 'vitest';
import * as people from '@/app/api/admin/people/route';
import * as disable from '@/app/api/admin/people/[id]/disable/route';
import * as enable from '@/app/api/admin/people/[id]/enable/route';
import * as role from '@/app/api/admin/people/[id]/role/route';
import * as orchards from '@/app/api/orchards/route';
import { database } from '@/lib/database';
import { makePerson, type TestPerson } from './setup/people';
import { asPerson, call, read } from './setup/request';

type Page = {
  items: { id: string; email: string; role: string; disabled: boolean }[];
  nextCursor: string | null;
};

let admin: TestPerson;
let grower: TestPerson;
beforeEach(async () => {
  // The rule about the last admin is about all of them.
  await database()('people').where({ role: 'admin' }).update({ role: 'grower' });
  admin = await makePerson('admin', 'Ada');
  grower = await makePerson('grower', 'Gil');
});

const setRole = (id: string, to: string, actor: { id: string } | null = admin) =>
  call(role, 'PUT', `/api/admin/people/${id}/role`, { params: { id }, body: { role: to }, actor });
const setDisabled = (id: string, to: boolean, actor: { id: string } | null = admin) =>
  call(to ? disable : enable, 'POST', `/api/admin/people/${id}/${to ? 'disable' : 'enable'}`, {
    params: { id },
    actor,
  });
const list = (query = '', actor: { id: string } | null = admin) =>
  call(people, 'GET', `/api/admin/people${query}`, { actor });
const rowOf = (id: string) => database()('people').where({ id }).first();
const auditOf = (id: string) =>
  database()('audit_log')
    .where({ subject_kind: 'person', subject_id: id })
    .orderBy('id')
    .select('action', 'actor_id');

describe('managing people', () => {
  it.each(['visitor', 'grower', 'moderator'] as const)('is not for a %s', async (kind) => {
    const actor = kind === 'visitor' ? null : await makePerson(kind);
    const status = kind === 'visitor' ? 401 : 403;
    expect((await list('', actor)).status).toBe(status);
    expect((await setRole(grower.id, 'admin', actor)).status).toBe(status);
    expect((await setDisabled(grower.id, true, actor)).status).toBe(status);
    expect((await setDisabled(grower.id, false, actor)).status).toBe(status);
    expect(await rowOf(grower.id)).toMatchObject({ role: 'grower', disabled_at: null });
  });

  it('lists everyone once, page by page, with no more than admins need', async () => {
    const seen: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const page: Page = await read<Page>(await list(`?limit=3${cursor && `&cursor=${cursor}`}`));
      expect(page.items.length).toBeLessThanOrEqual(3);
      for (const item of page.items) {
        expect(Object.keys(item).sort()).toEqual(['disabled', 'email', 'id', 'name', 'role']);
        seen.push(item.id);
      }
      cursor = page.nextCursor;
    }
    const [{ count }] = (await database()('people').count({ count: '*' })) as [{ count: number }];
    expect(seen).toHaveLength(Number(count));
    expect(new Set(seen).size).toBe(seen.length);
  });

  it('finds somebody by a part of the name or address, taken literally', async () => {
    const odd = await makePerson('grower', 'Percy 100%_sure');
    const found = await read<Page>(await list(`?q=${encodeURIComponent('100%_SURE')}`));
    expect(found.items.map(({ id }) => id)).toEqual([odd.id]);
    const none = await read<Page>(await list(`?q=${encodeURIComponent('100__sure')}`));
    expect(none.items).toEqual([]);
  });

  it.each(['?limit=0', '?limit=201', '?limit=x', '?cursor=x', '?unknown=1'])('refuses %s', async (query) => {
    expect((await list(query)).status).toBe(422);
  });

  it('gives a role that counts from that person’s next request, without ending their session', async () => {
    const cookie = await asPerson(grower);
    expect((await call(people, 'GET', '/api/admin/people', { headers: { cookie } })).status).toBe(403);
    const answer = await setRole(grower.id, 'admin');
    expect(answer.status).toBe(200);
    expect(await read(answer)).toEqual({ ...grower, role: 'admin', disabled: false });
    expect((await call(people, 'GET', '/api/admin/people', { headers: { cookie } })).status).toBe(200);
    await setRole(grower.id, 'grower');
    expect((await call(people, 'GET', '/api/admin/people', { headers: { cookie } })).status).toBe(403);
    expect(await auditOf(grower.id)).toEqual([
      { action: 'person.role', actor_id: admin.id },
      { action: 'person.role', actor_id: admin.id },
    ]);
  });

  it('ends every session of a disabled account, and enabling does not bring them back', async () => {
    const cookie = await asPerson(grower);
    const ask = () => call(orchards, 'GET', '/api/orchards', { headers: { cookie } });
    expect((await ask()).status).toBe(200);
    expect(await read(await setDisabled(grower.id, true))).toMatchObject({ id: grower.id, disabled: true });
    expect((await ask()).status).toBe(401);
    expect(await read(await setDisabled(grower.id, false))).toMatchObject({ disabled: false });
    expect((await ask()).status).toBe(401);
  });

  it('done twice is done once', async () => {
    await setDisabled(grower.id, true);
    const before = await rowOf(grower.id);
    expect((await setDisabled(grower.id, true)).status).toBe(200);
    expect(await rowOf(grower.id)).toEqual(before);
    await setRole(grower.id, 'grower');
    expect((await auditOf(grower.id)).map(({ action }) => action)).toEqual(['person.disable']);
  });

  it('does not let the last admin step down or be disabled', async () => {
    for (const answer of [await setRole(admin.id, 'grower'), await setDisabled(admin.id, true)]) {
      expect(answer.status).toBe(409);
      expect(await read(answer)).toMatchObject({ detail: expect.stringContaining('last admin') });
    }
    const disabled = await makePerson('admin');
    await database()('people').where({ id: disabled.id }).update({ disabled_at: new Date() });
    expect((await setRole(admin.id, 'moderator')).status).toBe(409);
    expect(await rowOf(admin.id)).toMatchObject({ role: 'admin', disabled_at: null });
    expect(await auditOf(admin.id)).toEqual([]);
  });

  it('keeps one of two admins who step down at once', async () => {
    const second = await makePerson('admin');
    const answers = await Promise.all([
      setRole(admin.id, 'grower', admin),
      setRole(second.id, 'grower', second),
      setDisabled(admin.id, true, second),
      setDisabled(second.id, true, admin),
    ]);
    expect(answers.map(({ status }) => status).every((status) => [200, 401, 403, 409].includes(status))).toBe(
      true,
    );
    const [{ count }] = (await database()('people')
      .where({ role: 'admin' })
      .whereNull('disabled_at')
      .count({ count: '*' })) as [{ count: number }];
    expect(Number(count)).toBe(1);
  });

  it('answers bad input in words, after asking who may', async () => {
    expect((await setRole('not-an-id', 'grower')).status).toBe(400);
    expect((await setRole(newId(), 'grower')).status).toBe(404);
    expect((await setDisabled(newId(), true)).status).toBe(404);
    const answer = await setRole(grower.id, 'king');
    expect(answer.status).toBe(422);
    expect(await read(answer)).toMatchObject({ errors: [{ path: 'role' }] });
    expect((await call(role, 'POST', '/', { params: { id: grower.id }, actor: admin })).status).toBe(405);
  });
});
