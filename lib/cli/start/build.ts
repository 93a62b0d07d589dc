import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { basename, join } from 'node:path';
import { bound, lastLines, run, saying } from '@/db/server/run';
import { waitToHold } from './lock';

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
  'package.json',
  'package-lock.json',
];
/** Part of the sources, but not of the pages. */
const NOT_BUILT = new Set(['lib/cli']);

/** Builds the pages when a source changed since the last build into this folder; two starts build one after the other. */
export async function buildIfChanged(
  distDir: string,
  log: (line: string) => void,
  stop: AbortSignal,
): Promise<void> {
  const stamp = join(distDir, 'aftercut-sources');
  const isBuilt = () => existsSync(stamp) && readFileSync(stamp, 'utf8') === hashOf(SOURCES);
  if (isBuilt()) return;
  // Not in the folder itself, which a build clears.
  const lock = join('node_modules', `.building-${basename(distDir)}`);
  const letGo = await waitToHold(lock, 'Waiting for the build of another start', log, stop);
  try {
    if (!isBuilt()) await build(distDir, stamp, log, stop);
  } finally {
    letGo();
  }
}

async function build(
  distDir: string,
  stamp: string,
  log: (line: string) => void,
  stop: AbortSignal,
): Promise<void> {
  const sources = hashOf(SOURCES);
  log('Building the pages: about a minute, and only when the sources changed.');
  mkdirSync(distDir, { recursive: true });
  rmSync(stamp, { force: true });
  const env = { NODE_ENV: 'production', NEXT_DIST_DIR: distDir, NEXT_TELEMETRY_DISABLED: '1' };
  const built = await saying(
    log,
    'Waiting for the build',
    run(...bound(process.execPath, [NEXT, 'build']), { env, stop }),
  );
  if (built.code !== 0) throw new Error(`The build failed:\n${lastLines(built.output, 40)}`);
  writeFileSync(stamp, sources);
}

function hashOf(paths: readonly string[]): string {
  const hash = createHash('sha256');
  for (const path of paths) if (existsSync(path)) addTo(hash, path);
  return hash.digest('hex');
}

function addTo(hash: ReturnType<typeof createHash>, path: string): void {
  if (NOT_BUILT.has(path)) return;
  if (statSync(path).isDirectory()) {
    for (const name of readdirSync(path).sort()) addTo(hash, join(path, name));
  } else {
    hash.update(path).update('\0').update(readFileSync(path)).update('\0');
  }
}
