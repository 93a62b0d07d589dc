import type { NextApiRequest, NextApiResponse } from 'next';
import NextAuth from 'next-auth';
import { env } from '@/lib/env';
import { Forbidden } from '@/lib/errors/errors';
import { authRun, ownOrigins } from './auth-options';
import { ownPath } from './own-path';

export type AuthQuestion = {
  /** What follows `/api/auth/`. */
  path: string[];
  method: 'GET' | 'POST';
  query?: Record<string, string>;
  /** The fields of a form. */
  form?: Record<string, string>;
  cookies?: Record<string, string>;
  /** Where it is asked from (`clientAddress`). */
  address: string;
};

export type AuthAnswer = {
  status: number;
  headers: Headers;
  body: unknown;
  /** Where the browser is sent next, on this site. */
  location: string | null;
};

/**
 * Asks next-auth, through its interface for API routes: that one takes cookies and form as they are given to it, so that
 * a form without a script can be answered in one step (`sign-in-form.ts`).
 * @throws WrongCredentials, Forbidden without the token that guards forms, TooMany
 */
export async function askNextAuth(question: AuthQuestion): Promise<AuthAnswer> {
  // next-auth reads the address it is reached at from here alone.
  process.env.NEXTAUTH_URL ??= env().APP_URL;
  const { path, method, query = {}, form = {}, cookies = {}, address } = question;
  const run = authRun(address);
  const answer: AuthAnswer = { status: 200, headers: new Headers(), body: null, location: null };
  const request = {
    query: { ...onlyOwnCallback(query), nextauth: path },
    method,
    body: onlyOwnCallback(form),
    cookies: onlyOwnCallback(cookies),
    headers: {},
  };
  const response = recorder(answer);
  await NextAuth(request as unknown as NextApiRequest, response as unknown as NextApiResponse, run.options);
  if (run.failure) throw run.failure;
  return settled(answer);
}

function settled(answer: AuthAnswer): AuthAnswer {
  const sentTo = answer.headers.get('location') ?? (answer.body as { url?: string } | null)?.url ?? '';
  if (sentTo.endsWith('?csrf=true')) {
    throw new Forbidden('Send the csrfToken that GET /api/auth/csrf gives, with the cookie it sets.');
  }
  if (answer.headers.has('location')) {
    answer.location = ownPath(answer.headers.get('location'), ownOrigins());
    answer.headers.delete('location');
  }
  return answer;
}

/** next-auth breaks off over a callback address that is none; here one that leads elsewhere counts as `/`. */
function onlyOwnCallback(fields: Record<string, string>): Record<string, string> {
  return Object.fromEntries(
    Object.entries(fields).map(([name, value]) =>
      /callback-?url$/i.test(name) ? [name, ownPath(value, ownOrigins())] : [name, value],
    ),
  );
}

/** As much of a response as next-auth uses. */
function recorder(answer: AuthAnswer) {
  const response = {
    status(code: number) {
      answer.status = code;
      return response;
    },
    getHeader: (name: string) =>
      name.toLowerCase() === 'set-cookie' ? answer.headers.getSetCookie() : answer.headers.get(name),
    setHeader(name: string, value: string | string[]) {
      answer.headers.delete(name);
      for (const one of [value].flat()) answer.headers.append(name, one);
    },
    json: (body: unknown) => void (answer.body = body),
    send: (body: unknown) => void (answer.body = body),
    end: () => undefined,
  };
  return response;
}
