import { plainText } from '@/lib/documents/plain-text';
import { countsInWords } from '@/lib/counts/summary';
import type { EntryContent, Reading } from '@/lib/entries/schema';
import { severityInWords } from '@/lib/severity/severity';
import { elevationForField } from '@/lib/units/elevation';
import { formatLength, type Units } from '@/lib/units/units';
import { dateInWords } from '@/lib/words/words';
import { canonical } from './content';
import { fieldName } from './paths';

export interface Difference {
  readonly path: string;
  readonly name: string;
  readonly mine: string;
  readonly theirs: string;
}

/** Names for what is stored by its id or slug. */
export interface Names {
  readonly units: Units;
  readonly nameOf: (id: string) => string;
}

const LENGTHS = new Set([
  'removedLength',
  'retainedLength',
  'diameter',
  'longestShoot',
  'dieback',
  'elevation',
]);
const NAMED = new Set(['species', 'orchard', 'tree']);

/** Every field in which two versions of an entry differ, each said in words. */
export function differences(mine: EntryContent, theirs: EntryContent, names: Names): Difference[] {
  const ids = [...new Set([...mine.readings, ...theirs.readings].map(({ id }) => id))];
  const found: Difference[] = [];
  const compare = (path: string, a: unknown, b: unknown) => {
    if (canonical(a ?? null) === canonical(b ?? null)) return;
    const key = path.split('.').at(-1) ?? path;
    found.push({
      path,
      name: fieldName(path, ids),
      mine: inWords(key, a, names),
      theirs: inWords(key, b, names),
    });
  };
  for (const key of ['title', 'species', 'cultivar', 'orchard', 'tree'] as const)
    compare(key, mine[key], theirs[key]);
  for (const group of ['place', 'cut'] as const) {
    const b: Record<string, unknown> = theirs[group];
    for (const [key, value] of Object.entries(mine[group])) compare(`${group}.${key}`, value, b[key]);
  }
  for (const id of ids) {
    const [a, b] = [mine, theirs].map(({ readings }) => readings.find((reading) => reading.id === id));
    if (a && b) compareReadings(a, b, compare);
    else
      found.push({
        path: `readings.${id}`,
        name: fieldName(`readings.${id}`, ids),
        mine: presence(a),
        theirs: presence(b),
      });
  }
  if (canonical(mine.doc) !== canonical(theirs.doc)) found.push(prose(mine, theirs));
  return found;
}

function compareReadings(
  a: Reading,
  b: Reading,
  compare: (path: string, a: unknown, b: unknown) => void,
): void {
  const at = (name: string) => `readings.${a.id}.${name}`;
  compare(at('counts'), counted(a), counted(b));
  for (const key of [
    'date',
    'dateApproximate',
    'longestShoot',
    'dieback',
    'removed',
    'kept',
    'note',
  ] as const) {
    compare(at(key), a[key], b[key]);
  }
}

function counted({ counts, total, branches }: Reading): string | null {
  if (counts) return `${counts.map((count) => count ?? '-').join(' ')} (${countsInWords({ counts })})`;
  return total !== null && branches !== null ? countsInWords({ total, branches }) : null;
}

function presence(reading: Reading | undefined): string {
  if (!reading) return 'not there';
  return [reading.date ? dateInWords(reading.date) : 'no date', counted(reading) ?? 'nothing counted'].join(
    ', ',
  );
}

function prose(mine: EntryContent, theirs: EntryContent): Difference {
  const [a, b] = [plainText(mine.doc), plainText(theirs.doc)];
  const alike = a === b ? 'the same words, set out differently' : null;
  return {
    path: 'doc',
    name: fieldName('doc', []),
    mine: alike ?? (a || 'empty'),
    theirs: alike ?? (b || 'empty'),
  };
}

function inWords(key: string, value: unknown, { units, nameOf }: Names): string {
  if (value === null || value === undefined || value === '') return 'not said';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'number') {
    if (LENGTHS.has(key)) return formatLength(value, units);
    if (key === 'elevation') return `${elevationForField(value, units)} ${units === 'imperial' ? 'ft' : 'm'}`;
    if (key === 'severity') return `${severityInWords(value)} (${Number(value.toFixed(3))})`;
    return key === 'intensity' ? `${Number((value * 100).toFixed(1))} %` : String(value);
  }
  const text = String(value);
  if (key === 'date') return dateInWords(text);
  return NAMED.has(key) ? nameOf(text) : text;
}
