import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { lastLines, run, saying } from '@/db/server/run';

export const NEXT = 'node_modules/next/dist/bin/next';
const SOURCES = [
  'app',
  'components',
  'content',
  'lib',
  'db',
  'public',
  'proxy.ts',
  'instrumentation.ts',
  'next.config.ts',
  'tailwind.config.ts',
  'postcss.config.mjs',
  'tsconfig.json',
  'package-lock.json',
];

/** Builds the pages when a source changed since the last build into this folder. */
export async function buildIfChanged(distDir: string, log: (line: string) => void): Promise<void> {
  const stamp = join(distDir, 'aftercut-sources');
  const now = hashOf(SOURCES);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === now) return;
  log('Building the pages: about a minute, and only when the sources changed.');
  const built = await saying(
    log,
    'Waiting for the build',
    run('env', [
      'NODE_ENV=production',
      `NEXT_DIST_DIR=${distDir}`,
      'NEXT_TELEMETRY_DISABLED=1',
      process.execPath,
      NEXT,
      'build',
    ]),
  );
  if (built.code !== 0) throw new Error(`The build failed:\n${lastLines(built.output, 40)}`);
  writeFileSync(stamp, now);
}

function hashOf(paths: readonly string[]): string {
  const hash = createHash('sha256');
  for (const path of paths) if (existsSync(path)) addTo(hash, path);
  return hash.digest('hex');
}

function addTo(hash: ReturnType<typeof createHash>, path: string): void {
  if (statSync(path).isDirectory()) {
    for (const name of readdirSync(path).sort()) addTo(hash, join(path, name));
  } else {
    hash.update(path).update('\0').update(readFileSync(path)).update('\0');
  }
}
