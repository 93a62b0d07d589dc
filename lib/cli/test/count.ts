import { existsSync, readFileSync } from 'node:fs';
import { z } from 'zod';

export type Count = { passed: number; failed: number };

const VitestReport = z.object({
  numPassedTests: z.number(),
  numFailedTests: z.number(),
  numFailedTestSuites: z.number(),
  success: z.boolean(),
});
const PlaywrightReport = z.object({
  stats: z.object({ expected: z.number(), unexpected: z.number(), flaky: z.number() }),
  errors: z.array(z.unknown()),
});

/** A run that ended badly without a failed test (a file that does not load, no test at all) counts as one failure. */
export function vitestCount(path: string, code: number | null): Count {
  const report = existsSync(path) ? VitestReport.safeParse(JSON.parse(readFileSync(path, 'utf8'))) : null;
  if (!report?.success) return { passed: 0, failed: 1 };
  const { numPassedTests: passed, numFailedTests: failed } = report.data;
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
