import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS audit_log (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      actor_id UUID NULL,
      request_id VARCHAR(64) NOT NULL,
      action VARCHAR(60) NOT NULL,
      subject_kind VARCHAR(20) NOT NULL,
      subject_id VARCHAR(80) NOT NULL,
      detail JSON NULL,
      KEY audit_log_subject (subject_kind, subject_id, id)
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS audit_log');
}
