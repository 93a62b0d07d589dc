import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS orchard_members (
      orchard_id UUID NOT NULL,
      person_id UUID NOT NULL,
      joined_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      PRIMARY KEY (orchard_id, person_id),
      KEY orchard_members_person (person_id),
      CONSTRAINT orchard_members_orchard_fk FOREIGN KEY (orchard_id) REFERENCES orchards (id) ON DELETE CASCADE,
      CONSTRAINT orchard_members_person_fk FOREIGN KEY (person_id) REFERENCES people (id)
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS orchard_members');
}
