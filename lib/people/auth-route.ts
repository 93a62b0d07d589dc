import type { NextRequest } from 'next/server';
import { NotFound, Refusal } from '@/lib/errors/errors';
import { clientAddress } from '@/lib/http/address';
import { readForm } from '@/lib/http/form';
import { problem } from '@/lib/http/problem';
import { askNextAuth } from './next-auth';
import { seeOther, signInPage } from './sign-in-form';

const READABLE = ['csrf', 'session', 'providers', 'signin', 'signout', 'error'];
const POSTABLE = ['callback/credentials', 'signout'];

/**
 * What stands below `/api/auth`: next-auth's own answers, with its refusals in the manner of the rest of the API. A
 * browser that sent a form gets the sign-in page instead of a problem document.
 */
export async function answerAuth(request: NextRequest, path: string[]): Promise<Response> {
  const action = path.join('/');
  const isPost = request.method === 'POST';
  if (!(isPost ? POSTABLE : READABLE).includes(action)) {
    if (![...READABLE, ...POSTABLE].includes(action)) throw new NotFound();
    const allow = isPost ? 'GET' : 'POST';
    const detail = `${request.method} is not offered here; ${allow} is.`;
    return problem({ title: 'No such method here', status: 405, detail }, { allow });
  }
  const query = Object.fromEntries(request.nextUrl.searchParams);
  const form = isPost ? await readForm(request) : {};
  const cookies = Object.fromEntries(request.cookies.getAll().map(({ name, value }) => [name, value]));
  try {
    const { status, headers, body, location } = await askNextAuth({
      path,
      method: isPost ? 'POST' : 'GET',
      query,
      form,
      cookies,
      address: clientAddress(request.headers),
    });
    headers.set('cache-control', 'no-store');
    if (location !== null) {
      headers.set('location', location);
      return new Response(null, { status, headers });
    }
    headers.set('content-type', 'application/json; charset=utf-8');
    return new Response(JSON.stringify(body), { status, headers });
  } catch (error) {
    const wantsPage = request.headers.get('accept')?.includes('text/html');
    if (!isPost || !wantsPage || !(error instanceof Refusal)) throw error;
    return seeOther(signInPage(error, form['callbackUrl'] ?? query['callbackUrl']));
  }
}
