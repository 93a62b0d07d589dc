import { mkdirSync, renameSync, rmSync } from 'node:fs';
import { dirname } from 'node:path';
import { findProgram } from './install';
import { isRoot, lastLines, run, saying } from './run';

/** Makes an empty data folder. It gets its name once it is whole, so a kill in between leaves nothing half made. */
export async function initialise(files: string, log: (line: string) => void): Promise<void> {
  const unfinished = `${files}.new`;
  rmSync(unfinished, { recursive: true, force: true });
  mkdirSync(dirname(files), { recursive: true });
  const program = findProgram('mariadb-install-db') ?? 'mariadb-install-db';
  const outcome = await saying(
    log,
    'Waiting for an empty database to be laid out',
    run(program, [
      '--no-defaults',
      `--datadir=${unfinished}`,
      '--auth-root-authentication-method=normal',
      '--skip-test-db',
      ...(isRoot() ? ['--user=root'] : []),
    ]),
  );
  if (outcome.code !== 0)
    throw new Error(`The database folder could not be made:\n${lastLines(outcome.output, 5)}`);
  renameSync(unfinished, files);
}
