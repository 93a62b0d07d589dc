import type { Knex } from 'knex';
import type { Env } from '@/lib/env';
import { NOBODYS_HASH, hashPassword } from '@/lib/people/passwords';
import { syncSpecies } from '@/lib/species/sync';
import { generateDemo } from './generate';
import { readHandwritten } from './handwritten';
import { insertDemo } from './insert';

/** Of the demo that `npm start` gives. */
export const DEMO_SEED = 20_260_101;

/**
 * Brings the species table in step with the catalogue; then fills a database without people with the demo, in one
 * transaction. Where there is anybody, or DEMO is off, nobody is added. The same on the same day.
 */
export async function seedIfEmpty(
  db: Knex,
  env: Pick<Env, 'DEMO' | 'DEMO_PASSWORD'>,
  log: (line: string) => void,
  today: string = new Date().toISOString().slice(0, 10),
): Promise<void> {
  for (const warning of await syncSpecies(db)) log(warning);
  if (!env.DEMO || (await db('people').first('id'))) return;
  log('Filling the empty database with the demo ...');
  const began = performance.now();
  const demo = generateDemo({ seed: DEMO_SEED, today, handwritten: readHandwritten() });
  const moderator = demo.people.find(({ role }) => role === 'moderator');
  if (!moderator) throw new Error('the demo has no moderator');
  const demoHash = await hashPassword(env.DEMO_PASSWORD);
  await db.transaction((trx) =>
    insertDemo(trx, demo, {
      acceptedBy: moderator.id,
      // The ring's other growers have the hash of a text that nobody keeps.
      passwordHashOf: ({ signsIn }) => (signsIn ? demoHash : NOBODYS_HASH),
    }),
  );
  const seconds = ((performance.now() - began) / 1000).toFixed(1);
  log(
    `The demo is in: ${demo.people.length} people, ${demo.orchards.length} orchards, ${demo.entries.length} entries, all invented (${seconds} s).`,
  );
}
