import { start } from './start/start';
import { plainReason } from './start/say';

start()
  .catch((error: unknown) => {
    console.error(plainReason(error));
    process.exitCode = 1;
  })
  // What was begun for a start that is over, such as the demo's transaction, ends with it.
  .finally(() => process.exit());
