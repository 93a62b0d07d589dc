import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS people (
      id UUID NOT NULL PRIMARY KEY,
      email VARCHAR(254) NOT NULL,
      name VARCHAR(80) NOT NULL CHECK (CHAR_LENGTH(name) > 0),
      password_hash VARCHAR(255) NOT NULL,
      role ENUM('grower', 'moderator', 'admin') NOT NULL DEFAULT 'grower',
      units ENUM('metric', 'imperial') NOT NULL DEFAULT 'metric',
      session_version INT UNSIGNED NOT NULL DEFAULT 1,
      email_confirmed_at DATETIME(3) NULL,
      disabled_at DATETIME(3) NULL,
      created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      UNIQUE KEY people_email (email)
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS people');
}
