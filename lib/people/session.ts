import { cache } from 'react';
import { cookies } from 'next/headers';
import { decode } from 'next-auth/jwt';
import { database } from '@/lib/database';
import { authSecret, sessionCookieName } from './auth-settings';
import type { Actor } from './actor';
import { activePerson } from './table';

/**
 * Whoever is signed in, or null. The signed cookie only says who it was made for; the person's row says what counts now,
 * so a changed role, a disabled account or a sign-out everywhere holds from the next request on.
 */
export const currentActor = cache(async (): Promise<Actor | null> => {
  const value = (await cookies()).get(sessionCookieName())?.value;
  if (!value) return null;
  const token = await decode({ token: value, secret: authSecret() }).catch(() => null);
  if (!token?.sub || typeof token.sessionVersion !== 'number') return null;
  return activePerson(database(), token.sub, token.sessionVersion);
});
