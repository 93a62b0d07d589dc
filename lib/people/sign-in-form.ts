import type { NextRequest } from 'next/server';
import { Forbidden, Refusal, TooMany } from '@/lib/errors/errors';
import { clientAddress } from '@/lib/http/address';
import { ownOrigins } from './auth-options';
import { askNextAuth } from './next-auth';
import { ownPath } from './own-path';
import { WrongCredentials } from './sign-in';
import { keepTyped } from './typed';

/** Sends a browser on after a form, to be fetched with GET. */
export function seeOther(location: string, cookies: readonly string[] = []): Response {
  const headers = new Headers({ location, 'cache-control': 'no-store' });
  for (const cookie of cookies) headers.append('set-cookie', cookie);
  return new Response(null, { status: 303, headers });
}

/** The sign-in page that says why nobody was signed in, and still leads on to where the person wanted to go. */
export function signInPage(refusal: Refusal, callbackUrl: string | undefined): string {
  const query = new URLSearchParams({ error: reason(refusal) });
  if (refusal instanceof TooMany) query.set('wait', refusal.headers['retry-after'] ?? '');
  if (callbackUrl) query.set('callbackUrl', ownPath(callbackUrl, ownOrigins()));
  return `/sign-in?${query.toString()}`;
}

function reason(refusal: Refusal): string {
  if (refusal instanceof TooMany) return 'too-many';
  if (refusal instanceof WrongCredentials) return 'wrong';
  return refusal instanceof Forbidden ? 'expired' : 'failed';
}

/**
 * Answers the sign-in page's form, which works without a script. The caller has checked that the form came from this
 * site's own page, so next-auth's token against foreign forms is asked for and handed back here.
 * @param cookies further cookies to set with the answer
 */
export async function signInByForm(
  request: NextRequest,
  form: Record<string, string>,
  cookies: readonly string[] = [],
): Promise<Response> {
  const { email = '', password = '', callbackUrl } = form;
  const address = clientAddress(request.headers);
  try {
    const answer = await askGuarded(
      ['callback', 'credentials'],
      { email, password, callbackUrl: callbackUrl ?? '/' },
      address,
    );
    return seeOther(answer.location ?? '/', [...cookies, ...answer.headers.getSetCookie().filter(isSession)]);
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    return seeOther(signInPage(error, callbackUrl), [keepTyped('/sign-in', { email })]);
  }
}

/** Answers the sign-out button. */
export async function signOutByForm(request: NextRequest): Promise<Response> {
  const session = Object.fromEntries(
    request.cookies
      .getAll()
      .flatMap(({ name, value }) => (name.includes('session-token') ? [[name, value]] : [])),
  );
  const answer = await askGuarded(['signout'], { callbackUrl: '/' }, clientAddress(request.headers), session);
  return seeOther('/', answer.headers.getSetCookie().filter(isSession));
}

const isSession = (cookie: string): boolean => cookie.includes('next-auth.session-token');

async function askGuarded(
  path: string[],
  form: Record<string, string>,
  address: string,
  cookies: Record<string, string> = {},
) {
  const guard = await askNextAuth({ path: ['csrf'], method: 'GET', address });
  const { csrfToken } = guard.body as { csrfToken: string };
  const [pair = ''] =
    guard.headers
      .getSetCookie()
      .find((cookie) => cookie.includes('csrf-token'))
      ?.split(';') ?? [];
  const name = pair.slice(0, pair.indexOf('='));
  const value = decodeURIComponent(pair.slice(name.length + 1));
  return askNextAuth({
    path,
    method: 'POST',
    form: { ...form, csrfToken },
    cookies: { ...cookies, [name]: value },
    address,
  });
}
