import { v7 as newId } from 'uuid';
import type { Db } from '@/lib/database';
import { Conflict } from '@/lib/errors/errors';
import { clientAddress } from '@/lib/http/address';
import { hashPassword } from './passwords';
import type { SignUp } from './schema';
import { countTry, refuseWhenSpent, SIGN_UPS_FROM_ADDRESS } from './tries';

const DUPLICATE = 1062;

/** Said to whoever signs up with an address that has an account. */
export const TAKEN = 'There is an account for this e-mail address already. Sign in with it.';

/**
 * Makes a grower's account.
 * @throws Conflict when the address has one, also when two ask for it at once
 */
export async function signUp(
  db: Db,
  { email, name, password }: SignUp,
): Promise<{ id: string; name: string }> {
  const id = newId();
  const passwordHash = await hashPassword(password);
  try {
    await db('people').insert({ id, email, name, password_hash: passwordHash });
  } catch (error) {
    if ((error as { errno?: number }).errno === DUPLICATE) throw new Conflict(TAKEN);
    throw error;
  }
  return { id, name };
}

/**
 * Makes a grower's account for whoever sent this request. Valid ones are counted for their address, also those whose
 * e-mail has an account already, so that nobody can ask for many who has one.
 * @throws TooMany, Conflict
 */
export async function signUpFrom(
  db: Db,
  body: SignUp,
  headers: Headers,
): Promise<{ id: string; name: string }> {
  const address = clientAddress(headers);
  await refuseWhenSpent(db, SIGN_UPS_FROM_ADDRESS, address);
  await countTry(db, SIGN_UPS_FROM_ADDRESS, address);
  return signUp(db, body);
}
