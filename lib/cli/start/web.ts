import { spawn } from 'node:child_process';
import { readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { bound, endChild, saying } from '@/db/server/run';
import { NEXT } from './build';

const READY_MS = 60_000;
const STOP_MS = 10_000;
const LEFTOVER_MS = 5000;
const LOOK_MS = 100;

export type Web = { ended: Promise<number | null>; stop: () => Promise<void> };

const pidFile = (dataDir: string) => join(dataDir, 'web.pid');

/** Serves the built pages in a process of their own. */
export function serve(port: number, dataDir: string, environment: Record<string, string>): Web {
  const child = spawn(...bound(process.execPath, [NEXT, 'start', '-H', '127.0.0.1', '-p', String(port)]), {
    stdio: ['ignore', 'ignore', 'inherit'],
    env: { ...process.env, ...environment, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' },
    detached: true,
  });
  writeFileSync(pidFile(dataDir), String(child.pid ?? ''));
  const ended = new Promise<number | null>((done) => {
    child.once('exit', (code) => done(code));
    child.once('error', () => done(127));
  });
  return {
    ended,
    stop: async () => {
      await endChild(child, ended, STOP_MS);
      rmSync(pidFile(dataDir), { force: true });
    },
  };
}

/** Ends the web process that a killed start left behind on this data folder, so that its port is free. */
export async function endLeftoverWeb(dataDir: string, log: (line: string) => void): Promise<void> {
  const pid = leftoverPid(dataDir);
  if (pid === null) return;
  log('The web process of an earlier start is still running; it is stopped first.');
  const deadline = Date.now() + LEFTOVER_MS;
  process.kill(pid, 'SIGTERM');
  while (leftoverPid(dataDir) === pid) {
    if (Date.now() > deadline) process.kill(pid, 'SIGKILL');
    await wait(LOOK_MS);
  }
}

/** A process of that number which runs on this very folder; another program may have been given the number since. */
function leftoverPid(dataDir: string): number | null {
  try {
    const pid = Number(readFileSync(pidFile(dataDir), 'utf8'));
    const environment = readFileSync(`/proc/${pid}/environ`, 'utf8').split('\0');
    return pid > 1 && environment.includes(`DATA_DIR=${resolve(dataDir)}`) ? pid : null;
  } catch {
    return null;
  }
}

/** Waits until the app answers that it is well. */
export function waitForHealth(url: string, web: Web, log: (line: string) => void): Promise<void> {
  return saying(log, 'Waiting for the first answer', healthy(url, web));
}

async function healthy(url: string, web: Web): Promise<void> {
  const deadline = Date.now() + READY_MS;
  let ended = false;
  void web.ended.then(() => (ended = true));
  while (!ended && Date.now() < deadline) {
    const answer = await fetch(`${url}/api/health`).catch(() => null);
    if (answer?.ok) return;
    await wait(LOOK_MS);
  }
  throw new Error('The app did not answer. What it said stands above.');
}
