import { spawn } from 'node:child_process';
import { bound } from '@/db/server/run';
import type { Told } from '../start/signals';

/** Settings of this shell that are for a start, and would make tests say something else here than elsewhere. */
const FOR_A_START = [
  'PORT',
  'APP_URL',
  'DATABASE_URL',
  'DATA_DIR',
  'MEILI_URL',
  'MEILI_KEY',
  'SMTP_URL',
  'PHOTO_STORE_URL',
  'TRUST_PROXY',
  'AUTH_SECRET',
  'DEMO',
  'DEMO_PASSWORD',
  'MEASURE',
  'NEXT_DIST_DIR',
  'NODE_ENV',
] as const;

/** This process's environment without the settings of a start, and with `extra`. */
export function plainEnvironment(extra: Record<string, string>): NodeJS.ProcessEnv {
  const env: NodeJS.ProcessEnv = { ...process.env };
  for (const name of FOR_A_START) delete env[name];
  return { ...env, ...extra };
}

/** Runs a command with its output shown; ends it when the whole run is told to stop. Gives its exit code. */
export function runShown(
  program: string,
  args: readonly string[],
  env: Record<string, string>,
  told: Told,
): Promise<number | null> {
  return new Promise((done) => {
    const child = spawn(...bound(program, args), {
      stdio: ['ignore', 'inherit', 'inherit'],
      env: plainEnvironment(env),
    });
    // An interrupt is what the test runners clean up after.
    const end = () => child.kill('SIGINT');
    told.signal.addEventListener('abort', end, { once: true });
    child.once('error', (error) => {
      console.error(error.message);
      done(127);
    });
    child.once('exit', (code) => {
      told.signal.removeEventListener('abort', end);
      done(code);
    });
  });
}
