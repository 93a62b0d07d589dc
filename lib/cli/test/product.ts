import { spawn } from 'node:child_process';
import { setTimeout as wait } from 'node:timers/promises';
import { freePort } from '@/db/server/free-port';
import type { Told } from '../start/signals';
import { plainEnvironment } from './processes';

const READY_MS = 400_000;
const LOOK_MS = 200;

export type Product = { url: string; dataDir: string; stop: () => Promise<void> };

/**
 * Starts the whole product by its own start command, with its demo, over a throw-away folder: what the browser tests
 * drive is what a person starts.
 */
export async function startProduct(
  dataDir: string,
  nodeArgs: readonly string[],
  told: Told,
): Promise<Product> {
  const port = await freePort();
  const child = spawn(process.execPath, [...nodeArgs, 'lib/cli/start.ts'], {
    stdio: ['ignore', 'inherit', 'inherit'],
    env: plainEnvironment({
      PORT: String(port),
      DATA_DIR: dataDir,
      NEXT_DIST_DIR: '.next-test',
      DEMO: '1',
      MEASURE: '1',
    }),
  });
  const ended = new Promise<number | null>((done) => child.once('exit', (code) => done(code)));
  const end = () => child.kill('SIGTERM');
  told.signal.addEventListener('abort', end, { once: true });
  let isOver = false;
  void ended.then(() => (isOver = true));
  const stop = async () => {
    told.signal.removeEventListener('abort', end);
    if (!isOver) end();
    await ended;
  };
  const url = `http://127.0.0.1:${port}`;
  const deadline = Date.now() + READY_MS;
  while (!isOver && Date.now() < deadline) {
    const answer = await fetch(`${url}/api/health`).catch(() => null);
    if (answer?.ok) return { url, dataDir, stop };
    await wait(LOOK_MS);
  }
  await stop();
  throw new Error('The product did not start; what it said stands above.');
}
