import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { parseArgs } from 'node:util';
import { sumUpPlants } from '@/lib/seen/plants';
import { readPlants, TableError } from '@/lib/seen/plants-csv';

const USAGE = `npm run --silent seen -- FILE.csv --count COLUMN [--alive COLUMN] [--group COLUMN]

Sums up a table of plants that were cut, one row a plant, and prints JSON.
  --count   shoots counted on the plant; an empty cell or NA is unknown, not zero
  --alive   whether it resprouted (1 0, yes no, true false); an empty cell or NA is unknown, and that plant is in no
            figure. Left out: a plant with a count over 0 resprouted, one with 0 did not, one without is unknown
  --group   what to sum up apart, a site for example. Left out: no groups`;

/** Bad input ends the command with one line and this status. */
const BAD_INPUT = 2;

try {
  main();
} catch (error) {
  if (!(error instanceof TableError)) throw error;
  console.error(`seen: ${error.message.replace(/\s+/g, ' ')}`);
  process.exitCode = BAD_INPUT;
}

function main(): void {
  const { file, columns, help } = readArguments();
  if (help) return console.log(USAGE);
  const { plants, contradictions } = within(file, () => readPlants(readText(file), columns));
  if (contradictions.length > 0) {
    console.error(
      `seen: ${file}: not alive, yet with a count over 0, taken as 0: row ${contradictions.slice(0, 20).join(', ')}${contradictions.length > 20 ? ' …' : ''}`,
    );
  }
  console.log(JSON.stringify(sumUpPlants(plants), null, 2));
}

function readArguments() {
  const { values, positionals } = parsed();
  const [file = '', ...more] = positionals;
  const { count = '', alive, group, help = false } = values;
  if (!help) {
    if (positionals.length === 0)
      throw new TableError('which file? Say for example: plants.csv --count count');
    if (more.length > 0) throw new TableError(`one file at a time, not also "${more[0]}"`);
    if (count === '') throw new TableError('which column has the counts? Say --count COLUMN');
  }
  return { file, columns: { count, alive, group }, help };
}

function parsed() {
  const text = { type: 'string' } as const;
  try {
    return parseArgs({
      options: { count: text, alive: text, group: text, help: { type: 'boolean', short: 'h' } },
      allowPositionals: true,
    });
  } catch (error) {
    throw new TableError(error instanceof Error ? (error.message.split('. ')[0] ?? '') : String(error));
  }
}

/** The file as text: UTF-8, or Windows-1252 where it is not, as spreadsheets write it. npm runs elsewhere than it was called. */
function readText(file: string): string {
  const places = [...new Set([process.env['INIT_CWD'] ?? '', process.cwd()])].filter((place) => place !== '');
  for (const [index, place] of places.entries()) {
    try {
      const bytes = readFileSync(resolve(place, file));
      return decoded(bytes);
    } catch (error) {
      const code = (error as NodeJS.ErrnoException).code;
      if (code === 'ENOENT' && index < places.length - 1) continue;
      if (code === 'ENOENT') throw new TableError('no such file');
      if (code === 'EISDIR') throw new TableError('is a folder');
      if (code === 'EACCES') throw new TableError('may not be read');
      throw error;
    }
  }
  throw new TableError('no such file');
}

function decoded(bytes: Uint8Array): string {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder('windows-1252').decode(bytes);
  }
}

function within<T>(file: string, work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (error instanceof TableError) throw new TableError(`${file}: ${error.message}`);
    throw error;
  }
}
