import type { Db } from '@/lib/database';
import { thinnedReadings } from '@/lib/entries/consistency';
import type { EntryContent } from '@/lib/entries/schema';
import { severityClass } from '@/lib/severity/severity';
import { chunks, put } from './batches';
import { insertPlaces } from './insert-places';
import type { Demo, DemoEntry } from './types';

/** One written state of an entry, before the database has given it a number. */
interface State {
  entry: DemoEntry;
  content: EntryContent;
  number: number;
  accepted: boolean;
  savedAt: Date;
}

/**
 * Writes a demo whose people are not there yet, in batches. Needs its species in their table. `acceptedBy` is the
 * moderator who took the accepted ones in; `passwordHashOf` says how each person signs in.
 */
export async function insertDemo(
  db: Db,
  demo: Demo,
  {
    acceptedBy,
    passwordHashOf,
  }: { acceptedBy: string; passwordHashOf: (person: Demo['people'][number]) => string },
): Promise<void> {
  await insertPlaces(db, demo, passwordHashOf);
  await put(
    db,
    'entries',
    demo.entries.map((entry) => ({ id: entry.id, owner_id: entry.ownerId, created_at: entry.createdAt })),
  );
  const states = demo.entries.flatMap(statesOf);
  const ids = await insertRevisions(db, states, acceptedBy);
  await insertRecords(db, states, ids);
  await pointToRevisions(db, demo, states, ids);
  const subjects = [
    'accepted',
    ...new Set(acceptedOf(demo).map((entry) => `species:${entry.content.species}`)),
  ];
  for (const subject of subjects.sort()) {
    await db('data_versions')
      .insert({ subject, version: 1 })
      .onConflict('subject')
      .merge({ version: db.raw('version + 1') });
  }
}

function acceptedOf({ entries }: Demo): DemoEntry[] {
  return entries.filter(({ status }) => status === 'accepted');
}

function statesOf(entry: DemoEntry): State[] {
  const accepted = entry.acceptedAt !== null;
  const first = { entry, content: entry.content, number: 1, accepted, savedAt: entry.savedAt };
  if (!entry.pending) return [first];
  const savedAt = entry.acceptedAt ?? entry.savedAt;
  return [first, { entry, content: entry.pending, number: 2, accepted: false, savedAt }];
}

/** The rows' ids, in the states' order, asked back by entry and number. */
async function insertRevisions(db: Db, states: readonly State[], acceptedBy: string): Promise<number[]> {
  await put(
    db,
    'revisions',
    states.map(({ entry, content, number, accepted, savedAt }) => ({
      entry_id: entry.id,
      number,
      author_id: entry.ownerId,
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
      created_at: savedAt,
      saved_at: savedAt,
      accepted_at: accepted ? entry.acceptedAt : null,
      accepted_by: accepted ? acceptedBy : null,
    })),
  );
  const idOf = new Map<string, number>();
  for (const some of chunks(states)) {
    const rows = await db('revisions')
      .whereIn(
        'entry_id',
        some.map(({ entry }) => entry.id),
      )
      .select<{ id: number | string; entryId: string; number: number }[]>({
        id: 'id',
        entryId: 'entry_id',
        number: 'number',
      });
    for (const row of rows) idOf.set(`${row.entryId} ${row.number}`, Number(row.id));
  }
  return states.map(({ entry, number }) => {
    const id = idOf.get(`${entry.id} ${number}`);
    if (id === undefined) throw new Error(`no row for revision ${number} of ${entry.id}`);
    return id;
  });
}

async function insertRecords(db: Db, states: readonly State[], ids: readonly number[]): Promise<void> {
  await put(
    db,
    'cuts',
    states.map(({ content }, index) => cutRow(content.cut, ids[index] as number)),
  );
  const first = states.filter(({ number }) => number === 1);
  await put(
    db,
    'reading_ids',
    first.flatMap(({ entry, content }) =>
      content.readings.map(({ id }, index) => ({
        id,
        entry_id: entry.id,
        created_by: entry.readBy[index],
        created_at: entry.savedAt,
      })),
    ),
  );
  const readings = states.flatMap(({ content }, index) => {
    const thinned = thinnedReadings(content.readings);
    return content.readings.map((reading) => ({
      reading,
      revisionId: ids[index] as number,
      thinned: thinned.has(reading.id),
    }));
  });
  await put(
    db,
    'readings',
    readings.map(({ reading, revisionId, thinned }) => ({
      revision_id: revisionId,
      id: reading.id,
      date: reading.date,
      date_approximate: reading.dateApproximate,
      total: reading.total,
      branches: reading.branches,
      longest_shoot_m: reading.longestShoot,
      dieback_m: reading.dieback,
      removed: reading.removed,
      kept: reading.kept,
      note: reading.note,
      thinned,
    })),
  );
  await put(
    db,
    'reading_branches',
    readings.flatMap(({ reading, revisionId }) =>
      (reading.counts ?? []).map((shoots, index) => ({
        revision_id: revisionId,
        reading_id: reading.id,
        branch: index + 1,
        shoots,
      })),
    ),
  );
}

function cutRow(cut: EntryContent['cut'], revisionId: number) {
  return {
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
  };
}

/** Writes where each entry stands, over its bare row: an insert that meets its own key. */
async function pointToRevisions(
  db: Db,
  demo: Demo,
  states: readonly State[],
  ids: readonly number[],
): Promise<void> {
  const idOf = new Map(
    states.map(({ entry, number }, index) => [`${entry.id} ${number}`, ids[index] as number]),
  );
  const rows = demo.entries.map((entry) => {
    const first = idOf.get(`${entry.id} 1`) ?? null;
    const pending = idOf.get(`${entry.id} 2`) ?? null;
    return {
      id: entry.id,
      owner_id: entry.ownerId,
      status: entry.status,
      revision: pending === null ? 1 : 2,
      working_id: pending ?? first,
      waiting_id: entry.status === 'waiting' ? first : null,
      accepted_id: entry.acceptedAt ? first : null,
      waiting_since: entry.waitingSince,
      accepted_at: entry.acceptedAt,
      returned_note: entry.returnedNote,
      created_at: entry.createdAt,
      updated_at: entry.acceptedAt ?? entry.savedAt,
    };
  });
  for (const some of chunks(rows)) await db('entries').insert(some).onConflict('id').merge();
}
