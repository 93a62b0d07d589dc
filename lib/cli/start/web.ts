import { spawn, type ChildProcess } from 'node:child_process';
import { saying } from '@/db/server/run';
import { NEXT } from './build';

const READY_MS = 60_000;
const STOP_MS = 10_000;

export type Web = { ended: Promise<number | null>; stop: () => Promise<void> };

/** Serves the built pages in a process of their own. */
export function serve(port: number, environment: Record<string, string>): Web {
  const child = spawn(process.execPath, [NEXT, 'start', '-H', '127.0.0.1', '-p', String(port)], {
    stdio: ['ignore', 'ignore', 'inherit'],
    env: { ...process.env, ...environment, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' },
    detached: true,
  });
  const ended = new Promise<number | null>((done) => child.once('exit', (code) => done(code)));
  return { ended, stop: () => stop(child, ended) };
}

async function stop(child: ChildProcess, ended: Promise<number | null>): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  child.kill('SIGTERM');
  const giveUp = setTimeout(() => child.kill('SIGKILL'), STOP_MS);
  await ended;
  clearTimeout(giveUp);
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
    await new Promise((done) => setTimeout(done, 100));
  }
  throw new Error('The app did not answer. What it said stands above.');
}
