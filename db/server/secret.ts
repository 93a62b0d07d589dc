import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs';

/** A secret made once and kept where only this user reads it. */
export function keptSecret(path: string): string {
  const kept = existsSync(path) ? readFileSync(path, 'utf8').trim() : '';
  if (kept) return kept;
  const secret = randomBytes(32).toString('hex');
  writePrivately(path, secret);
  return secret;
}

/** Writes a file that only this user reads, whole or not at all. */
export function writePrivately(path: string, text: string): void {
  const unfinished = `${path}.${process.pid}`;
  writeFileSync(unfinished, text, { mode: 0o600 });
  renameSync(unfinished, path);
}
