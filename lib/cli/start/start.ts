import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { portTrouble } from '@/db/server/free-port';
import { writePrivately } from '@/db/server/secret';
import { startServer, type Server } from '@/db/server/server';
import { readEnv, type Env } from '@/lib/env';
import { buildIfChanged } from './build';
import { prepare } from './fill';
import { holdDataDir } from './lock';
import { say } from './say';
import { untilToldToStop, type Told } from './signals';
import { endLeftoverWeb, serve, waitForHealth, type Web } from './web';
import { webEnvironment, welcome } from './words';

/** What runs, in the order in which it was started. */
type Running = { server?: Server; web?: Web };

/** `npm start`: everything that the app needs, then the app, until it is told to stop. */
export async function start(): Promise<void> {
  const settings = readEnv();
  const letGo = holdDataDir(settings.DATA_DIR);
  const told = untilToldToStop();
  const running: Running = {};
  try {
    await bringUp(settings, told, running);
    say(welcome(settings));
    throw new Error(`${await oneEnds(running, told)} Everything is stopped; start again to go on.`);
  } catch (error) {
    // Whatever broke after the word to stop broke because of it.
    if (!told.now()) throw error;
  } finally {
    if (running.web || running.server) say('Stopping …');
    await running.web?.stop();
    await running.server?.stop();
    rmSync(addressFile(settings), { force: true });
    letGo();
    told.done();
  }
}

async function bringUp(settings: Env, told: Told, running: Running): Promise<void> {
  await endLeftoverWeb(settings.DATA_DIR, say);
  await refusePort(settings.PORT);
  // Not cut short: half an installation of packages would be worse than a stop that comes a little later.
  if (!settings.DATABASE_URL) running.server = await startServer({ dataDir: settings.DATA_DIR, log: say });
  const databaseUrl = settings.DATABASE_URL ?? running.server?.url ?? '';
  if (running.server) writePrivately(addressFile(settings), databaseUrl);
  await told.orStop(() => prepare(databaseUrl, settings));
  await told.orStop(() => buildIfChanged(process.env['NEXT_DIST_DIR'] || '.next', say, told.signal));
  const web = serve(settings.PORT, settings.DATA_DIR, webEnvironment(settings, databaseUrl));
  running.web = web;
  await told.orStop(() => waitForHealth(`http://127.0.0.1:${settings.PORT}`, web, say));
}

async function refusePort(port: number): Promise<void> {
  const trouble = await portTrouble(port);
  if (trouble === 'taken')
    throw new Error(`Port ${port} is taken. Stop what listens there, or set PORT to another one.`);
  if (trouble)
    throw new Error(`This user may not listen on port ${port}. Set PORT to one from 1024 upwards.`);
}

/** Says which part ended without having been told to; rejects when told to stop. */
function oneEnds({ web, server }: Running, told: Told): Promise<string> {
  const parts = { 'web process': web, 'database server': server };
  const endings = Object.entries(parts).flatMap(([name, part]) =>
    part ? [part.ended.then((code) => `The ${name} ended by itself (${code ?? 'killed'}).`)] : [],
  );
  return told.orStop(() => Promise.race(endings));
}

/** Where the embedded server's address stands while it runs, for knex's command line. */
function addressFile({ DATA_DIR }: Env): string {
  return join(DATA_DIR, 'database-url');
}
