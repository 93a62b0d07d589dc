import { start } from './start/start';
import { plainReason } from './start/say';

start().catch((error: unknown) => {
  console.error(plainReason(error));
  process.exitCode = 1;
});
