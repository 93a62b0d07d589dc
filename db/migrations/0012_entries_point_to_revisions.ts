import type { Knex } from 'knex';

const POINTERS = ['working_id', 'waiting_id', 'accepted_id'] as const;

/** An entry points to its revisions, which point back to it; so these keys come once both tables stand. */
export async function up(knex: Knex): Promise<void> {
  const keys = POINTERS.map(
    (pointer) =>
      `ADD CONSTRAINT entries_${pointer}_fk FOREIGN KEY IF NOT EXISTS (${pointer}) REFERENCES revisions (id)`,
  );
  await knex.raw(`ALTER TABLE entries ${keys.join(', ')}`);
}

export async function down(knex: Knex): Promise<void> {
  const keys = POINTERS.map((pointer) => `DROP FOREIGN KEY IF EXISTS entries_${pointer}_fk`);
  await knex.raw(`ALTER TABLE entries ${keys.join(', ')}`);
}
