const shared = globalThis as typeof globalThis & { aftercutTurns?: Map<string, Promise<unknown>> };
const last = (shared.aftercutTurns ??= new Map<string, Promise<unknown>>());

/** Runs what is asked under one key one after another, in the order it was asked for. */
export async function inTurn<Result>(key: string, work: () => Promise<Result>): Promise<Result> {
  const before = last.get(key) ?? Promise.resolve();
  const mine = before.then(work, work);
  last.set(key, mine);
  try {
    return await mine;
  } finally {
    if (last.get(key) === mine) last.delete(key);
  }
}
