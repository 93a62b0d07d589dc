import { parse } from 'csv-parse/sync';
import type { CutPlant } from './plants';

/** Reads cut plants from a table with one row a plant. */

export interface PlantColumns {
  /** Shoots counted: whole numbers, empty or NA where nobody counted. */
  readonly count: string;
  /** Whether the plant resprouted: 1 0, yes no, true false, empty or NA. Without it a count over 0 says so. */
  readonly alive?: string;
  /** What the plants are grouped by. Without it there are no groups. */
  readonly group?: string;
}

/** What is wrong with a table, with its row (the header is row 1) and column. */
export class TableError extends Error {}

const UNKNOWN = new Set(['', 'na', 'n/a', 'nan', 'null']);
const YES = new Set(['1', '1.0', 'yes', 'y', 'true', 't']);
const NO = new Set(['0', '0.0', 'no', 'n', 'false', 'f']);

/**
 * Cut plants from the text of a CSV: commas (or semicolons or tabs, if its header has no comma), quotes, any line
 * ends, with or without a byte order mark. A plant that is not alive has no live shoot, whatever its count says.
 * `contradictions` are the rows where a count says otherwise.
 * @throws TableError at the first thing that cannot be read.
 */
export function readPlants(
  text: string,
  columns: PlantColumns,
): { plants: CutPlant[]; contradictions: number[] } {
  const [header, ...rows] = records(text);
  if (!header || header.every((name) => name === '')) throw new TableError('the file is empty');
  const count = columnOf(header, columns.count);
  const alive = columns.alive === undefined ? null : columnOf(header, columns.alive);
  const group = columns.group === undefined ? null : columnOf(header, columns.group);
  const plants: CutPlant[] = [];
  const contradictions: number[] = [];
  rows.forEach((cells, index) => {
    const row = index + 2;
    if (cells.every((cell) => cell === '')) return;
    if (cells.length !== header.length) {
      throw new TableError(`row ${row}: ${cells.length} fields where the header has ${header.length}`);
    }
    const at = (column: number) => cells[column] ?? '';
    const shoots = readCount(at(count), row, columns.count);
    const resprouted =
      alive === null ? (shoots === null ? null : shoots > 0) : readAlive(at(alive), row, columns.alive ?? '');
    if (resprouted === false && shoots !== null && shoots > 0) contradictions.push(row);
    plants.push({ resprouted, shoots, group: group === null ? null : groupName(at(group)) });
  });
  return { plants, contradictions };
}

function records(text: string): string[][] {
  const firstLine = text.split(/\r\n|\n|\r/, 1)[0] ?? '';
  const delimiter = firstLine.includes(',')
    ? ','
    : ([';', '\t'].find((one) => firstLine.includes(one)) ?? ',');
  try {
    return parse(text, { bom: true, delimiter, trim: true, relax_quotes: true, relax_column_count: true });
  } catch (error) {
    const { code, lines } = error as { code?: string; lines?: number };
    if (typeof code !== 'string' || !code.startsWith('CSV_')) throw error;
    const what =
      code === 'CSV_QUOTE_NOT_CLOSED' ? 'a quote is opened and never closed' : 'quotes that cannot be read';
    throw new TableError(lines === undefined ? what : `line ${lines}: ${what}`);
  }
}

function columnOf(header: readonly string[], name: string): number {
  const column = header.indexOf(name.trim());
  if (column < 0)
    throw new TableError(
      `row 1: no column "${name}"; there are ${header.map((one) => `"${one}"`).join(', ')}`,
    );
  if (header.indexOf(name.trim(), column + 1) >= 0)
    throw new TableError(`row 1: two columns are called "${name}"`);
  return column;
}

function readCount(cell: string, row: number, column: string): number | null {
  if (UNKNOWN.has(cell.toLowerCase())) return null;
  if (!/^\+?\d+(\.0*)?$/.test(cell) || !Number.isSafeInteger(Number(cell))) {
    throw new TableError(`row ${row}, column "${column}": "${cell}" is no whole number of 0 or more`);
  }
  return Number(cell);
}

function readAlive(cell: string, row: number, column: string): boolean | null {
  const said = cell.toLowerCase();
  if (UNKNOWN.has(said)) return null;
  if (YES.has(said)) return true;
  if (NO.has(said)) return false;
  throw new TableError(
    `row ${row}, column "${column}": "${cell}" is neither yes (1, true) nor no (0, false)`,
  );
}

/** Plants without a group stand together under the empty name. */
function groupName(cell: string): string {
  return UNKNOWN.has(cell.toLowerCase()) ? '' : cell;
}
