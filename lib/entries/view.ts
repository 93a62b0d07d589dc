import type { Db } from '@/lib/database';
import { groupBy } from '@/lib/lists/group-by';
import { cellOf, roundElevation } from '@/lib/orchards/cell';
import { isModerator, type Actor } from '@/lib/people/actor';
import { severityClass } from '@/lib/severity/severity';
import type { Revision, StoredReading } from './revisions';
import type { EntryView, ReadingView } from './schema';
import type { EntryRow } from './table';

const DAY_MS = 86_400_000;

/** Weeks from the cut to a visit: days / 7, to be compared with care where a date is approximate. */
export function weeksBetween(cutDate: string | null, date: string | null): number | null {
  if (!cutDate || !date) return null;
  return (Date.parse(date) - Date.parse(cutDate)) / DAY_MS / 7;
}

export function readingView(reading: StoredReading, cutDate: string | null): ReadingView {
  return { ...reading, weeks: weeksBetween(cutDate, reading.date) };
}

type OrchardRow = { id: string; ownerId: string; latitude: number | null; longitude: number | null };

/**
 * Entries as this person may read them. Whoever is no member of the orchard gets its cell and a rounded elevation in
 * place of the orchard and the tree.
 */
export async function entryViews(
  db: Db,
  actor: Actor | null,
  found: readonly { row: EntryRow; shown: Revision }[],
): Promise<EntryView[]> {
  const orchardIds = [...new Set(found.flatMap(({ shown }) => shown.content.orchard ?? []))];
  const ownerIds = [...new Set(found.map(({ row }) => row.ownerId))];
  const [orchards, people, members] = await Promise.all([
    db('orchards')
      .whereIn('id', orchardIds)
      .select<OrchardRow[]>({ id: 'id', ownerId: 'owner_id', latitude: 'latitude', longitude: 'longitude' }),
    db('people').whereIn('id', ownerIds).select<{ id: string; name: string }[]>('id', 'name'),
    db('orchard_members')
      .whereIn('orchard_id', orchardIds)
      .select<{ orchardId: string; personId: string }[]>({ orchardId: 'orchard_id', personId: 'person_id' }),
  ]);
  const orchardOf = new Map(orchards.map((orchard) => [orchard.id, orchard]));
  const nameOf = new Map(people.map(({ id, name }) => [id, name]));
  const membersOf = groupBy(members, ({ orchardId }) => orchardId);
  return found.map(({ row, shown }) => {
    const orchard = shown.content.orchard ? orchardOf.get(shown.content.orchard) : undefined;
    const helps = (membersOf.get(orchard?.id ?? '') ?? []).some(({ personId }) => personId === actor?.id);
    const isMember = actor !== null && (actor.id === row.ownerId || actor.id === orchard?.ownerId || helps);
    return view(row, shown, actor, nameOf.get(row.ownerId) ?? 'a former grower', orchard, isMember);
  });
}

function view(
  row: EntryRow,
  shown: Revision,
  actor: Actor | null,
  owner: string,
  orchard: OrchardRow | undefined,
  isMember: boolean,
): EntryView {
  const { content } = shown;
  const mine = actor?.id === row.ownerId;
  const seesWork = mine || isModerator(actor);
  const { orchard: orchardId, tree, place, readings, ...rest } = content;
  return {
    ...rest,
    id: row.id,
    status: row.status,
    revision: shown.number,
    ...(seesWork && row.status === 'accepted' ? { pending: row.workingId !== row.acceptedId } : {}),
    ...(seesWork ? { returnedNote: row.returnedNote } : {}),
    owner,
    mine,
    createdAt: row.createdAt.toISOString(),
    updatedAt: (seesWork ? row.updatedAt : shown.savedAt).toISOString(),
    ...(isMember ? { orchard: orchardId, tree } : { cell: cellOfOrchard(orchard) }),
    place: isMember
      ? place
      : { ...place, elevation: place.elevation === null ? null : roundElevation(place.elevation) },
    class: content.cut.severity === null ? null : severityClass(content.cut.severity),
    readings: readings.map((reading) => readingView(reading, content.cut.date)),
    credits: [{ name: owner }],
  };
}

function cellOfOrchard(orchard: OrchardRow | undefined) {
  if (!orchard || orchard.latitude === null || orchard.longitude === null) return null;
  return cellOf(orchard.latitude, orchard.longitude);
}
