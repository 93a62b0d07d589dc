import { linkSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { saying } from '@/db/server/run';

const LOOK_MS = 250;

/**
 * Makes this process the one that runs on a data folder; gives what lets go of it again. A lock whose process is gone is
 * taken over.
 * @throws Error when another start runs there
 */
export function holdDataDir(dataDir: string): () => void {
  mkdirSync(dataDir, { recursive: true });
  const held = hold(join(dataDir, 'start.pid'));
  if (typeof held !== 'number') return held;
  throw new Error(
    `Aftercut already runs on ${dataDir} (process ${held}). Stop that one, or set another DATA_DIR and PORT.`,
  );
}

/** Waits until no other start holds this file, then holds it; gives what lets go of it again. */
export async function waitToHold(
  file: string,
  what: string,
  log: (line: string) => void,
  stop: AbortSignal,
): Promise<() => void> {
  const first = hold(file);
  if (typeof first !== 'number') return first;
  const later = async () => {
    for (;;) {
      await wait(LOOK_MS, undefined, { signal: stop });
      const held = hold(file);
      if (typeof held !== 'number') return held;
    }
  };
  return saying(log, what, later());
}

/** Gives what lets go of the file, or the process that holds it. A link appears whole: with its content or not at all. */
function hold(file: string): (() => void) | number {
  const mine = `${file}.${process.pid}`;
  writeFileSync(mine, String(process.pid));
  try {
    for (;;) {
      try {
        linkSync(mine, file);
        return () => rmSync(file, { force: true });
      } catch (error) {
        if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
      }
      const holder = holderOf(file);
      if (holder !== null) return holder;
      clear(file, `${mine}.stale`);
    }
  } finally {
    rmSync(mine, { force: true });
  }
}

/** Two may find the same stale file; what the slower one takes away could be the quicker one's, and is put back. */
function clear(file: string, aside: string): void {
  try {
    renameSync(file, aside);
    if (holderOf(aside) !== null) linkSync(aside, file);
  } catch (error) {
    if (!['ENOENT', 'EEXIST'].includes((error as NodeJS.ErrnoException).code ?? '')) throw error;
  } finally {
    rmSync(aside, { force: true });
  }
}

function holderOf(file: string): number | null {
  try {
    const pid = Number(readFileSync(file, 'utf8'));
    const isStart = readFileSync(`/proc/${pid}/cmdline`, 'utf8').includes('lib/cli/start.ts');
    return isStart && pid !== process.pid ? pid : null;
  } catch {
    return null;
  }
}
