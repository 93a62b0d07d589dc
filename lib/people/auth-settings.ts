import { env } from '@/lib/env';

/** Signs the session cookie. The start command makes one where none is set. */
export function authSecret(): string {
  const secret = env().AUTH_SECRET;
  if (!secret) throw new Error('AUTH_SECRET is not set: start the app with "npm start", which makes one.');
  return secret;
}

/** Browsers keep a cookie of this prefix to encrypted connections. */
export function sessionCookieName(): string {
  const secure = env().APP_URL.startsWith('https:');
  return `${secure ? '__Secure-' : ''}next-auth.session-token`;
}
