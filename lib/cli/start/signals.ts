const LOOK_MS = 250;

export type Told = {
  /** Resolves with why, once it is time to stop. */
  promise: Promise<string>;
  /** Aborted at that moment. */
  signal: AbortSignal;
  now: () => boolean;
  /** Begins the work, unless told to stop already, and gives its result; rejects at once when told to. */
  orStop: <T>(work: () => Promise<T>) => Promise<T>;
  done: () => void;
};

/**
 * Ctrl-C, SIGTERM, SIGHUP, or the death of whoever started this: npm does not always pass signals on, and a killed npm
 * shows only as a new parent.
 */
export function untilToldToStop(): Told {
  const parent = process.ppid;
  const control = new AbortController();
  let tell: (why: string) => void = () => undefined;
  const promise = new Promise<string>((resolve) => {
    tell = (why) => {
      control.abort();
      resolve(why);
    };
  });
  const names = ['SIGINT', 'SIGTERM', 'SIGHUP'] as const;
  for (const name of names) process.on(name, () => tell(name));
  const watch = setInterval(() => {
    if (process.ppid !== parent) tell('the parent process is gone');
  }, LOOK_MS);
  const stopped = promise.then((why) => Promise.reject(new Error(`told to stop: ${why}`)));
  stopped.catch(() => undefined);
  return {
    promise,
    signal: control.signal,
    now: () => control.signal.aborted,
    orStop: (work) => (control.signal.aborted ? stopped : Promise.race([work(), stopped])),
    done: () => clearInterval(watch),
  };
}
