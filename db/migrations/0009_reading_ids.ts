import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS reading_ids (
      id UUID NOT NULL PRIMARY KEY,
      entry_id UUID NOT NULL,
      created_by UUID NOT NULL,
      created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      KEY reading_ids_entry (entry_id),
      CONSTRAINT reading_ids_entry_fk FOREIGN KEY (entry_id) REFERENCES entries (id) ON DELETE CASCADE,
      CONSTRAINT reading_ids_person_fk FOREIGN KEY (created_by) REFERENCES people (id)
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS reading_ids');
}
