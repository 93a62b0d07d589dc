import type { EntryContent, EntryView } from '@/lib/entries/schema';
import { editable, trimmed, withoutReadings } from './document';

/** A draft of nothing, in its stored shape. */
export const EMPTY_CONTENT: EntryContent = {
  title: null,
  species: null,
  cultivar: null,
  orchard: null,
  tree: null,
  place: { sun: null, wind: null, water: null, elevation: null },
  cut: {
    date: null,
    dateApproximate: null,
    kind: null,
    severity: null,
    severityEstimated: false,
    tip: null,
    branches: null,
    intensity: null,
    removedLength: null,
    retainedLength: null,
    diameter: null,
    stage: null,
    aim: null,
  },
  readings: [],
  doc: { type: 'doc', content: [] },
  schemaVersion: 1,
};

/** What its owner wrote, out of what the server tells of an entry. */
export function contentOf(view: EntryView): EntryContent {
  const ids = view.readings.map(({ id }) => id);
  return {
    title: view.title,
    species: view.species,
    cultivar: view.cultivar,
    orchard: view.orchard ?? null,
    tree: view.tree ?? null,
    place: pick(view.place, EMPTY_CONTENT.place),
    cut: pick(view.cut, EMPTY_CONTENT.cut),
    readings: view.readings.map((reading) => pick(reading, EMPTY_READING_CONTENT)),
    // As this editor would store it, so that opening a record and looking at it changes nothing.
    doc: trimmed(editable(view.doc, ids)),
    schemaVersion: 1,
  };
}

export const EMPTY_READING_CONTENT: EntryContent['readings'][number] = {
  id: '',
  date: null,
  dateApproximate: null,
  counts: null,
  total: null,
  branches: null,
  longestShoot: null,
  dieback: null,
  removed: null,
  kept: null,
  note: null,
};

/** Readings as the server keeps them: by date, then by id. Paths of its errors count in this order. */
export function inOrder(readings: readonly EntryContent['readings'][number][]): EntryContent['readings'] {
  const key = ({ date, id }: { date: string | null; id: string }) => `${date ?? ''} ${id}`;
  return [...readings].sort((a, b) => (key(a) < key(b) ? -1 : 1));
}

/** Whether two contents would be stored as the same. */
export function sameContent(a: EntryContent, b: EntryContent): boolean {
  return (
    canonical({ ...a, readings: inOrder(a.readings) }) === canonical({ ...b, readings: inOrder(b.readings) })
  );
}

/** Readings that are stored and that `known` has never seen. */
export function newcomers(stored: EntryContent, known: EntryContent): EntryContent['readings'] {
  const ids = new Set(known.readings.map(({ id }) => id));
  return stored.readings.filter(({ id }) => !ids.has(id));
}

/** Whether `stored` is `known` and nothing more than the readings `added`. */
export function isOnlyAddedTo(
  known: EntryContent,
  stored: EntryContent,
  added: EntryContent['readings'],
): boolean {
  const ids = added.map(({ id }) => id);
  return sameContent(known, {
    ...stored,
    readings: stored.readings.filter(({ id }) => !ids.includes(id)),
    doc: withoutReadings(stored.doc, ids),
  });
}

/** JSON with sorted keys and without what is null, so that an absent field and an empty one are alike. */
export function canonical(value: unknown): string {
  return JSON.stringify(value, (_key, inner: unknown) => {
    if (typeof inner === 'number') return Math.round(inner * 1e6) / 1e6;
    if (typeof inner !== 'object' || inner === null || Array.isArray(inner)) return inner;
    const entries = Object.entries(inner).filter(([, part]) => part !== null && part !== undefined);
    return Object.fromEntries(entries.sort(([x], [y]) => (x < y ? -1 : 1)));
  });
}

function pick<T extends object>(from: T, like: T): T {
  return Object.fromEntries(Object.keys(like).map((key) => [key, from[key as keyof T]])) as T;
}
