import { existsSync, readFileSync } from 'node:fs';
import { z } from 'zod';

export type Count = { passed: number; failed: number };

const VitestReport = z.object({
  numPassedTests: z.number(),
  numFailedTests: z.number(),
  testResults: z.array(z.object({ status: z.string(), assertionResults: z.array(z.unknown()) })),
});
const PlaywrightReport = z.object({
  stats: z.object({ expected: z.number(), unexpected: z.number(), flaky: z.number() }),
  errors: z.array(z.unknown()),
});

/** A file that does not load is one failure, and so is a run that ended badly in another way, or without a test. */
export function vitestCount(path: string, code: number | null): Count {
  const report = existsSync(path) ? VitestReport.safeParse(JSON.parse(readFileSync(path, 'utf8'))) : null;
  if (!report?.success) return { passed: 0, failed: 1 };
  const { numPassedTests: passed, numFailedTests, testResults } = report.data;
  const unloaded = testResults.filter(
    ({ status, assertionResults }) => status === 'failed' && assertionResults.length === 0,
  );
  const failed = numFailedTests + unloaded.length;
  return { passed, failed: failed > 0 || (code === 0 && passed > 0) ? failed : 1 };
}

/** A test that passed only when tried again counts as failed. */
export function playwrightCount(path: string, code: number | null): Count {
  const report = existsSync(path) ? PlaywrightReport.safeParse(JSON.parse(readFileSync(path, 'utf8'))) : null;
  if (!report?.success) return { passed: 0, failed: 1 };
  const { expected, unexpected, flaky } = report.data.stats;
  const failed = unexpected + flaky;
  return { passed: expected, failed: failed > 0 || (code === 0 && expected > 0) ? failed : 1 };
}
