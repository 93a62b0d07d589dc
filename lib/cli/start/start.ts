import { join, resolve } from 'node:path';
import { writeFileSync } from 'node:fs';
import { connect } from '@/db/connection';
import { migrate } from '@/db/migrate';
import { isTaken } from '@/db/server/free-port';
import { saying } from '@/db/server/run';
import { keptSecret, startServer, type Server } from '@/db/server/server';
import { seedIfEmpty } from '@/lib/demo/seed';
import { readEnv, type Env } from '@/lib/env';
import { buildIfChanged } from './build';
import { holdDataDir } from './lock';
import { say } from './say';
import { untilToldToStop } from './signals';
import { serve, waitForHealth, type Web } from './web';

const MIGRATION_SECONDS = 600;

/** `npm start`: everything that the app needs, then the app, until it is told to stop. */
export async function start(): Promise<void> {
  const settings = readEnv();
  if (await isTaken(settings.PORT)) {
    throw new Error(`Port ${settings.PORT} is taken. Stop what listens there, or set PORT to another one.`);
  }
  const letGo = holdDataDir(settings.DATA_DIR);
  const told = untilToldToStop();
  let server: Server | undefined;
  let web: Web | undefined;
  try {
    server = settings.DATABASE_URL ? undefined : await startServer({ dataDir: settings.DATA_DIR, log: say });
    const databaseUrl = settings.DATABASE_URL ?? (server as Server).url;
    if (server) writeFileSync(join(settings.DATA_DIR, 'database-url'), databaseUrl, { mode: 0o600 });
    await prepare(databaseUrl, settings);
    const distDir = process.env['NEXT_DIST_DIR'] || '.next';
    if (!told.now()) await buildIfChanged(distDir, say);
    if (told.now()) return;
    web = serve(settings.PORT, webEnvironment(settings, databaseUrl));
    const url = `http://127.0.0.1:${settings.PORT}`;
    await Promise.race([waitForHealth(url, web, say), told.promise]);
    if (!told.now()) say(welcome(settings));
    const reason = await Promise.race([
      told.promise,
      web.ended.then((code) => `The web process ended by itself (${code}).`),
      ...(server ? [server.ended.then((code) => `The database server ended by itself (${code}).`)] : []),
    ]);
    if (!told.now()) throw new Error(`${reason} Everything is stopped; start again to go on.`);
  } finally {
    if (web || server) say('Stopping …');
    await web?.stop();
    await server?.stop();
    letGo();
    told.done();
  }
}

async function prepare(databaseUrl: string, settings: Env): Promise<void> {
  const db = connect(databaseUrl, { poolMax: 2, statementTimeoutSeconds: MIGRATION_SECONDS });
  try {
    await saying(say, 'Waiting for the tables to be brought up to date', migrate(db));
    await saying(say, 'Waiting for the catalogue and the demo', seedIfEmpty(db, settings, say));
  } finally {
    await db.destroy();
  }
}

/** What the web process is told: the settings, and what was made for it. */
function webEnvironment(settings: Env, databaseUrl: string): Record<string, string> {
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

function welcome({ APP_URL, DEMO, DEMO_PASSWORD }: Env): string {
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
