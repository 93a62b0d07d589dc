import { existsSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { basename, join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { saying } from './run';

const WAIT_MS = 60_000;
const LOOK_MS = 100;

/**
 * Ends a server that a killed start left running on this very data folder, so that its files are free, and clears its
 * pid file. What runs is asked, not the pid file: a server that still repairs itself has written none, and an old one's
 * pid may be somebody else's by now.
 */
export async function endLeftover(files: string, log: (line: string) => void): Promise<void> {
  for (const pid of serversOf(files)) {
    log('A database server of an earlier start is still running; it is stopped first.');
    process.kill(pid, 'SIGTERM');
    await saying(log, 'Waiting for the earlier database server to stop', gone(pid, files));
  }
  rmSync(join(files, 'server.pid'), { force: true });
}

function serversOf(files: string): number[] {
  if (!existsSync('/proc/self')) return [];
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name))
    .map(Number)
    .filter((pid) => isServerOf(pid, files));
}

function isServerOf(pid: number, files: string): boolean {
  try {
    const [program = '', ...args] = readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0');
    return basename(program) === 'mariadbd' && args.includes(`--datadir=${files}`);
  } catch {
    return false;
  }
}

async function gone(pid: number, files: string): Promise<void> {
  const deadline = Date.now() + WAIT_MS;
  while (isServerOf(pid, files)) {
    if (Date.now() > deadline)
      throw new Error(`The database server of an earlier start (process ${pid}) does not stop.`);
    await wait(LOOK_MS);
  }
}
