import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { isRoot, lastLines, run, saying } from './run';

const PACKAGES = ['mariadb-server-core', 'mariadb-client-core'] as const;
const FOLDERS = [...(process.env['PATH'] ?? '').split(delimiter), '/usr/sbin', '/usr/bin', '/usr/libexec'];
const LOCK_WAIT_SECONDS = 300;
const LOCK_LOOK_MS = 1000;

/** Where a program lies, or null. */
export function findProgram(name: string): string | null {
  return FOLDERS.map((folder) => join(folder, name)).find((path) => existsSync(path)) ?? null;
}

/** Whether a program of a Debian package can be used. One that is just being unpacked by another run cannot. */
export function isInstalled(program: string, debianPackage: string): boolean {
  if (!findProgram(program)) return false;
  const asked = spawnSync('dpkg-query', ['-W', '-f', '${db:Status-Status}', debianPackage], {
    encoding: 'utf8',
  });
  return asked.status !== 0 || asked.stdout === 'installed' || asked.stdout === 'not-installed';
}

/** The server's program; installs it where it is missing. */
export async function haveServer(log: (line: string) => void): Promise<string> {
  const [server, client] = PACKAGES;
  const whole =
    isInstalled('mariadbd', server) &&
    isInstalled('mariadb-install-db', server) &&
    isInstalled('mariadb', client);
  if (!whole) await installPackages(PACKAGES, 'MariaDB', log);
  const found = findProgram('mariadbd');
  if (!found) throw new Error(`MariaDB was installed but cannot be found. Is ${server} complete?`);
  return found;
}

/**
 * Installs Debian's packages; an installation under way elsewhere is waited for.
 * @throws Error that says which package to install, where this user may not.
 */
export async function installPackages(
  packages: readonly string[],
  what: string,
  log: (line: string) => void,
): Promise<void> {
  const command = `apt-get install ${packages.join(' ')}`;
  if (!isRoot()) throw new Error(`${what} is missing. Ask an administrator for: ${command}`);
  await saying(log, "Waiting for Debian's package lists", updateLists());
  const outcome = await saying(
    log,
    `Waiting for ${what} to be installed`,
    run('apt-get', [
      '-o',
      `DPkg::Lock::Timeout=${LOCK_WAIT_SECONDS}`,
      'install',
      '-y',
      '--no-install-recommends',
      ...packages,
    ]),
  );
  if (outcome.code !== 0)
    throw new Error(`${what} could not be installed (${command}):\n${lastLines(outcome.output, 5)}`);
}

/** Lists that cannot be fetched are no failure yet: what stands in the old ones may do. */
async function updateLists(): Promise<void> {
  const deadline = Date.now() + LOCK_WAIT_SECONDS * 1000;
  for (;;) {
    const { code, output } = await run('apt-get', ['update']);
    // apt waits for no lock of its lists by itself.
    if (code === 0 || !output.includes('Could not get lock') || Date.now() > deadline) return;
    await wait(LOCK_LOOK_MS);
  }
}
