import { join, resolve } from 'node:path';
import { keptSecret } from '@/db/server/secret';
import type { Env } from '@/lib/env';

/** What the web process is told: the settings, and what was made for it. */
export function webEnvironment(settings: Env, databaseUrl: string): Record<string, string> {
  const secret = settings.AUTH_SECRET ?? keptSecret(join(settings.DATA_DIR, 'auth-secret'));
  return {
    PORT: String(settings.PORT),
    APP_URL: settings.APP_URL,
    DATA_DIR: resolve(settings.DATA_DIR),
    DATABASE_URL: databaseUrl,
    DEMO: settings.DEMO ? '1' : '0',
    MEASURE: settings.MEASURE ? '1' : '0',
    AUTH_SECRET: secret,
    NEXTAUTH_SECRET: secret,
    NEXTAUTH_URL: settings.APP_URL,
  };
}

/** Where to look, how to sign in, how to stop. */
export function welcome({ APP_URL, DEMO, DEMO_PASSWORD }: Env): string {
  const people = ['grower', 'neighbour', 'helper', 'moderator', 'admin'].map(
    (who) => `${who}@aftercut.example`,
  );
  return [
    '',
    `  Aftercut is at ${APP_URL}`,
    ...(DEMO
      ? [
          '  Its records are invented, to try things out. Sign in with one of',
          `    ${people.slice(0, 3).join(' · ')}`,
          `    ${people.slice(3).join(' · ')}`,
          `  and the password ${DEMO_PASSWORD}`,
        ]
      : ['  Nobody has an account yet? The first one is made at /sign-up.']),
    '  Ctrl-C stops it; the data stays.',
    '',
  ].join('\n');
}
