import { z } from 'zod';
import type { Db } from '@/lib/database';
import { NotFound } from '@/lib/errors/errors';
import { requireRevision } from '@/lib/http/condition';
import { NAMES, raiseVersions } from '@/lib/versions/versions';
import { ROLES, type Actor } from './actor';
import { PersonName } from './schema';

export const AccountBody = z.strictObject({
  name: PersonName,
  units: z.enum(['metric', 'imperial'], 'must be metric or imperial'),
});
export type AccountBody = z.output<typeof AccountBody>;

export const Account = z.object({
  id: z.string(),
  revision: z.number().int(),
  email: z.string(),
  name: z.string(),
  role: z.enum(ROLES),
  units: z.enum(['metric', 'imperial']),
});
export type Account = z.output<typeof Account>;

/** What a person is shown of their own account; with `lock`, held until the transaction ends. */
export async function accountOf(
  db: Db,
  actor: Actor,
  { lock = false }: { lock?: boolean } = {},
): Promise<Account> {
  const query = db('people')
    .where({ id: actor.id })
    .first<Account | undefined>('id', 'revision', 'email', 'name', 'role', 'units');
  const account = await (lock ? query.forUpdate() : query);
  if (!account) throw new NotFound();
  return account;
}

/**
 * Changes how a person is called and which units they read.
 * @param account as it stands, held
 * @throws Stale, ConditionRequired
 */
export async function saveAccount(
  db: Db,
  account: Account,
  body: AccountBody,
  ifMatch: number | null,
): Promise<Account> {
  const isSame = account.name === body.name && account.units === body.units;
  if (requireRevision(ifMatch, account.revision, isSame) === 'unchanged') return account;
  const revision = account.revision + 1;
  await db('people')
    .where({ id: account.id })
    .update({ ...body, revision });
  // Names stand on pages that are kept in memory.
  if (account.name !== body.name) await raiseVersions(db, [NAMES]);
  return { ...account, ...body, revision };
}
