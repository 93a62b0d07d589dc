import type { Knex } from 'knex';
import { connect } from './db/connection';
import { migrationConfig } from './db/migrate';

/**
 * For knex's own command line: `DATABASE_URL=mysql://… NODE_OPTIONS='--import tsx' npx knex migrate:status`.
 * The running embedded server's address stands in `.data/database-url`.
 */
const url = process.env['DATABASE_URL'];
if (!url)
  throw new Error('Set DATABASE_URL, for example to the content of .data/database-url while the app runs.');
const { client } = connect(url);
const { connection } = client.config as Knex.Config;

const config: Knex.Config = { client: 'mysql2', connection, migrations: migrationConfig };

export default config;
