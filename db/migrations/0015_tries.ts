import type { Knex } from 'knex';

/** One row a try, so that a limit holds over any quarter of an hour and not from one fixed start to the next. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS tries (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      subject VARCHAR(100) CHARACTER SET ascii NOT NULL,
      expires_at BIGINT UNSIGNED NOT NULL,
      KEY tries_subject (subject, expires_at),
      KEY tries_expired (expires_at)
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS tries');
}
