import { existsSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { saying } from './run';

const WAIT_MS = 60_000;
const LOOK_MS = 100;

/**
 * Ends the server that a killed start left running on this very data folder, so that its files are free; clears a pid
 * file whose process is gone or is something else.
 */
export async function endLeftover(files: string, log: (line: string) => void): Promise<void> {
  const pidFile = join(files, 'server.pid');
  if (!existsSync(pidFile)) return;
  const pid = Number(readFileSync(pidFile, 'utf8').trim());
  if (isServerOf(pid, files)) {
    log('A database server of an earlier start is still running; it is stopped first.');
    process.kill(pid, 'SIGTERM');
    await saying(log, 'Waiting for the earlier database server to stop', gone(pid, files));
  }
  rmSync(pidFile, { force: true });
}

function isServerOf(pid: number, files: string): boolean {
  if (!Number.isInteger(pid) || pid < 2) return false;
  try {
    const words = readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0');
    return words.includes(`--datadir=${files}`);
  } catch {
    return false;
  }
}

async function gone(pid: number, files: string): Promise<void> {
  const deadline = Date.now() + WAIT_MS;
  while (isServerOf(pid, files)) {
    if (Date.now() > deadline)
      throw new Error(`The database server of an earlier start (process ${pid}) does not stop.`);
    await new Promise((done) => setTimeout(done, LOOK_MS));
  }
}
