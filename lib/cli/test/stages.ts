import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { installPackages, isInstalled } from '@/db/server/install';
import { startServer } from '@/db/server/server';
import { untilToldToStop, type Told } from '../start/signals';
import { playwrightCount, vitestCount, type Count } from './count';
import { runShown } from './processes';
import { startProduct } from './product';

const TSX = ['--import', 'tsx'];
const BIN = 'node_modules/.bin';
const STAGES = ['typecheck', 'lint', 'unit', 'reference', 'integration', 'browser'] as const;
type Stage = (typeof STAGES)[number];

// Apart from .next, which a start may be building just now.
const TYPE_CHECK = [
  ['next', 'typegen'],
  ['tsc', '--noEmit', '--project', 'tests/tsconfig.json'],
];
const LINT = [
  ['eslint', '.', '--max-warnings=0'],
  [
    'depcruise',
    '--config',
    '.dependency-cruiser.cjs',
    ...['app', 'components', 'lib', 'db', 'tests', 'proxy.ts'],
  ],
];

/** Runs all stages, or those named, each to its end; closes with one line that counts what passed and failed. */
export async function runStages(named: readonly string[]): Promise<void> {
  const unknown = named.find((name) => !STAGES.includes(name as Stage));
  if (unknown) throw new Error(`There is no stage ${unknown}; there are ${STAGES.join(', ')}.`);
  const wanted = STAGES.filter((stage) => named.length === 0 || named.includes(stage));
  const told = untilToldToStop();
  const scratch = mkdtempSync(join(tmpdir(), 'aftercut-test-'));
  const counts: { stage: Stage; count: Count }[] = [];
  try {
    for (const stage of wanted) {
      if (told.now()) break;
      console.log(`\n— ${stage}`);
      counts.push({ stage, count: await run(stage, scratch, told) });
    }
  } finally {
    rmSync(scratch, { recursive: true, force: true });
    told.done();
  }
  console.log('');
  for (const { stage, count } of counts)
    console.log(`${stage}: ${count.passed} passed, ${count.failed} failed`);
  const sum = (of: keyof Count) => counts.reduce((total, { count }) => total + count[of], 0);
  const failed = sum('failed') + (told.now() ? 1 : 0);
  if (failed > 0) process.exitCode = 1;
  console.log(`${sum('passed')} passed, ${failed} failed`);
}

async function run(stage: Stage, scratch: string, told: Told): Promise<Count> {
  try {
    if (stage === 'typecheck') return one(await commands(told, TYPE_CHECK, { NEXT_DIST_DIR: '.next-test' }));
    if (stage === 'lint') return one(await commands(told, LINT, {}));
    if (stage === 'integration') return await integration(scratch, told);
    if (stage === 'browser') return await browser(scratch, told);
    return await vitest(stage, scratch, told, {});
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
    return { passed: 0, failed: 1 };
  }
}

const one = (passed: boolean): Count => (passed ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 });

async function commands(
  told: Told,
  list: readonly string[][],
  env: Record<string, string>,
): Promise<boolean> {
  let passed = true;
  for (const [program = '', ...args] of list) {
    passed = (await runShown(join(BIN, program), args, env, told)) === 0 && passed;
  }
  return passed;
}

async function vitest(
  project: string,
  scratch: string,
  told: Told,
  env: Record<string, string>,
): Promise<Count> {
  const report = join(scratch, `${project}.json`);
  const args = [
    'run',
    '--project',
    project,
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
  ];
  const code = await runShown(join(BIN, 'vitest'), args, env, told);
  return vitestCount(report, code);
}

async function integration(scratch: string, told: Told): Promise<Count> {
  const server = await startServer({ dataDir: join(scratch, 'integration'), log: console.log });
  try {
    return await vitest('integration', scratch, told, { TEST_DATABASE_SERVER: server.urlOf('') });
  } finally {
    await server.stop();
  }
}

async function browser(scratch: string, told: Told): Promise<Count> {
  if (!isInstalled('chromium', 'chromium')) await installPackages(['chromium'], 'The browser', console.log);
  const product = await startProduct(join(scratch, 'product'), TSX, told);
  const report = join(scratch, 'browser.json');
  try {
    const env = { BASE_URL: product.url, BROWSER_REPORT: report, TEST_DATA_DIR: product.dataDir };
    const code = await runShown(join(BIN, 'playwright'), ['test'], env, told);
    return playwrightCount(report, code);
  } finally {
    await product.stop();
  }
}
