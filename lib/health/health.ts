import { z } from 'zod';
import { database } from '@/lib/database';
import pkg from '@/package.json' with { type: 'json' };

/** `off`: this part of the product has not been set up here. */
const State = z.enum(['ok', 'away', 'off']);
export const HealthView = z.object({
  status: z.enum(['ok', 'away']),
  checks: z.object({ db: State, search: State, mail: State, photos: State }),
  version: z.string(),
});
export type HealthView = z.output<typeof HealthView>;

/** Asks each part whether it answers. Search, mail and photos come with the features that need them. */
export async function health(): Promise<HealthView> {
  const db = await database()
    .raw('SELECT 1')
    .timeout(3000)
    .then(() => 'ok' as const)
    .catch(() => 'away' as const);
  return { status: db, checks: { db, search: 'off', mail: 'off', photos: 'off' }, version: pkg.version };
}
