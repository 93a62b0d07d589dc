import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS cuts (
      revision_id INT UNSIGNED NOT NULL PRIMARY KEY,
      date DATE NULL,
      date_approximate ENUM('month', 'season') NULL,
      kind ENUM('heading', 'reduction', 'thinning', 'pollarding', 'coppicing', 'none') NULL,
      severity DECIMAL(7, 6) NULL CHECK (severity BETWEEN 0 AND 1),
      severity_class ENUM('uncut', 'light', 'moderate', 'heavy', 'severe') NULL,
      severity_estimated BOOLEAN NOT NULL DEFAULT FALSE,
      tip ENUM('kept', 'removed') NULL,
      branches SMALLINT UNSIGNED NULL CHECK (branches BETWEEN 1 AND 500),
      intensity DECIMAL(7, 6) NULL CHECK (intensity BETWEEN 0 AND 1),
      removed_length_m DECIMAL(9, 6) NULL CHECK (removed_length_m BETWEEN 0 AND 100),
      retained_length_m DECIMAL(9, 6) NULL CHECK (retained_length_m BETWEEN 0 AND 100),
      diameter_m DECIMAL(8, 6) NULL CHECK (diameter_m BETWEEN 0 AND 5),
      stage ENUM('dormant', 'bud-break', 'growing', 'flowering', 'fruiting', 'after-harvest') NULL,
      aim ENUM('size', 'width', 'fruit', 'shade', 'shape', 'health', 'rejuvenation', 'other') NULL,
      CONSTRAINT cuts_class CHECK ((severity IS NULL) = (severity_class IS NULL)),
      CONSTRAINT cuts_uncut CHECK (
        severity IS NULL OR kind IS NULL OR tip IS NULL
        OR (kind = 'none' AND tip = 'kept' AND severity = 0)
        OR (kind <> 'none' AND severity > 0)
      ),
      CONSTRAINT cuts_revision_fk FOREIGN KEY (revision_id) REFERENCES revisions (id) ON DELETE CASCADE
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS cuts');
}
