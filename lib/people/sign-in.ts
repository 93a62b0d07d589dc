import type { Db } from '@/lib/database';
import { Refusal } from '@/lib/errors/errors';
import { isPassword } from './passwords';
import { writtenEmail } from './schema';
import { countTry, forgetTries, refuseWhenSpent, WRONG_FOR_ACCOUNT, WRONG_FROM_ADDRESS } from './tries';
import { inTurn } from './turns';

export type SignedIn = { id: string; name: string; sessionVersion: number };

/** For a wrong password, an unknown address and a disabled account alike. */
export class WrongCredentials extends Refusal {
  readonly status = 401;
  readonly title = 'Not signed in';
  constructor() {
    super('This e-mail address and this password do not go together.');
  }
}

/**
 * Whose password this is, or null: for a wrong password, an unknown address and a disabled account alike, in the same
 * time. Wrong ones are counted, for the account as seen from this address and for the address; a right one forgets the
 * account's. Tries from one address take turns, so that many sent at once are counted like as many sent in a row.
 * @param address where it is asked from (`clientAddress`)
 * @throws TooMany once either count is spent; then nothing is checked
 */
export async function checkPassword(
  db: Db,
  email: string,
  password: string,
  address: string,
): Promise<SignedIn | null> {
  const account = `${writtenEmail(email)} from ${address}`;
  return inTurn(`sign-in ${address}`, async () => {
    await refuseWhenSpent(db, WRONG_FOR_ACCOUNT, account);
    await refuseWhenSpent(db, WRONG_FROM_ADDRESS, address);
    const row = await db('people').where('email', writtenEmail(email)).first<
      | {
          id: string;
          name: string;
          passwordHash: string;
          sessionVersion: number;
          disabledAt: Date | null;
        }
      | undefined
    >({
      id: 'id',
      name: 'name',
      passwordHash: 'password_hash',
      sessionVersion: 'session_version',
      disabledAt: 'disabled_at',
    });
    const isRight = await isPassword(row?.passwordHash ?? null, password);
    if (!row || !isRight || row.disabledAt !== null) {
      await countTry(db, WRONG_FOR_ACCOUNT, account);
      await countTry(db, WRONG_FROM_ADDRESS, address);
      return null;
    }
    await forgetTries(db, WRONG_FOR_ACCOUNT, account);
    return { id: row.id, name: row.name, sessionVersion: row.sessionVersion };
  });
}
