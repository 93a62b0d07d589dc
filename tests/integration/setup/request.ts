import { NextRequest } from 'next/server';
import { encode } from 'next-auth/jwt';
import { database } from '@/lib/database';
import type { Handler, Method } from '@/lib/http/handler';
import { authSecret, sessionCookieName } from '@/lib/people/auth-settings';
import { cookieJar } from './cookie-jar';

export const ORIGIN = 'http://127.0.0.1:3000';

type Sent = {
  /** What stands in the address's brackets. */
  params?: Record<string, string | string[]>;
  /** Sent as JSON, unless it is text, form data or bytes already. */
  body?: unknown;
  headers?: Record<string, string>;
  /** The id of whoever asks; nobody for a visitor. */
  actor?: { id: string } | null;
};

/** `Cookie` header of somebody's signed-in browser: a real, signed session of the version that their row holds. */
export async function asPerson(person: { id: string }): Promise<string> {
  const row = await database()('people')
    .where({ id: person.id })
    .first<{ session_version: number } | undefined>('session_version');
  if (!row) throw new Error(`nobody has the id ${person.id}`);
  const token = await encode({
    token: { sub: person.id, sessionVersion: row.session_version },
    secret: authSecret(),
  });
  return `${sessionCookieName()}=${token}`;
}

/**
 * Sends a request through a route's whole chain: `call(route, 'PUT', '/api/orchards/' + id, { params: { id }, body, actor })`.
 * @param routes what the route's module exports
 * @param path with its query
 */
export async function call(
  routes: Partial<Record<Method, Handler>>,
  method: Method,
  path: string,
  { params = {}, body, headers = {}, actor = null }: Sent = {},
): Promise<Response> {
  const run = routes[method];
  if (!run) throw new Error(`this route exports no ${method}`);
  const isRaw =
    body === undefined || typeof body === 'string' || body instanceof FormData || body instanceof Uint8Array;
  const request = new NextRequest(new URL(path, ORIGIN), {
    method,
    headers: {
      ...(isRaw ? {} : { 'content-type': 'application/json' }),
      ...(actor ? { cookie: await asPerson(actor) } : {}),
      ...headers,
    },
    ...(body === undefined ? {} : { body: isRaw ? (body as BodyInit) : JSON.stringify(body) }),
  });
  return cookieJar.run(request.cookies, () => run(request, { params: Promise.resolve(params) }));
}

/** The JSON of an answer, in the shape that the test says it has. */
export async function read<T = Record<string, unknown>>(answer: Response): Promise<T> {
  return (await answer.json()) as T;
}
