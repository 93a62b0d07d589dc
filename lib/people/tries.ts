import { createHash } from 'node:crypto';
import type { Db } from '@/lib/database';
import { TooMany } from '@/lib/errors/errors';

const MINUTE_MS = 60_000;

/** At most so many tries of one subject in any stretch of this length. */
export type TryLimit = { name: string; most: number; windowMs: number };

export const WRONG_FOR_ACCOUNT: TryLimit = { name: 'wrong-account', most: 10, windowMs: 15 * MINUTE_MS };
export const WRONG_FROM_ADDRESS: TryLimit = { name: 'wrong-address', most: 50, windowMs: 15 * MINUTE_MS };
/** A whole growers' meeting behind one address can still sign up. Common practice, no source. */
export const SIGN_UPS_FROM_ADDRESS: TryLimit = { name: 'sign-up', most: 60, windowMs: 60 * MINUTE_MS };

/** What a limit counts for, without keeping the address or e-mail itself. */
function keyOf(limit: TryLimit, subject: string): string {
  return `${limit.name}:${createHash('sha256').update(subject).digest('hex')}`;
}

/** @throws TooMany when the limit is spent, with the seconds until one more is free. */
export async function refuseWhenSpent(
  db: Db,
  limit: TryLimit,
  subject: string,
  nowMs = Date.now(),
): Promise<void> {
  const rows = await db('tries')
    .where('subject', keyOf(limit, subject))
    .where('expires_at', '>', nowMs)
    .orderBy('expires_at', 'desc')
    .limit(limit.most)
    .select<{ expiresAt: number | string }[]>({ expiresAt: 'expires_at' });
  const firstToExpire = rows[limit.most - 1];
  if (firstToExpire) throw new TooMany((Number(firstToExpire.expiresAt) - nowMs) / 1000);
}

/** Counts one try, and lets go of some that no longer count. */
export async function countTry(db: Db, limit: TryLimit, subject: string, nowMs = Date.now()): Promise<void> {
  await db('tries').insert({ subject: keyOf(limit, subject), expires_at: nowMs + limit.windowMs });
  await db.raw('DELETE FROM tries WHERE expires_at <= ? ORDER BY id LIMIT 50', [nowMs]);
}

/** Forgets the tries of a subject. */
export async function forgetTries(db: Db, limit: TryLimit, subject: string): Promise<void> {
  await db('tries').where('subject', keyOf(limit, subject)).delete();
}
