import { readEnv } from '@/lib/env';
import { prepare } from './start/fill';
import { plainReason, say } from './start/say';

/** `npm run migrate`: what a start does to the database of DATABASE_URL, without starting. */
async function run(): Promise<void> {
  const settings = readEnv();
  if (!settings.DATABASE_URL)
    throw new Error('DATABASE_URL is not set. The embedded server is brought up to date by "npm start".');
  await prepare(settings.DATABASE_URL, settings);
  say('The tables are up to date.');
}

run().catch((error: unknown) => {
  console.error(plainReason(error));
  process.exitCode = 1;
});
