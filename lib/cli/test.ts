import { runStages } from './test/stages';

runStages(process.argv.slice(2)).catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  console.log('0 passed, 1 failed');
  process.exitCode = 1;
});
