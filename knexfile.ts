import { existsSync, readFileSync } from 'node:fs';
import type { Knex } from 'knex';
import { connectionConfig } from './db/connection';
import { migrationConfig } from './db/migrate';

/**
 * For knex's own command line: `NODE_OPTIONS='--import tsx' npx knex migrate:status`. It works on DATABASE_URL, or on
 * the embedded server while the app runs, whose address then stands in DATA_DIR/database-url.
 */
const running = `${process.env['DATA_DIR'] || '.data'}/database-url`;
const url = process.env['DATABASE_URL'] || (existsSync(running) ? readFileSync(running, 'utf8').trim() : '');
if (!url) throw new Error('Set DATABASE_URL, or run the app: then knex finds the embedded server by itself.');

const MIGRATION_SECONDS = 600;

const config: Knex.Config = {
  ...connectionConfig(url, { statementTimeoutSeconds: MIGRATION_SECONDS }),
  migrations: migrationConfig,
};

export default config;
