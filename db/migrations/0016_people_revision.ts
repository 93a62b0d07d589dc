import type { Knex } from 'knex';

/** What a person may change of their account has a revision, like everything that two devices may change at once. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(
    'ALTER TABLE people ADD COLUMN IF NOT EXISTS revision INT UNSIGNED NOT NULL DEFAULT 1 AFTER session_version',
  );
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE people DROP COLUMN IF EXISTS revision');
}
