import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { TestProject } from 'vitest/node';
import { startServer } from '@/db/server/server';

declare module 'vitest' {
  export interface ProvidedContext {
    /** mysql://… of any database of the tests' server; the name goes at its end. */
    databaseServer: string;
  }
}

/** One real MariaDB for all integration tests: the test command's, or one of its own in a throw-away folder. */
export default async function setup(project: TestProject): Promise<(() => Promise<void>) | undefined> {
  const given = process.env['TEST_DATABASE_SERVER'];
  if (given) {
    project.provide('databaseServer', given);
    return undefined;
  }
  const dataDir = mkdtempSync(join(tmpdir(), 'aftercut-tests-'));
  const server = await startServer({ dataDir, log: console.log });
  project.provide('databaseServer', server.urlOf(''));
  return async () => {
    await server.stop();
    rmSync(dataDir, { recursive: true, force: true });
  };
}
