import knexFactory, { type Knex } from 'knex';

export type ConnectOptions = {
  poolMax?: number;
  /** The server ends a statement that takes longer. */
  statementTimeoutSeconds?: number;
};

type RawConnection = { query(sql: string, done: (error: Error | null) => void): void };

const AS_TEXT: object = { dateStrings: ['DATE'], jsonStrings: true };

/**
 * A pool on MariaDB. Dates stay the text they are, decimals become numbers, times are UTC. READ COMMITTED, because every
 * change locks the one row it is about and gap locks would only make strangers wait for each other.
 */
export function connect(url: string, options: ConnectOptions = {}): Knex {
  return knexFactory(connectionConfig(url, options));
}

/** What `connect` hands to knex; knex's own command line is given the same. */
export function connectionConfig(
  url: string,
  { poolMax = 5, statementTimeoutSeconds = 10 }: ConnectOptions = {},
): Knex.Config {
  const { hostname, port, username, password, pathname } = new URL(url);
  return {
    client: 'mysql2',
    connection: {
      // Knex's own type lacks what mysql2 takes here: a list of types, and JSON as the text it is.
      ...AS_TEXT,
      host: hostname,
      port: Number(port || 3306),
      user: decodeURIComponent(username),
      password: decodeURIComponent(password),
      database: decodeURIComponent(pathname.slice(1)),
      timezone: 'Z',
      decimalNumbers: true,
      supportBigNumbers: true,
      connectTimeout: 5000,
    },
    acquireConnectionTimeout: 8000,
    pool: {
      min: 0,
      max: poolMax,
      afterCreate(connection: RawConnection, done: (error: Error | null, connection: RawConnection) => void) {
        connection.query(
          `SET SESSION sql_mode = 'STRICT_ALL_TABLES,NO_ZERO_DATE,NO_ZERO_IN_DATE,ERROR_FOR_DIVISION_BY_ZERO',
           time_zone = '+00:00', tx_isolation = 'READ-COMMITTED',
           max_statement_time = ${Number(statementTimeoutSeconds)}, innodb_lock_wait_timeout = 8`,
          (error) => done(error, connection),
        );
      },
    },
  };
}
