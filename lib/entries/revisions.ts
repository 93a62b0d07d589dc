import { isDeepStrictEqual } from 'node:util';
import type { Db } from '@/lib/database';
import { Conflict } from '@/lib/errors/errors';
import { severityClass } from '@/lib/severity/severity';
import { thinnedReadings } from './consistency';
import type { EntryContent, Reading } from './schema';

export type StoredReading = Reading & { revision: number; thinned: boolean; setAside: boolean };

/** One revision as stored: the content, and what only the store knows of it. */
export type Revision = {
  id: number;
  entryId: string;
  number: number;
  authorId: string;
  savedAt: Date;
  /** Once accepted a revision never changes again. */
  acceptedAt: Date | null;
  content: Omit<EntryContent, 'readings'> & { readings: StoredReading[] };
};

/** What a person wrote, without what the store adds: the form in which two contents are compared. */
export function plainContent(revision: Revision): EntryContent {
  return { ...revision.content, readings: revision.content.readings.map(plainReading) };
}

export function plainReading(stored: StoredReading): Reading {
  const { revision, thinned, setAside, ...reading } = stored;
  void [revision, thinned, setAside];
  return reading;
}

/** Writes a new revision and gives its row's id. */
export async function insertRevision(
  db: Db,
  head: { entryId: string; number: number; authorId: string },
  content: EntryContent,
  before: readonly StoredReading[],
): Promise<number> {
  const [id] = await db('revisions').insert({
    entry_id: head.entryId,
    number: head.number,
    author_id: head.authorId,
    ...headColumns(content),
  });
  if (id === undefined) throw new Error('no id for a new revision');
  await writeRecords(db, id, head, content, before);
  return id;
}

/** Writes over a revision that nobody has accepted. */
export async function replaceRevision(
  db: Db,
  id: number,
  head: { entryId: string; number: number; authorId: string },
  content: EntryContent,
  before: readonly StoredReading[],
): Promise<void> {
  const touched = await db('revisions')
    .where({ id })
    .whereNull('accepted_at')
    .update({ number: head.number, author_id: head.authorId, saved_at: new Date(), ...headColumns(content) });
  if (touched !== 1) throw new Error(`revision ${id} is accepted and cannot change`);
  await db('cuts').where({ revision_id: id }).delete();
  await db('readings').where({ revision_id: id }).delete();
  await writeRecords(db, id, head, content, before);
}

/** Removes a revision that was never accepted. */
export async function dropRevision(db: Db, id: number): Promise<void> {
  await db('revisions').where({ id }).whereNull('accepted_at').delete();
}

function headColumns(content: EntryContent) {
  return {
    title: content.title,
    species: content.species,
    cultivar: content.cultivar,
    orchard_id: content.orchard,
    tree_id: content.tree,
    sun: content.place.sun,
    wind: content.place.wind,
    water: content.place.water,
    elevation_m: content.place.elevation,
    doc: JSON.stringify(content.doc),
    schema_version: content.schemaVersion,
  };
}

async function writeRecords(
  db: Db,
  revisionId: number,
  head: { entryId: string; authorId: string },
  content: EntryContent,
  before: readonly StoredReading[],
): Promise<void> {
  const { cut } = content;
  await db('cuts').insert({
    revision_id: revisionId,
    date: cut.date,
    date_approximate: cut.dateApproximate,
    kind: cut.kind,
    severity: cut.severity,
    severity_class: cut.severity === null ? null : severityClass(cut.severity),
    severity_estimated: cut.severityEstimated,
    tip: cut.tip,
    branches: cut.branches,
    intensity: cut.intensity,
    removed_length_m: cut.removedLength,
    retained_length_m: cut.retainedLength,
    diameter_m: cut.diameter,
    stage: cut.stage,
    aim: cut.aim,
  });
  if (content.readings.length === 0) return;
  await claimReadingIds(db, head, content.readings);
  const thinned = thinnedReadings(content.readings);
  await db('readings').insert(
    content.readings.map((reading) => {
      const { revision, setAside } = carriedOver(reading, before);
      return {
        revision_id: revisionId,
        id: reading.id,
        revision,
        date: reading.date,
        date_approximate: reading.dateApproximate,
        total: reading.total,
        branches: reading.branches,
        longest_shoot_m: reading.longestShoot,
        dieback_m: reading.dieback,
        removed: reading.removed,
        kept: reading.kept,
        note: reading.note,
        thinned: thinned.has(reading.id),
        set_aside: setAside,
      };
    }),
  );
  const branches = content.readings.flatMap((reading) =>
    (reading.counts ?? []).map((shoots, index) => ({
      revision_id: revisionId,
      reading_id: reading.id,
      branch: index + 1,
      shoots,
    })),
  );
  if (branches.length > 0) await db.batchInsert('reading_branches', branches, 2000);
}

/** A reading left as it was keeps its revision and what the bench said of it. */
function carriedOver(
  reading: Reading,
  before: readonly StoredReading[],
): { revision: number; setAside: boolean } {
  const old = before.find(({ id }) => id === reading.id);
  if (!old) return { revision: 1, setAside: false };
  if (isDeepStrictEqual(plainReading(old), reading))
    return { revision: old.revision, setAside: old.setAside };
  return { revision: old.revision + 1, setAside: false };
}

async function claimReadingIds(
  db: Db,
  head: { entryId: string; authorId: string },
  readings: readonly Reading[],
): Promise<void> {
  const ids = readings.map(({ id }) => id);
  const rows = ids.map((id) => ({ id, entry_id: head.entryId, created_by: head.authorId }));
  await db('reading_ids').insert(rows).onConflict('id').ignore();
  const taken = await db('reading_ids').whereIn('id', ids).whereNot('entry_id', head.entryId).first('id');
  if (taken)
    throw new Conflict('A reading of this id belongs to another entry. Give the new one an id of its own.');
}
