import { spawn } from 'node:child_process';
import { freePort } from '@/db/server/free-port';
import type { Told } from '../start/signals';

const READY_MS = 400_000;

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
  const env: NodeJS.ProcessEnv = {
    ...process.env,
    PORT: String(port),
    DATA_DIR: dataDir,
    NEXT_DIST_DIR: '.next-test',
    NODE_ENV: 'production',
    DEMO: '1',
    MEASURE: '1',
  };
  for (const name of ['APP_URL', 'DATABASE_URL', 'AUTH_SECRET', 'DEMO_PASSWORD', 'TRUST_PROXY'])
    delete env[name];
  const child = spawn(process.execPath, [...nodeArgs, 'lib/cli/start.ts'], {
    stdio: ['ignore', 'inherit', 'inherit'],
    env,
  });
  const ended = new Promise<number | null>((done) => child.once('exit', (code) => done(code)));
  void told.promise.then(() => child.kill('SIGTERM'));
  const stop = async () => {
    child.kill('SIGTERM');
    await ended;
  };
  const url = `http://127.0.0.1:${port}`;
  let over = false;
  void ended.then(() => (over = true));
  const deadline = Date.now() + READY_MS;
  while (!over && Date.now() < deadline) {
    const answer = await fetch(`${url}/api/health`).catch(() => null);
    if (answer?.ok) return { url, dataDir, stop };
    await new Promise((done) => setTimeout(done, 200));
  }
  await stop();
  throw new Error('The product did not start; what it said stands above.');
}
