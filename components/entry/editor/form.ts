import type { Counted } from '@/lib/counts/parse';
import { formatCounts } from '@/lib/counts/parse';
import type { EntryContent, Reading } from '@/lib/entries/schema';
import { elevationForField } from '@/lib/units/elevation';
import { formatForField, lengthField, type Units } from '@/lib/units/units';

/** What stands in the editor's fields, as typed: what cannot be read yet is kept too. An empty field is ''. */
export interface EntryForm {
  readonly title: string;
  /** The slug; '' where none is chosen. */
  readonly species: string;
  /** What stands in the species field, when it names no species. */
  readonly speciesTyped: string;
  readonly cultivar: string;
  readonly orchard: string;
  readonly tree: string;
  readonly sun: string;
  readonly wind: string;
  readonly water: string;
  readonly elevation: string;
  readonly cut: CutForm;
  /** Every reading met in this session, in the document or taken out of it. */
  readonly readings: Readonly<Record<string, ReadingForm>>;
}

export interface CutForm {
  readonly date: string;
  readonly dateApproximate: string;
  readonly kind: string;
  readonly severity: number | null;
  readonly severityEstimated: boolean;
  readonly tip: string;
  readonly branches: string;
  /** In percent. */
  readonly intensity: string;
  readonly removedLength: string;
  readonly retainedLength: string;
  readonly diameter: string;
  readonly stage: string;
  readonly aim: string;
}

export interface ReadingForm {
  readonly date: string;
  readonly dateApproximate: string;
  readonly counts: string;
  readonly longestShoot: string;
  readonly dieback: string;
  readonly removed: string;
  readonly kept: string;
  readonly note: string;
}

export const EMPTY_READING: ReadingForm = {
  date: '',
  dateApproximate: '',
  counts: '',
  longestShoot: '',
  dieback: '',
  removed: '',
  kept: '',
  note: '',
};

/** An entry's content as it stands in the fields, in the reader's units. */
export function formFrom(content: EntryContent, units: Units): EntryForm {
  const { place } = content;
  return {
    title: content.title ?? '',
    species: content.species ?? '',
    speciesTyped: '',
    cultivar: content.cultivar ?? '',
    orchard: content.orchard ?? '',
    tree: content.tree ?? '',
    sun: place.sun ?? '',
    wind: place.wind ?? '',
    water: place.water ?? '',
    elevation: elevationForField(place.elevation, units),
    cut: cutForm(content.cut, units),
    readings: Object.fromEntries(
      content.readings.map((reading) => [reading.id, readingForm(reading, units)]),
    ),
  };
}

export function cutForm(cut: EntryContent['cut'], units: Units): CutForm {
  return {
    date: cut.date ?? '',
    dateApproximate: cut.dateApproximate ?? '',
    kind: cut.kind ?? '',
    severity: cut.severity,
    severityEstimated: cut.severityEstimated,
    tip: cut.tip ?? '',
    branches: number(cut.branches),
    intensity: cut.intensity === null ? '' : String(Number((cut.intensity * 100).toFixed(4))),
    removedLength: formatForField(cut.removedLength, lengthField(units, 'long')),
    retainedLength: formatForField(cut.retainedLength, lengthField(units, 'long')),
    diameter: formatForField(cut.diameter, lengthField(units, 'short')),
    stage: cut.stage ?? '',
    aim: cut.aim ?? '',
  };
}

export function readingForm(reading: Reading, units: Units): ReadingForm {
  return {
    date: reading.date ?? '',
    dateApproximate: reading.dateApproximate ?? '',
    counts: formatCounts(countedOf(reading)),
    longestShoot: formatForField(reading.longestShoot, lengthField(units, 'short')),
    dieback: formatForField(reading.dieback, lengthField(units, 'short')),
    removed: number(reading.removed),
    kept: number(reading.kept),
    note: reading.note ?? '',
  };
}

function countedOf({ counts, total, branches }: Reading): Counted | null {
  if (counts) return { counts };
  return total !== null && branches !== null ? { total, branches } : null;
}

function number(value: number | null): string {
  return value === null ? '' : String(value);
}
