import type { FieldError } from '@/lib/errors/errors';
import { SCHEMA_VERSION } from '@/lib/documents/schema';
import { markThinned } from '@/lib/seen/reading';
import type { Cut, EntryContent, Reading } from './schema';

const DAY_MS = 86_400_000;

/** The last date that may be written down: tomorrow in UTC, so that nobody's today is refused. */
export function latestDate(now = new Date()): string {
  return new Date(now.getTime() + DAY_MS).toISOString().slice(0, 10);
}

/** What cannot be true together, even in a draft. Empty where all fits. */
export function contradictions(content: EntryContent, now = new Date()): FieldError[] {
  const latest = latestDate(now);
  const seen = new Set<string>();
  const errors = cutContradictions(content.cut);
  if (content.cut.date && content.cut.date > latest) {
    errors.push({ path: 'cut.date', message: 'lies in the future' });
  }
  content.readings.forEach((reading, index) => {
    const path = `readings.${index}`;
    if (seen.has(reading.id)) errors.push({ path: `${path}.id`, message: 'stands here twice' });
    seen.add(reading.id);
    if (reading.date && reading.date > latest)
      errors.push({ path: `${path}.date`, message: 'lies in the future' });
    if (reading.date && content.cut.date && reading.date < content.cut.date) {
      errors.push({ path: `${path}.date`, message: `lies before the cut of ${content.cut.date}` });
    }
    errors.push(...countContradictions(reading, content.cut.branches, path));
  });
  return errors;
}

function cutContradictions(cut: Cut): FieldError[] {
  const errors: FieldError[] = [];
  const uncut = cut.severity === 0;
  if (uncut && cut.severity !== 0) {
    errors.push({
      path: 'cut.severity',
      message: 'is too little to be told from no cut; use 0, or what was taken',
    });
  }
  if (uncut && cut.kind !== null && cut.kind !== 'none') {
    errors.push({ path: 'cut.kind', message: 'must be none where severity is 0: an uncut control' });
  }
  if (cut.kind === 'none' && cut.severity !== null && !uncut) {
    errors.push({ path: 'cut.severity', message: 'must be 0 where the kind is none' });
  }
  if ((uncut || cut.kind === 'none') && cut.tip === 'removed') {
    errors.push({ path: 'cut.tip', message: 'must be kept on a branch that was not cut' });
  }
  return errors;
}

function countContradictions(reading: Reading, cutBranches: number | null, path: string): FieldError[] {
  const errors: FieldError[] = [];
  const { counts, total, branches } = reading;
  if (counts && total !== null) {
    errors.push({ path: `${path}.total`, message: 'cannot stand beside counts: give one or the other' });
  }
  if (counts && branches !== null) {
    errors.push({
      path: `${path}.branches`,
      message: 'goes with a total; with counts, each branch has its own',
    });
  }
  const counted = counts ? counts.length : branches;
  if (counted !== null && cutBranches !== null && counted > cutBranches) {
    errors.push({
      path: `${path}.${counts ? 'counts' : 'branches'}`,
      message: `speaks of ${counted} branches, but ${cutBranches} were marked at the cut`,
    });
  }
  if (total !== null && branches !== null && total > 999 * branches) {
    errors.push({ path: `${path}.total`, message: 'is over 999 shoots a branch' });
  }
  return errors;
}

/** What the bench needs and this entry lacks. Empty where it may be submitted. */
export function lacks(content: EntryContent): FieldError[] {
  const needed: [string, unknown][] = [
    ['species', content.species],
    ['orchard', content.orchard],
    ['place.sun', content.place.sun],
    ['place.wind', content.place.wind],
    ['place.water', content.place.water],
    ['cut.date', content.cut.date],
    ['cut.kind', content.cut.kind],
    ['cut.severity', content.cut.severity],
    ['cut.tip', content.cut.tip],
    ['cut.branches', content.cut.branches],
    ['cut.stage', content.cut.stage],
  ];
  const errors = needed
    .filter(([, value]) => value === null)
    .map(([path]) => ({ path, message: 'is needed before this can go to the bench' }));
  if (content.readings.length === 0) {
    errors.push({ path: 'readings', message: 'needs at least one: what was counted, and when' });
  }
  content.readings.forEach((reading, index) => errors.push(...readingLacks(reading, `readings.${index}`)));
  if (content.schemaVersion !== SCHEMA_VERSION) {
    errors.push({ path: 'schemaVersion', message: 'is of another version of the app' });
  }
  return errors;
}

/** What a reading lacks before it can count: its date, and counts or a total with its branches. */
export function readingLacks(reading: Reading, path: string): FieldError[] {
  const at = (field: string) => (path ? `${path}.${field}` : field);
  const errors: FieldError[] = [];
  if (!reading.date) errors.push({ path: at('date'), message: 'is needed: when was this counted' });
  if (!reading.counts && reading.total === null) {
    errors.push({ path: at('counts'), message: 'is needed: shoots on each branch, or a total' });
  }
  if (reading.total !== null && reading.branches === null) {
    errors.push({ path: at('branches'), message: 'is needed with a total: how many branches were counted' });
  }
  return errors;
}

/** Ids of readings taken after flush was removed at an earlier visit; they stay out of every summary. */
export function thinnedReadings(readings: readonly Pick<Reading, 'id' | 'date' | 'removed'>[]): Set<string> {
  const dated = readings.flatMap(({ id, date, removed }) =>
    date === null ? [] : [{ id, removed, daysAfterCut: Date.parse(date) / DAY_MS }],
  );
  const thinned = markThinned(dated);
  return new Set(dated.filter((_, index) => thinned[index]).map(({ id }) => id));
}
