import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS entries (
      id UUID NOT NULL PRIMARY KEY,
      owner_id UUID NOT NULL,
      status ENUM('draft', 'waiting', 'returned', 'accepted', 'withdrawn', 'merged') NOT NULL DEFAULT 'draft',
      revision INT UNSIGNED NOT NULL DEFAULT 1,
      working_id INT UNSIGNED NULL,
      waiting_id INT UNSIGNED NULL,
      accepted_id INT UNSIGNED NULL,
      waiting_since DATETIME(3) NULL,
      accepted_at DATETIME(3) NULL,
      returned_note VARCHAR(2000) NULL,
      created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      updated_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      KEY entries_owner (owner_id, updated_at),
      KEY entries_status (status, created_at, id),
      KEY entries_queue (waiting_since),
      CONSTRAINT entries_accepted CHECK (status <> 'accepted' OR accepted_id IS NOT NULL),
      CONSTRAINT entries_waiting CHECK (status <> 'waiting' OR waiting_id IS NOT NULL),
      CONSTRAINT entries_idle CHECK (status NOT IN ('draft', 'returned', 'withdrawn', 'merged') OR waiting_id IS NULL),
      CONSTRAINT entries_owner_fk FOREIGN KEY (owner_id) REFERENCES people (id)
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS entries');
}
