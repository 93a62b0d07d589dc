import { existsSync, readFileSync } from 'node:fs';
import { setTimeout as wait } from 'node:timers/promises';
import { findProgram } from './install';
import { lastLines, run, saying } from './run';

const READY_MS = 120_000;
const LOOK_MS = 50;

type Starting = {
  socket: string;
  ended: Promise<unknown>;
  errorLog: string;
  log: (line: string) => void;
};

/** Waits until the server answers; repairing what a hard kill left takes it longer. */
export function waitUntilReady(starting: Starting): Promise<void> {
  return saying(starting.log, 'Waiting for the database server', ready(starting));
}

async function ready({ socket, ended, errorLog }: Starting): Promise<void> {
  const deadline = Date.now() + READY_MS;
  let isOver = false;
  void ended.then(() => (isOver = true));
  for (;;) {
    if (existsSync(socket) && (await statements(socket, 'SELECT 1')).code === 0) return;
    if (isOver || Date.now() > deadline) {
      const said = existsSync(errorLog) ? lastLines(readFileSync(errorLog, 'utf8'), 8) : '';
      throw new Error(`The database server did not start. Its log (${errorLog}) ends:\n${said}`);
    }
    await wait(LOOK_MS);
  }
}

function statements(socket: string, sql: string) {
  const client = findProgram('mariadb') ?? 'mariadb';
  return run(client, ['--no-defaults', `--socket=${socket}`, '--user=root', '--batch'], {
    input: sql,
  });
}

/** Makes the app's database and its one user, who sees databases of this app alone; root has no way in but the socket. */
export async function grantAccess({
  socket,
  database,
  password,
}: {
  socket: string;
  database: string;
  password: string;
}): Promise<void> {
  const users = ["'app'@'127.0.0.1'", "'app'@'localhost'"];
  const sql = [
    `CREATE DATABASE IF NOT EXISTS \`${database}\``,
    ...users.flatMap((user) => [
      `CREATE USER IF NOT EXISTS ${user}`,
      `ALTER USER ${user} IDENTIFIED BY '${password}'`,
      `GRANT ALL ON \`aftercut%\`.* TO ${user}`,
    ]),
    "DROP USER IF EXISTS 'root'@'127.0.0.1', 'root'@'::1'",
    "DELETE FROM mysql.global_priv WHERE User = 'root' AND Host <> 'localhost'",
    'FLUSH PRIVILEGES',
  ].join(';\n');
  const outcome = await statements(socket, sql);
  if (outcome.code !== 0)
    throw new Error(`The database server refused its set-up:\n${lastLines(outcome.output, 5)}`);
}
