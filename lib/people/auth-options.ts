import type { NextAuthOptions } from 'next-auth';
import Credentials from 'next-auth/providers/credentials';
import { database } from '@/lib/database';
import { env } from '@/lib/env';
import { log } from '@/lib/log/log';
import { authSecret } from './auth-settings';
import { ownPath } from './own-path';
import { checkPassword, WrongCredentials, type SignedIn } from './sign-in';
import { activePerson } from './table';

declare module 'next-auth/jwt' {
  interface JWT {
    /** Of the person's row when the session began; a session of another version has ended. */
    sessionVersion?: number;
  }
}

declare module 'next-auth' {
  interface Session {
    user: { id: string; name: string; role: string };
  }
  interface User {
    id: string;
    sessionVersion: number;
  }
}

const SESSION_SECONDS = 30 * 24 * 60 * 60;

/** One run of next-auth. `failure` is what stopped it, which next-auth itself would only make a redirect of. */
export type AuthRun = { options: NextAuthOptions; failure: unknown };

/** Origins under which this site's own addresses may be written. */
export function ownOrigins(): string[] {
  const { origin, port, protocol, hostname } = new URL(env().APP_URL);
  const suffix = port ? `:${port}` : '';
  const isLocal = hostname === '127.0.0.1' || hostname === 'localhost';
  return isLocal ? [`${protocol}//127.0.0.1${suffix}`, `${protocol}//localhost${suffix}`] : [origin];
}

/**
 * How people sign in: with e-mail and password, into a signed cookie that holds only who they are and the version of
 * their session.
 * @param address where this run is asked from
 */
export function authRun(address: string): AuthRun {
  const run: AuthRun = { failure: null, options: { providers: [] } };
  const provider = Credentials({
    name: 'E-mail and password',
    credentials: { email: { type: 'email' }, password: { type: 'password' } },
    async authorize(given): Promise<SignedIn> {
      try {
        const { email, password } = { email: '', password: '', ...given };
        const person = await checkPassword(database(), String(email), String(password), address);
        if (!person) throw new WrongCredentials();
        return person;
      } catch (error) {
        run.failure = error;
        throw error;
      }
    },
  });
  run.options = {
    providers: [provider],
    secret: authSecret(),
    useSecureCookies: env().APP_URL.startsWith('https:'),
    session: { strategy: 'jwt', maxAge: SESSION_SECONDS },
    pages: { signIn: '/sign-in', error: '/sign-in', signOut: '/account' },
    callbacks: {
      redirect: ({ url }) => ownPath(url, ownOrigins()),
      async jwt({ token, user }) {
        if (user) return { sub: user.id, sessionVersion: user.sessionVersion };
        const person = await activePerson(database(), String(token.sub), token.sessionVersion ?? -1);
        if (!person) throw new Error('this session was ended');
        return { sub: person.id, sessionVersion: token.sessionVersion };
      },
      async session({ session, token }) {
        const person = await activePerson(database(), String(token.sub), token.sessionVersion ?? -1);
        if (!person) throw new Error('this session was ended');
        return { ...session, user: { id: person.id, name: person.name, role: person.role } };
      },
    },
    logger: {
      error: (code) => log.debug({ code }, 'next-auth'),
      warn: (code) => log.debug({ code }, 'next-auth'),
      debug: () => undefined,
    },
  };
  return run;
}
