import { parseArgs } from 'node:util';
import { benchPages } from './bench/pages';

const { values, positionals } = parseArgs({
  allowPositionals: true,
  options: { entries: { type: 'string' }, seconds: { type: 'string', default: '8' } },
});

const known = ['pages'];
const unknown = positionals.find((name) => !known.includes(name));
const entries = values.entries === undefined ? undefined : Number(values.entries);
const seconds = Number(values.seconds);

if (unknown || (entries !== undefined && !(entries > 0)) || !(seconds > 0)) {
  console.error('npm run bench [-- pages] [--entries 50000] [--seconds 8]');
  process.exitCode = 2;
} else {
  benchPages({ entries, seconds }).catch((error: unknown) => {
    console.error(error instanceof Error ? error.message : error);
    process.exitCode = 1;
  });
}
