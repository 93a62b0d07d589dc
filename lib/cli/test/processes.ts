import { spawn } from 'node:child_process';
import type { Told } from '../start/signals';

/** Runs a command with its output shown; ends it when the whole run is told to stop. Gives its exit code. */
export function runShown(
  program: string,
  args: readonly string[],
  env: Record<string, string>,
  told: Told,
): Promise<number | null> {
  return new Promise((done) => {
    const child = spawn(program, args, {
      stdio: ['ignore', 'inherit', 'inherit'],
      env: { ...process.env, ...env },
    });
    void told.promise.then(() => child.kill('SIGTERM'));
    child.once('error', (error) => {
      console.error(error.message);
      done(127);
    });
    child.once('exit', (code) => done(code));
  });
}
