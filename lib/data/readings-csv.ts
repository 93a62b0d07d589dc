import { createHash } from 'node:crypto';
import { stringify } from 'csv-stringify/sync';
import type { Db } from '@/lib/database';
import { cellOf, roundElevation } from '@/lib/orchards/cell';
import { speciesBySlug } from '@/lib/species/catalogue';
import { READING_COLUMNS } from './codebook';

const BATCH = 2000;

type Row = {
  reading: string;
  entry: string;
  owner: string;
  orchard: string;
  latitude: number | null;
  longitude: number | null;
  elevation: number | null;
  species: string;
  days: number;
  counts: string | null;
  total: number | null;
  counted: number | null;
  [column: string]: string | number | null;
};

/** The open data, in pieces: all accepted readings that were not set aside, one row a reading, ordered by their ids. */
export async function* readingsCsv(db: Db): AsyncGenerator<string> {
  yield stringify([READING_COLUMNS.map(({ name }) => name)]);
  let after = '00000000-0000-0000-0000-000000000000';
  for (;;) {
    const rows = await batch(db, after);
    if (rows.length > 0) yield stringify(rows.map(cells));
    const last = rows.at(-1);
    if (!last || rows.length < BATCH) return;
    after = last.reading;
  }
}

function batch(db: Db, after: string): Promise<Row[]> {
  return db('readings')
    .join('entries', (on) =>
      on.on('entries.accepted_id', 'readings.revision_id').andOnVal('entries.status', 'accepted'),
    )
    .join('revisions', 'revisions.id', 'readings.revision_id')
    .join('cuts', 'cuts.revision_id', 'readings.revision_id')
    .join('orchards', 'orchards.id', 'revisions.orchard_id')
    .where('readings.set_aside', false)
    .where('readings.id', '>', after)
    .orderBy('readings.id')
    .limit(BATCH)
    .select({
      entry: 'entries.id',
      reading: 'readings.id',
      owner: 'entries.owner_id',
      orchard: 'orchards.id',
      latitude: 'orchards.latitude',
      longitude: 'orchards.longitude',
      elevation: 'revisions.elevation_m',
      species: 'revisions.species',
      severity: 'cuts.severity',
      class: 'cuts.severity_class',
      severity_estimated: 'cuts.severity_estimated',
      kind: 'cuts.kind',
      tip: 'cuts.tip',
      stage: db.raw("IF(cuts.stage = 'dormant', 'dormant', 'leaf')"),
      sun: 'revisions.sun',
      wind: 'revisions.wind',
      water: 'revisions.water',
      thinned: 'readings.thinned',
      cut_date: 'cuts.date',
      date: 'readings.date',
      days: db.raw('DATEDIFF(readings.date, cuts.date)'),
      cultivar: 'revisions.cultivar',
      intensity: 'cuts.intensity',
      retained_length: 'cuts.retained_length_m',
      diameter: 'cuts.diameter_m',
      longest_shoot: 'readings.longest_shoot_m',
      dieback: 'readings.dieback_m',
      removed: 'readings.removed',
      kept: 'readings.kept',
      total: 'readings.total',
      counted: 'readings.branches',
      counts: db.raw(`(
        SELECT GROUP_CONCAT(COALESCE(b.shoots, '') ORDER BY b.branch SEPARATOR ';') FROM reading_branches b
        WHERE b.revision_id = readings.revision_id AND b.reading_id = readings.id)`),
    });
}

function cells(row: Row): (string | number | null)[] {
  const species = speciesBySlug(row.species);
  const shoots = row.counts?.split(';').filter((count) => count !== '') ?? [];
  const cell = row.latitude === null || row.longitude === null ? null : cellOf(row.latitude, row.longitude);
  const made: Record<string, string | number | null> = {
    ...row,
    genus: species?.genus ?? null,
    wood: species?.wood ?? null,
    weeks: row.days / 7,
    orchard: key('o', row.orchard),
    grower: key('g', row.owner),
    branches: row.counts === null ? row.counted : shoots.length,
    count: row.counts === null ? row.total : shoots.reduce((sum, count) => sum + Number(count), 0),
    cultivar: harmless(row.cultivar as string | null),
    cell_latitude: cell?.latitude ?? null,
    cell_longitude: cell?.longitude ?? null,
    elevation: row.elevation === null ? null : roundElevation(row.elevation),
  };
  return READING_COLUMNS.map(({ name }) => made[name] ?? null);
}

/** Tells two growers apart without saying who they are: ids are random, so the digest cannot be guessed back. */
function key(prefix: string, id: string): string {
  return `${prefix}${createHash('sha256').update(id).digest('hex').slice(0, 12)}`;
}

/** A spreadsheet must not run what somebody wrote as a formula. */
function harmless(text: string | null): string | null {
  return text !== null && /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
}
