import { existsSync, mkdtempSync, readdirSync, renameSync, rmSync } from 'node:fs';
import { basename, dirname, join } from 'node:path';
import { findProgram } from './install';
import { bound, isRoot, lastLines, run, saying } from './run';

/**
 * Lays out an empty data folder where there is none. It gets its name once it is whole, so a kill in between leaves
 * nothing half made.
 * @throws Error when the folder holds something else
 */
export async function initialise(files: string, log: (line: string) => void): Promise<void> {
  if (existsSync(join(files, 'mysql'))) return;
  if (existsSync(files) && readdirSync(files).length > 0) {
    throw new Error(
      `${files} holds something else than a MariaDB data folder. Move it away, or set DATA_DIR.`,
    );
  }
  const home = dirname(files);
  const prefix = `${basename(files)}.new-`;
  for (const name of readdirSync(home)) {
    if (name.startsWith(prefix)) rmSync(join(home, name), { recursive: true, force: true, maxRetries: 5 });
  }
  const unfinished = mkdtempSync(join(home, prefix));
  const program = findProgram('mariadb-install-db') ?? 'mariadb-install-db';
  const outcome = await saying(
    log,
    'Waiting for an empty database to be laid out',
    run(
      ...bound(program, [
        '--no-defaults',
        `--datadir=${unfinished}`,
        '--auth-root-authentication-method=normal',
        '--skip-test-db',
        ...(isRoot() ? ['--user=root'] : []),
      ]),
    ),
  );
  if (outcome.code !== 0) {
    rmSync(unfinished, { recursive: true, force: true });
    throw new Error(`The database folder could not be made:\n${lastLines(outcome.output, 5)}`);
  }
  renameSync(unfinished, files);
}
