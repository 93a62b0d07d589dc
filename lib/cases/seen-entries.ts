import type { Db } from '@/lib/database';
import { groupBy } from '@/lib/lists/group-by';
import { sumsOfTotal, type ReadingSums } from '@/lib/seen/reading';
import type { SeenEntry, SeenReading } from '@/lib/seen/seen';

type EntryRow = Omit<SeenEntry, 'readings'> & { revisionId: number };
type ReadingRow = {
  revisionId: number;
  daysAfterCut: number;
  total: number | null;
  branches: number | null;
  shootsCounted: number | null;
  branchesCounted: number;
  bare: number | null;
  thinned: number;
  setAside: number;
};

/** All accepted entries of a species, as far as summing up needs them: two queries. */
export async function seenEntries(db: Db, species: string): Promise<SeenEntry[]> {
  const accepted = () =>
    db('entries')
      .join('revisions', 'revisions.id', 'entries.accepted_id')
      .join('cuts', 'cuts.revision_id', 'entries.accepted_id')
      .where('entries.status', 'accepted')
      .where('revisions.species', species);
  const [entries, readings]: [EntryRow[], ReadingRow[]] = await Promise.all([
    accepted().select({
      revisionId: 'revisions.id',
      growerId: 'entries.owner_id',
      orchardId: 'revisions.orchard_id',
      kind: 'cuts.kind',
      severityClass: 'cuts.severity_class',
      tip: 'cuts.tip',
      retainedLengthM: 'cuts.retained_length_m',
    }),
    accepted()
      .join('readings', 'readings.revision_id', 'entries.accepted_id')
      .leftJoin('reading_branches', (on) =>
        on
          .on('reading_branches.revision_id', 'readings.revision_id')
          .andOn('reading_branches.reading_id', 'readings.id'),
      )
      .groupBy('readings.revision_id', 'readings.id')
      .orderBy(['readings.revision_id', 'readings.date', 'readings.id'])
      .select({
        revisionId: 'readings.revision_id',
        daysAfterCut: db.raw('DATEDIFF(readings.date, cuts.date)'),
        total: 'readings.total',
        branches: 'readings.branches',
        shootsCounted: db.raw('CAST(SUM(reading_branches.shoots) AS DOUBLE)'),
        branchesCounted: db.raw('COUNT(reading_branches.shoots)'),
        bare: db.raw('CAST(SUM(reading_branches.shoots = 0) AS DOUBLE)'),
        thinned: 'readings.thinned',
        setAside: 'readings.set_aside',
      }),
  ]);
  const readingsOf = groupBy(readings, ({ revisionId }) => revisionId);
  return entries.map(({ revisionId, ...entry }) => ({
    ...entry,
    readings: (readingsOf.get(revisionId) ?? []).map(seenReading),
  }));
}

function seenReading(row: ReadingRow): SeenReading {
  return {
    ...sums(row),
    daysAfterCut: row.daysAfterCut,
    thinned: Boolean(row.thinned),
    setAside: Boolean(row.setAside),
  };
}

function sums(row: ReadingRow): ReadingSums {
  if (row.total !== null && row.branches !== null) return sumsOfTotal(row.total, row.branches);
  return { shoots: row.shootsCounted ?? 0, branches: Number(row.branchesCounted), bare: row.bare ?? 0 };
}
