import { hash, verify } from '@node-rs/argon2';

/**
 * Argon2id (the package's default kind) with 19 MiB, two passes, one lane: the least that the OWASP Password Storage
 * Cheat Sheet recommends, and what two small cores can bear under a rush.
 */
export const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** Of a random text that nobody keeps, at the same cost: what an unknown address is checked against. */
export const NOBODYS_HASH =
  '$argon2id$v=19$m=19456,t=2,p=1$YoGqBCTIg4sU2o6YGNczUg$Ad1TeBWA2yk2VUQA6YBoqJmnxsqRQoZPKa3149DFZmM';

/** One password typed on two keyboards can differ in how its accents are written (NIST SP 800-63B, 5.1.1.2: NFKC). */
const written = (password: string): string => password.normalize('NFKC');

export async function hashPassword(password: string): Promise<string> {
  return hash(written(password), COST);
}

/**
 * Whether this is the password of `passwordHash`. Without a hash, of an unknown address, it takes the same time and says
 * no.
 */
export async function isPassword(passwordHash: string | null, password: string): Promise<boolean> {
  const matches = await verify(passwordHash ?? NOBODYS_HASH, written(password));
  return matches && passwordHash !== null;
}
