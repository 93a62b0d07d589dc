import { existsSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { isRoot, lastLines, run, saying } from './run';

const PACKAGES = ['mariadb-server-core', 'mariadb-client-core'] as const;
const FOLDERS = [...(process.env['PATH'] ?? '').split(delimiter), '/usr/sbin', '/usr/bin', '/usr/libexec'];

/** Where a program lies, or null. */
export function findProgram(name: string): string | null {
  return FOLDERS.map((folder) => join(folder, name)).find((path) => existsSync(path)) ?? null;
}

export function findServer(): string | null {
  return findProgram('mariadb-install-db') && findProgram('mariadb') ? findProgram('mariadbd') : null;
}

/** @throws Error that says which package to install, where this user may not. */
export async function installServer(log: (line: string) => void): Promise<string> {
  await installPackages(PACKAGES, 'MariaDB', log);
  const found = findServer();
  if (!found) throw new Error(`MariaDB was installed but cannot be found. Is ${PACKAGES[0]} complete?`);
  return found;
}

/** Installs Debian's packages; an installation under way elsewhere is waited for. */
export async function installPackages(
  packages: readonly string[],
  what: string,
  log: (line: string) => void,
): Promise<void> {
  if (!isRoot()) {
    throw new Error(`${what} is missing. Ask an administrator for: apt-get install ${packages.join(' ')}`);
  }
  const wait = ['-o', 'DPkg::Lock::Timeout=300'];
  const install = [...wait, 'install', '-y', '--no-install-recommends', ...packages];
  await saying(log, "Waiting for Debian's package lists", run('apt-get', [...wait, 'update']));
  const outcome = await saying(log, `Waiting for ${what} to be installed`, run('apt-get', install));
  if (outcome.code !== 0) {
    throw new Error(
      `${what} could not be installed (apt-get install ${packages.join(' ')}):\n${lastLines(outcome.output, 5)}`,
    );
  }
}
