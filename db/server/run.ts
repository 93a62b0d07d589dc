import { spawn } from 'node:child_process';

export const isRoot = (): boolean => process.getuid?.() === 0;

export type Outcome = { code: number | null; output: string };

/** Runs a command to its end; gives its code and all that it said. */
export function run(command: string, args: readonly string[], input?: string): Promise<Outcome> {
  return new Promise((done) => {
    const child = spawn(command, args, {
      stdio: [input === undefined ? 'ignore' : 'pipe', 'pipe', 'pipe'],
      env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
    });
    let output = '';
    child.stdout?.on('data', (piece: Buffer) => (output += piece.toString()));
    child.stderr?.on('data', (piece: Buffer) => (output += piece.toString()));
    child.once('error', (error) => done({ code: 127, output: error.message }));
    child.once('close', (code) => done({ code, output }));
    if (input !== undefined) child.stdin?.end(input);
  });
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
