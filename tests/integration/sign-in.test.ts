import { beforeEach, describe, expect, it } from 'vitest';
import * as auth from '@/app/api/auth/[...nextauth]/route';
import * as form from '@/app/sign-in/submit/route';
import * as out from '@/app/sign-out/route';
import * as orchards from '@/app/api/orchards/route';
import { database } from '@/lib/database';
import { checkPassword } from '@/lib/people/sign-in';
import { NOBODYS_HASH, hashPassword } from '@/lib/people/passwords';
import { refuseWhenSpent, countTry, WRONG_FOR_ACCOUNT } from '@/lib/people/tries';
import { makePerson, PASSWORD, type TestPerson } from './setup/people';
import { asPerson, call, read } from './setup/request';

const FORM = { 'content-type': 'application/x-www-form-urlencoded' };
const ask = (method: 'GET' | 'POST' | 'PUT', action: string, sent: Parameters<typeof call>[3] = {}) =>
  call(auth, method, `/api/auth/${action}`, {
    ...sent,
    params: { nextauth: (action.split('?')[0] ?? '').split('/') },
  });

const pairs = (answer: Response) => answer.headers.getSetCookie().map((cookie) => cookie.split(';')[0] ?? '');

/** Signs in as a script does: the token first, then the form with it. */
async function signIn(
  email: string,
  password: string,
  { fields = {}, headers = {} }: { fields?: Record<string, string>; headers?: Record<string, string> } = {},
): Promise<Response> {
  const csrf = await ask('GET', 'csrf');
  const { csrfToken } = await read<{ csrfToken: string }>(csrf);
  return ask('POST', 'callback/credentials', {
    body: new URLSearchParams({ email, password, csrfToken, ...fields }).toString(),
    headers: { ...FORM, cookie: pairs(csrf).join('; '), ...headers },
  });
}

const sessionOf = async (cookie: string) => read(await ask('GET', 'session', { headers: { cookie } }));

let person: TestPerson;
beforeEach(async () => {
  await database()('tries').delete();
  person = await makePerson('grower', 'Ana Field');
});

describe('signing in', () => {
  it('gives a session that the API and next-auth know, and that holds no more than who it is', async () => {
    const answer = await signIn(person.email.toUpperCase(), PASSWORD, {
      fields: { callbackUrl: '/orchards' },
    });
    expect([answer.status, answer.headers.get('location')]).toEqual([302, '/orchards']);
    const session = pairs(answer).find((pair) => pair.startsWith('next-auth.session-token=')) ?? '';
    const whole = answer.headers
      .getSetCookie()
      .find((cookie) => cookie.startsWith('next-auth.session-token='));
    expect(whole).toMatch(/HttpOnly/i);
    expect(whole).toMatch(/SameSite=Lax/i);
    expect(await sessionOf(session)).toMatchObject({
      user: { id: person.id, name: 'Ana Field', role: 'grower' },
    });
    expect((await call(orchards, 'GET', '/api/orchards', { headers: { cookie: session } })).status).toBe(200);
  });

  it('answers a script that asks for JSON with where to go', async () => {
    const answer = await signIn(person.email, PASSWORD, { fields: { json: 'true', callbackUrl: '/visits' } });
    expect(answer.status).toBe(200);
    expect(await read<{ url: string }>(answer)).toMatchObject({ url: '/visits' });
  });

  it('leads to this site alone', async () => {
    for (const callbackUrl of [
      'https://elsewhere.example/',
      '//elsewhere.example',
      'javascript:alert(1)',
      'nonsense:',
    ]) {
      const answer = await signIn(person.email, PASSWORD, { fields: { callbackUrl } });
      expect([answer.status, answer.headers.get('location')]).toEqual([302, '/']);
    }
    const own = await signIn(person.email, PASSWORD, {
      fields: { callbackUrl: 'http://localhost:3000/orchards' },
    });
    expect(own.headers.get('location')).toBe('/orchards');
  });

  it('says the same to a wrong password, an unknown address and a disabled account', async () => {
    const disabled = await makePerson();
    await database()('people').where({ id: disabled.id }).update({ disabled_at: new Date() });
    const answers = await Promise.all([
      signIn(person.email, 'not the password'),
      signIn('nobody@people.example', PASSWORD),
      signIn(disabled.email, PASSWORD),
    ]);
    const said = await Promise.all(answers.map((answer) => answer.text()));
    expect(new Set(said).size).toBe(1);
    for (const answer of answers) {
      expect(answer.status).toBe(401);
      expect(answer.headers.get('content-type')).toBe('application/problem+json');
      expect(pairs(answer).join()).not.toContain('session-token');
    }
  });

  it('does as much work for an unknown address as for a known one', async () => {
    const cost = (hash: string) => hash.split('$').slice(0, 4).join('$');
    expect(cost(NOBODYS_HASH)).toBe(cost(await hashPassword('whatever')));
    expect(NOBODYS_HASH).toHaveLength((await hashPassword('whatever')).length);
  });

  it('needs the token that guards forms', async () => {
    const body = new URLSearchParams({ email: person.email, password: PASSWORD }).toString();
    const answer = await ask('POST', 'callback/credentials', { body, headers: FORM });
    expect(answer.status).toBe(403);
    expect(pairs(answer).join()).not.toContain('session-token');
  });

  it('is refused to another site', async () => {
    const answer = await signIn(person.email, PASSWORD, { headers: { origin: 'https://elsewhere.example' } });
    expect(answer.status).toBe(403);
    const same = await signIn(person.email, PASSWORD, { headers: { origin: 'http://localhost:3000' } });
    expect(same.status).toBe(302);
  });

  it('leads a browser without a script back to the page', async () => {
    const headers = { accept: 'text/html,application/xhtml+xml' };
    const answer = await signIn(person.email, 'not the password', {
      headers,
      fields: { callbackUrl: '/visits' },
    });
    expect(answer.status).toBe(303);
    expect(answer.headers.get('location')).toBe('/sign-in?error=wrong&callbackUrl=%2Fvisits');
  });

  it.each([
    ['GET', 'nothing-there', 404],
    ['POST', '_log', 404],
    ['GET', 'callback/credentials', 405],
    ['POST', 'session', 405],
    ['PUT', 'csrf', 405],
  ] as const)('%s %s is a problem document', async (method, action, status) => {
    const answer = await ask(method, action);
    expect(answer.status).toBe(status);
    expect(answer.headers.get('content-type')).toBe('application/problem+json');
  });

  it('refuses a body that is no form', async () => {
    const answer = await ask('POST', 'callback/credentials', {
      body: 'x',
      headers: { 'content-type': 'text/plain' },
    });
    expect(answer.status).toBe(415);
    const large = await ask('POST', 'callback/credentials', {
      body: `email=${'x'.repeat(30_000)}`,
      headers: FORM,
    });
    expect(large.status).toBe(413);
  });
});

describe('a session', () => {
  it('ends with the account’s disabling, for good', async () => {
    const cookie = await asPerson(person);
    expect(await sessionOf(cookie)).toMatchObject({ user: { id: person.id } });
    await database()('people').where({ id: person.id }).increment('session_version', 1);
    expect(await sessionOf(cookie)).toEqual({});
    expect((await call(orchards, 'GET', '/api/orchards', { headers: { cookie } })).status).toBe(401);
  });

  it('that was made up is none', async () => {
    const cookie = 'next-auth.session-token=eyJhbGciOiJkaXIiLCJlbmMiOiJBMjU2R0NNIn0..a.b.c';
    expect(await sessionOf(cookie)).toEqual({});
    expect((await call(orchards, 'GET', '/api/orchards', { headers: { cookie } })).status).toBe(401);
  });

  it('ends with the sign-out button', async () => {
    const answer = await call(out, 'POST', '/sign-out', { actor: person, headers: FORM });
    expect([answer.status, answer.headers.get('location')]).toEqual([303, '/']);
    const cookie = answer.headers.getSetCookie().find((one) => one.startsWith('next-auth.session-token='));
    expect(cookie).toMatch(/session-token=;.*Max-Age=0/i);
    const foreign = await call(out, 'POST', '/sign-out', {
      actor: person,
      headers: { ...FORM, origin: 'https://elsewhere.example' },
    });
    expect(foreign.status).toBe(403);
  });
});

describe('the sign-in page’s form, without a script', () => {
  const send = (fields: Record<string, string>, headers: Record<string, string> = {}) =>
    call(form, 'POST', '/sign-in/submit', {
      body: new URLSearchParams(fields).toString(),
      headers: { ...FORM, origin: 'http://127.0.0.1:3000', ...headers },
    });

  it('signs in and leads on', async () => {
    const answer = await send({ email: person.email, password: PASSWORD, callbackUrl: '/orchards' });
    expect([answer.status, answer.headers.get('location')]).toEqual([303, '/orchards']);
    const session = pairs(answer).find((pair) => pair.startsWith('next-auth.session-token=')) ?? '';
    expect(await sessionOf(session)).toMatchObject({ user: { id: person.id } });
  });

  it('leads back with the address that was typed, and not with the password', async () => {
    const answer = await send({
      email: person.email,
      password: 'not the password',
      callbackUrl: '/orchards',
    });
    expect(answer.headers.get('location')).toBe('/sign-in?error=wrong&callbackUrl=%2Forchards');
    const cookie = answer.headers.getSetCookie().join();
    const typed = Buffer.from(/typed=([^;]+)/.exec(cookie)?.[1] ?? '', 'base64url').toString();
    expect(JSON.parse(typed)).toEqual({ email: person.email });
    expect(cookie).not.toContain('session-token');
  });

  it('is refused to another site', async () => {
    const fields = { email: person.email, password: PASSWORD };
    expect((await send(fields, { origin: 'https://elsewhere.example' })).status).toBe(403);
    expect((await send(fields, { origin: 'null' })).status).toBe(403);
  });
});

describe('wrong tries', () => {
  const wrong = (email: string, address: string) =>
    checkPassword(database(), email, 'not the password', address);
  const outcome = (tried: Promise<unknown>) =>
    tried.then(
      (value) => (value === null ? 'wrong' : 'right'),
      (error: { status?: number }) => error.status,
    );

  it('ten for an account from one address are checked, the eleventh is 429 with Retry-After', async () => {
    for (let count = 0; count < 10; count += 1) {
      expect((await signIn(person.email, 'not the password')).status).toBe(401);
    }
    const answer = await signIn(person.email, PASSWORD);
    expect(answer.status).toBe(429);
    expect(answer.headers.get('content-type')).toBe('application/problem+json');
    const wait = Number(answer.headers.get('retry-after'));
    expect(wait).toBeGreaterThan(14 * 60);
    expect(wait).toBeLessThanOrEqual(15 * 60);
    expect(pairs(answer).join()).not.toContain('session-token');
    const page = await signIn(person.email, PASSWORD, { headers: { accept: 'text/html' } });
    expect(page.headers.get('location')).toMatch(/^\/sign-in\?error=too-many&wait=\d+$/);
  });

  it('sent at once are counted like as many in a row', async () => {
    const outcomes = await Promise.all(
      Array.from({ length: 25 }, () => outcome(wrong(person.email, '192.0.2.1'))),
    );
    expect(outcomes.filter((one) => one === 'wrong')).toHaveLength(10);
    expect(outcomes.filter((one) => one === 429)).toHaveLength(15);
  });

  it('of another address or another account do not count', async () => {
    for (let count = 0; count < 10; count += 1) await wrong(person.email, '192.0.2.1');
    expect(await outcome(wrong(person.email, '192.0.2.2'))).toBe('wrong');
    const right = checkPassword(database(), person.email, PASSWORD, '192.0.2.2');
    expect(await outcome(right)).toBe('right');
    expect(await outcome(wrong('another@people.example', '192.0.2.1'))).toBe('wrong');
  });

  it('of an account are forgotten once the right password comes', async () => {
    for (let count = 0; count < 9; count += 1) await wrong(person.email, '192.0.2.1');
    await checkPassword(database(), person.email, PASSWORD, '192.0.2.1');
    for (let count = 0; count < 10; count += 1) {
      expect(await outcome(wrong(person.email, '192.0.2.1'))).toBe('wrong');
    }
    expect(await outcome(wrong(person.email, '192.0.2.1'))).toBe(429);
  });

  it('fifty from an address, over any accounts, are checked', async () => {
    for (let count = 0; count < 50; count += 1) {
      expect(await outcome(wrong(`number-${count}@people.example`, '192.0.2.1'))).toBe('wrong');
    }
    expect(await outcome(wrong('number-51@people.example', '192.0.2.1'))).toBe(429);
    const right = checkPassword(database(), person.email, PASSWORD, '192.0.2.1');
    expect(await outcome(right)).toBe(429);
    expect(await outcome(wrong('number-51@people.example', '192.0.2.2'))).toBe('wrong');
  });

  it('right ones, many at once, are never too many', async () => {
    const many = Array.from({ length: 60 }, () =>
      outcome(checkPassword(database(), person.email, PASSWORD, '192.0.2.1')),
    );
    expect(new Set(await Promise.all(many))).toEqual(new Set(['right']));
  });

  it('count for a quarter of an hour each, not longer', async () => {
    const start = Date.now();
    const minutes = (count: number) => start + count * 60_000;
    const db = database();
    for (let count = 0; count < 10; count += 1) await countTry(db, WRONG_FOR_ACCOUNT, 'one', minutes(count));
    const spent = (nowMs: number) => outcome(refuseWhenSpent(db, WRONG_FOR_ACCOUNT, 'one', nowMs));
    expect(await spent(minutes(14.9))).toBe(429);
    expect(await spent(minutes(15.1))).not.toBe(429);
    await countTry(db, WRONG_FOR_ACCOUNT, 'one', minutes(15.1));
    expect(await spent(minutes(15.2))).toBe(429);
  });

  it('keep neither the e-mail nor the network address', async () => {
    await wrong(person.email, '192.0.2.77');
    const kept = JSON.stringify(await database()('tries'));
    expect(kept).not.toContain(person.id);
    expect(kept).not.toContain('192.0.2.77');
  });
});
