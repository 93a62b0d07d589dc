const LOOK_MS = 250;

export type Told = {
  /** Resolves with why, once it is time to stop. */
  promise: Promise<string>;
  now: () => boolean;
  done: () => void;
};

/**
 * Ctrl-C, SIGTERM, SIGHUP, or the death of whoever started this: npm does not pass signals on, so a killed npm shows
 * only as a new parent.
 */
export function untilToldToStop(): Told {
  const parent = process.ppid;
  let told = false;
  let tell: (why: string) => void = () => undefined;
  const promise = new Promise<string>((resolve) => {
    tell = (why) => {
      told = true;
      resolve(why);
    };
  });
  const names = ['SIGINT', 'SIGTERM', 'SIGHUP'] as const;
  for (const name of names) process.on(name, () => tell(name));
  const watch = setInterval(() => {
    if (process.ppid !== parent) tell('the parent process is gone');
  }, LOOK_MS);
  return { promise, now: () => told, done: () => clearInterval(watch) };
}
