import { AsyncLocalStorage } from 'node:async_hooks';

/** The cookies of the request that is being handled, as `next/headers` would give them to it. */
export type Jar = { get(name: string): { name: string; value: string } | undefined };

const key = Symbol.for('aftercut.tests.cookie-jar');
const shared = globalThis as typeof globalThis & { [key]?: AsyncLocalStorage<Jar> };

export const cookieJar = (shared[key] ??= new AsyncLocalStorage<Jar>());
