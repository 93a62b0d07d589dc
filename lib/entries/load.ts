import type { Db } from '@/lib/database';
import { groupBy } from '@/lib/lists/group-by';
import type { EntryContent } from './schema';
import type { Revision, StoredReading } from './revisions';

type HeadRow = {
  id: number;
  entryId: string;
  number: number;
  authorId: string;
  savedAt: Date;
  acceptedAt: Date | null;
  title: string | null;
  species: string | null;
  cultivar: string | null;
  orchard: string | null;
  tree: string | null;
  sun: EntryContent['place']['sun'];
  wind: EntryContent['place']['wind'];
  water: EntryContent['place']['water'];
  elevation: number | null;
  doc: string;
  schemaVersion: EntryContent['schemaVersion'];
};

const HEAD = {
  id: 'id',
  entryId: 'entry_id',
  number: 'number',
  authorId: 'author_id',
  savedAt: 'saved_at',
  acceptedAt: 'accepted_at',
  title: 'title',
  species: 'species',
  cultivar: 'cultivar',
  orchard: 'orchard_id',
  tree: 'tree_id',
  sun: 'sun',
  wind: 'wind',
  water: 'water',
  elevation: 'elevation_m',
  doc: 'doc',
  schemaVersion: 'schema_version',
};

const CUT = {
  revisionId: 'revision_id',
  date: 'date',
  dateApproximate: 'date_approximate',
  kind: 'kind',
  severity: 'severity',
  severityEstimated: 'severity_estimated',
  tip: 'tip',
  branches: 'branches',
  intensity: 'intensity',
  removedLength: 'removed_length_m',
  retainedLength: 'retained_length_m',
  diameter: 'diameter_m',
  stage: 'stage',
  aim: 'aim',
};

const READING = {
  revisionId: 'revision_id',
  id: 'id',
  revision: 'revision',
  date: 'date',
  dateApproximate: 'date_approximate',
  total: 'total',
  branches: 'branches',
  longestShoot: 'longest_shoot_m',
  dieback: 'dieback_m',
  removed: 'removed',
  kept: 'kept',
  note: 'note',
  thinned: 'thinned',
  setAside: 'set_aside',
};

type CutRow = EntryContent['cut'] & { revisionId: number };
type ReadingRow = Omit<StoredReading, 'counts'> & { revisionId: number };
type BranchRow = { revisionId: number; readingId: string; branch: number; shoots: number | null };

/** Revisions by their rows' ids, whole: four queries, however many are asked for. */
export async function loadRevisions(db: Db, ids: readonly number[]): Promise<Map<number, Revision>> {
  if (ids.length === 0) return new Map();
  const [heads, cuts, readings, branches] = await Promise.all([
    db('revisions').whereIn('id', ids).select<HeadRow[]>(HEAD),
    db('cuts').whereIn('revision_id', ids).select<CutRow[]>(CUT),
    db('readings').whereIn('revision_id', ids).orderBy(['date', 'id']).select<ReadingRow[]>(READING),
    db('reading_branches')
      .whereIn('revision_id', ids)
      .orderBy(['revision_id', 'reading_id', 'branch'])
      .select<BranchRow[]>({
        revisionId: 'revision_id',
        readingId: 'reading_id',
        branch: 'branch',
        shoots: 'shoots',
      }),
  ]);
  const counts = groupBy(branches, (row) => `${row.revisionId} ${row.readingId}`);
  const readingsOf = groupBy(readings, (row) => row.revisionId);
  const cutOf = new Map(cuts.map((row) => [row.revisionId, row]));
  return new Map(
    heads.map((head) => {
      const cut = cutOf.get(head.id);
      if (!cut) throw new Error(`revision ${head.id} has no cut row`);
      const own = (readingsOf.get(head.id) ?? []).map((row) => storedReading(row, counts));
      return [head.id, revision(head, cut, own)];
    }),
  );
}

/** @throws Error when there is no such revision: its id came from an entry's row, so it must be there. */
export async function loadRevision(db: Db, id: number | null): Promise<Revision> {
  const found = id === null ? undefined : (await loadRevisions(db, [id])).get(id);
  if (!found) throw new Error(`revision ${id} is missing`);
  return found;
}

function storedReading(row: ReadingRow, counts: Map<string, BranchRow[]>): StoredReading {
  const { revisionId, ...reading } = row;
  const own = counts.get(`${revisionId} ${row.id}`);
  return {
    ...reading,
    counts: own ? own.map(({ shoots }) => shoots) : null,
    thinned: Boolean(row.thinned),
    setAside: Boolean(row.setAside),
  };
}

function revision(head: HeadRow, cutRow: CutRow, readings: StoredReading[]): Revision {
  const { revisionId, ...cut } = cutRow;
  void revisionId;
  return {
    id: head.id,
    entryId: head.entryId,
    number: head.number,
    authorId: head.authorId,
    savedAt: head.savedAt,
    acceptedAt: head.acceptedAt,
    content: {
      title: head.title,
      species: head.species,
      cultivar: head.cultivar,
      orchard: head.orchard,
      tree: head.tree,
      place: { sun: head.sun, wind: head.wind, water: head.water, elevation: head.elevation },
      cut: { ...cut, severityEstimated: Boolean(cutRow.severityEstimated) },
      readings,
      doc: JSON.parse(head.doc) as Record<string, unknown>,
      schemaVersion: head.schemaVersion,
    },
  };
}
