import { spawn, type ChildProcess } from 'node:child_process';
import { existsSync } from 'node:fs';

export const isRoot = (): boolean => process.getuid?.() === 0;

export type Outcome = { code: number | null; output: string };

type RunOptions = {
  /** Written to its standard input. */
  input?: string;
  env?: Record<string, string>;
  /** Ends the command and all that it started. */
  stop?: AbortSignal;
};

const SETPRIV = '/usr/bin/setpriv';

/**
 * The command that runs a program which ends with its parent, however that one ends: the kernel sends it a SIGTERM.
 * Without util-linux it is the program itself.
 */
export function bound(program: string, args: readonly string[]): [string, string[]] {
  return existsSync(SETPRIV) ? [SETPRIV, ['--pdeathsig', 'TERM', program, ...args]] : [program, [...args]];
}

/** Runs a command to its end, in a process group of its own; gives its code and all that it said. */
export function run(
  command: string,
  args: readonly string[],
  { input, env = {}, stop }: RunOptions = {},
): Promise<Outcome> {
  return new Promise((done) => {
    const child = spawn(command, args, {
      stdio: [input === undefined ? 'ignore' : 'pipe', 'pipe', 'pipe'],
      env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C.UTF-8', ...env },
      detached: true,
    });
    let output = '';
    child.stdout?.on('data', (piece: Buffer) => (output += piece.toString()));
    child.stderr?.on('data', (piece: Buffer) => (output += piece.toString()));
    child.once('error', (error) => done({ code: 127, output: error.message }));
    child.once('close', (code) => done({ code, output }));
    if (input !== undefined) child.stdin?.end(input);
    const end = () => killGroup(child);
    stop?.addEventListener('abort', end, { once: true });
    child.once('close', () => stop?.removeEventListener('abort', end));
    if (stop?.aborted) end();
  });
}

function killGroup(child: ChildProcess): void {
  if (child.pid === undefined || child.exitCode !== null || child.signalCode !== null) return;
  process.kill(-child.pid, 'SIGTERM');
}

/** Asks a child to end, and ends it after `patienceMs`. */
export async function endChild(
  child: ChildProcess,
  ended: Promise<unknown>,
  patienceMs: number,
): Promise<void> {
  if (child.pid === undefined || child.exitCode !== null || child.signalCode !== null) return;
  child.kill('SIGTERM');
  const giveUp = setTimeout(() => child.kill('SIGKILL'), patienceMs);
  await ended;
  clearTimeout(giveUp);
}

export function lastLines(text: string, count: number): string {
  return text.trim().split('\n').slice(-count).join('\n');
}

/** Says what is waited for once a second has passed, then every ten. */
export async function saying<T>(log: (line: string) => void, what: string, work: Promise<T>): Promise<T> {
  const started = Date.now();
  const say = () => log(`${what} (${Math.round((Date.now() - started) / 1000)} s)`);
  let every: NodeJS.Timeout | undefined;
  const first = setTimeout(() => {
    say();
    every = setInterval(say, 10_000);
  }, 1000);
  try {
    return await work;
  } finally {
    clearTimeout(first);
    clearInterval(every);
  }
}
