import { v7 as newId } from 'uuid';
import type { Db } from '@/lib/database';
import { Conflict } from '@/lib/errors/errors';
import { hashPassword } from './passwords';
import type { SignUp } from './schema';

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
