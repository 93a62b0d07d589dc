import { v7 as newId } from 'uuid';
import { beforeEach, describe, expect, it } from 'vitest';
import * as route from '@/app/api/sign-up/route';
import * as form from '@/app/sign-up/submit/route';
import { database } from '@/lib/database';
import { call, read } from './setup/request';

const fresh = () => `${newId()}@people.example`;
const password = 'plum gravel lantern';
const signUp = (body: unknown, headers = {}) => call(route, 'POST', '/api/sign-up', { body, headers });
const rowOf = (email: string) => database()('people').where({ email }).first();

beforeEach(async () => {
  await database()('tries').delete();
});

describe('signing up', () => {
  it('makes a grower who can sign in, and keeps no password', async () => {
    const email = fresh();
    const answer = await signUp({ email: ` ${email.toUpperCase()} `, name: ' Ana Field ', password });
    expect(answer.status).toBe(201);
    const person = await read<{ id: string; name: string }>(answer);
    expect(Object.keys(person).sort()).toEqual(['id', 'name']);
    expect(person.name).toBe('Ana Field');
    const row = await rowOf(email);
    expect(row).toMatchObject({ id: person.id, role: 'grower', disabled_at: null, session_version: 1 });
    expect(row.password_hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(JSON.stringify(row)).not.toContain(password);
  });

  it('is refused in words for an address that has an account, and leaves the account alone', async () => {
    const email = fresh();
    await signUp({ email, name: 'First', password });
    const answer = await signUp({
      email: email.toUpperCase(),
      name: 'Second',
      password: 'another long phrase',
    });
    expect(answer.status).toBe(409);
    expect(await read(answer)).toMatchObject({ status: 409, detail: expect.stringContaining('Sign in') });
    expect(await rowOf(email)).toMatchObject({ name: 'First' });
  });

  it('makes one account of two requests at once', async () => {
    const body = { email: fresh(), name: 'Twice', password };
    const answers = await Promise.all([signUp(body), signUp(body), signUp(body)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409]);
    expect(await database()('people').where({ email: body.email })).toHaveLength(1);
  });

  it.each([
    ['email', { email: 'no-address' }],
    ['email', { email: `${'a'.repeat(250)}@people.example` }],
    ['email', { email: 7 }],
    ['name', { name: '   ' }],
    ['name', { name: 'x'.repeat(81) }],
    ['name', { name: 'two\nlines' }],
    ['password', { password: 'elevenchars' }],
    ['password', { password: 'x'.repeat(201) }],
    ['password', { password: 'password1234' }],
    ['password', { password: 'QWERTYUIOP12' }],
    ['password', { password: '121212121212' }],
    ['password', { password: 'abcdefghijklm' }],
    ['password', { name: 'Ana of the Hill', password: 'anaofthehill' }],
    ['role', { role: 'admin' }],
    ['session_version', { session_version: 9 }],
  ])('says at %s what is wrong with %j and stores nothing', async (path, change) => {
    const email = fresh();
    const answer = await signUp({ email, name: 'Ana', password, ...change });
    expect(answer.status).toBe(422);
    expect(answer.headers.get('content-type')).toContain('application/problem+json');
    const { errors } = await read<{ errors: { path: string }[] }>(answer);
    expect(errors.map((error) => error.path)).toContain(path);
    expect(await rowOf(email)).toBeUndefined();
  });

  it('does not take one’s own address as a password', async () => {
    const email = fresh();
    const answer = await signUp({ email, name: 'Ana', password: email });
    expect(answer.status).toBe(422);
  });

  it('refuses what is not JSON, what is broken, and another site', async () => {
    const text = JSON.stringify({ email: fresh(), name: 'Ana', password });
    expect((await signUp(text, { 'content-type': 'text/plain' })).status).toBe(415);
    expect((await signUp('{', { 'content-type': 'application/json' })).status).toBe(400);
    const foreign = await signUp({}, { origin: 'https://elsewhere.example' });
    expect(foreign.status).toBe(403);
    expect((await call(route, 'GET', '/api/sign-up')).status).toBe(405);
  });

  it('is limited for one address, also for who asks which addresses have an account', async () => {
    const body = { email: fresh(), name: 'Many', password };
    await signUp(body);
    const statuses: number[] = [];
    for (let count = 0; count < 60; count += 1) statuses.push((await signUp(body)).status);
    expect(statuses.slice(0, 59).every((status) => status === 409)).toBe(true);
    expect(statuses[59]).toBe(429);
  });
});

describe('the sign-up page’s form, without a script', () => {
  const send = (fields: Record<string, string>) =>
    call(form, 'POST', '/sign-up/submit', {
      body: new URLSearchParams(fields).toString(),
      headers: { 'content-type': 'application/x-www-form-urlencoded', origin: 'http://localhost:3000' },
    });

  it('makes the account, signs it in and leads on', async () => {
    const email = fresh();
    const answer = await send({ email, name: 'Form', password, callbackUrl: '/orchards/new' });
    expect([answer.status, answer.headers.get('location')]).toEqual([303, '/orchards/new']);
    expect(answer.headers.getSetCookie().join()).toContain('next-auth.session-token=');
    expect(await rowOf(email)).toMatchObject({ name: 'Form' });
  });

  it('leads back with what was typed, but never the password', async () => {
    const secret = 'tooshort';
    const answer = await send({
      email: 'no-address',
      name: 'Form',
      password: secret,
      callbackUrl: '/visits',
    });
    expect(answer.headers.get('location')).toBe('/sign-up?callbackUrl=%2Fvisits');
    const cookie = answer.headers.getSetCookie().join();
    const typed = Buffer.from(/typed=([^;]+)/.exec(cookie)?.[1] ?? '', 'base64url').toString();
    expect(JSON.parse(typed)).toMatchObject({ email: 'no-address', name: 'Form' });
    expect(typed).toContain('must have at least 12 characters');
    expect(typed + cookie + answer.headers.get('location')).not.toContain(secret);
  });
});
