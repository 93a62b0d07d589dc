import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';

/**
 * Makes this process the one that runs on a data folder; gives what lets go of it again. A lock whose process is gone is
 * taken over.
 * @throws Error when another start runs there
 */
export function holdDataDir(dataDir: string): () => void {
  mkdirSync(dataDir, { recursive: true });
  const file = join(resolve(dataDir), 'start.pid');
  if (existsSync(file)) {
    const pid = Number(readFileSync(file, 'utf8'));
    if (isStart(pid)) {
      throw new Error(
        `Aftercut already runs on ${dataDir} (process ${pid}). Stop that one, or set another DATA_DIR and PORT.`,
      );
    }
  }
  writeFileSync(file, String(process.pid));
  return () => rmSync(file, { force: true });
}

function isStart(pid: number): boolean {
  try {
    return pid !== process.pid && readFileSync(`/proc/${pid}/cmdline`, 'utf8').includes('lib/cli/start.ts');
  } catch {
    return false;
  }
}
