import { MOST_BRANCHES, parseCounts } from '@/lib/counts/parse';
import type { EntryContent, Reading } from '@/lib/entries/schema';
import type { FieldError } from '@/lib/errors/errors';
import { CLASS_TOLERANCE } from '@/lib/severity/severity';
import { parseElevation } from '@/lib/units/elevation';
import { lengthField, type Field, type Units } from '@/lib/units/units';
import { dateInWords } from '@/lib/words/words';
import { EMPTY_READING_CONTENT, inOrder } from './content';
import { EMPTY_READING, formFrom, readingForm, type EntryForm, type ReadingForm } from './form';
import {
  fromParsed,
  readChoice,
  readDate,
  readLength,
  readPercent,
  readText,
  readWhole,
  type FieldReading,
} from './read-fields';

export interface Written {
  readonly content: EntryContent;
  /** What cannot be stored as typed. Its field's stored value stands in for it in `content`. */
  readonly problems: readonly FieldError[];
}

const MOST_TAKEN = 999 * MOST_BRANCHES;
const MOST_DIAMETER_M = 5;

/**
 * What is to be stored, out of what stands in the fields. A field that cannot be read yet is named in `problems`, by
 * path with a reading's id for its index, and keeps the value it has in `base`, so that all else can be saved.
 * A field that was not touched keeps its stored value to the last digit, whatever its unit rounds to.
 * @param readingIds the readings that stand in the document.
 */
export function contentFrom(
  form: EntryForm,
  readingIds: readonly string[],
  doc: Record<string, unknown>,
  base: EntryContent,
  units: Units,
  now: Date,
): Written {
  const problems: FieldError[] = [];
  const before = formFrom(base, units);
  const take = <T>(
    path: string,
    read: FieldReading<T>,
    typed: string,
    was: string,
    stored: T | null,
  ): T | null => {
    if (typed === was) return stored;
    if (!read.problem) return read.value;
    problems.push({ path, message: read.problem });
    return stored;
  };

  if (form.species === '' && form.speciesTyped.trim() !== '') {
    problems.push({
      path: 'species',
      message: 'Choose a species from the list; this one is not in the catalogue.',
    });
  }
  const elevation = fromParsed(parseElevation(form.elevation, units));
  const cut = cutFrom(form, before, base, units, now, take);
  const readings = readingIds.map((id) => {
    const stored = base.readings.find((reading) => reading.id === id) ?? { ...EMPTY_READING_CONTENT, id };
    const typed = form.readings[id] ?? EMPTY_READING;
    return readingFrom(typed, stored, cut.branches, units, now, take);
  });
  const content: EntryContent = {
    title: readText(form.title),
    species: form.species === '' && form.speciesTyped.trim() !== '' ? base.species : readChoice(form.species),
    cultivar: readText(form.cultivar),
    orchard: readChoice(form.orchard),
    tree: readChoice(form.tree),
    place: {
      sun: readChoice(form.sun),
      wind: readChoice(form.wind),
      water: readChoice(form.water),
      elevation: take('place.elevation', elevation, form.elevation, before.elevation, base.place.elevation),
    },
    cut,
    readings: inOrder(readings),
    doc,
    schemaVersion: 1,
  };
  return reconciled(content, base, problems);
}

type Take = <T>(
  path: string,
  read: FieldReading<T>,
  typed: string,
  was: string,
  stored: T | null,
) => T | null;

function cutFrom(
  form: EntryForm,
  before: EntryForm,
  base: EntryContent,
  units: Units,
  now: Date,
  take: Take,
) {
  const { cut: typed } = form;
  const { cut: was } = before;
  const { cut: stored } = base;
  const long = lengthField(units, 'long');
  const length = (name: 'removedLength' | 'retainedLength') =>
    take(`cut.${name}`, readLength(typed[name], long), typed[name], was[name], stored[name]);
  const uncut = typed.kind === 'none';
  const thick = readLength(typed.diameter, lengthField(units, 'short'), MOST_DIAMETER_M);
  return {
    date: take('cut.date', readDate(typed.date, now), typed.date, was.date, stored.date),
    dateApproximate: readChoice<'month' | 'season'>(typed.dateApproximate),
    kind: readChoice<NonNullable<EntryContent['cut']['kind']>>(typed.kind),
    severity: uncut ? 0 : typed.severity,
    severityEstimated: uncut ? false : typed.severityEstimated,
    tip: uncut ? ('kept' as const) : readChoice<'kept' | 'removed'>(typed.tip),
    branches: take(
      'cut.branches',
      readWhole(typed.branches, 1, MOST_BRANCHES),
      typed.branches,
      was.branches,
      stored.branches,
    ),
    intensity: take(
      'cut.intensity',
      readPercent(typed.intensity),
      typed.intensity,
      was.intensity,
      stored.intensity,
    ),
    removedLength: length('removedLength'),
    retainedLength: length('retainedLength'),
    diameter: take('cut.diameter', thick, typed.diameter, was.diameter, stored.diameter),
    stage: readChoice<NonNullable<EntryContent['cut']['stage']>>(typed.stage),
    aim: readChoice<NonNullable<EntryContent['cut']['aim']>>(typed.aim),
  };
}

function readingFrom(
  typed: ReadingForm,
  stored: Reading,
  marked: number | null,
  units: Units,
  now: Date,
  take: Take,
): Reading {
  const was = readingForm(stored, units);
  const path = `readings.${stored.id}`;
  const short = lengthField(units, 'short');
  const length = (name: 'longestShoot' | 'dieback', field: Field) =>
    take(`${path}.${name}`, readLength(typed[name], field), typed[name], was[name], stored[name]);
  const whole = (name: 'removed' | 'kept') =>
    take(`${path}.${name}`, readWhole(typed[name], 0, MOST_TAKEN), typed[name], was[name], stored[name]);
  const parsed = parseCounts(typed.counts, marked);
  const kept = { counts: stored.counts, total: stored.total, branches: stored.branches };
  const counted = take(
    `${path}.counts`,
    parsed.ok ? { value: shapeOf(parsed.value) } : { value: null, problem: parsed.message },
    typed.counts,
    // More counts than branches cannot stay, though nobody touched them: the branches were.
    parsed.ok ? was.counts : '\u0000',
    kept,
  );
  return {
    id: stored.id,
    date: take(`${path}.date`, readDate(typed.date, now), typed.date, was.date, stored.date),
    dateApproximate: readChoice<'month' | 'season'>(typed.dateApproximate),
    ...(counted ?? NOT_COUNTED),
    longestShoot: length('longestShoot', short),
    dieback: length('dieback', short),
    removed: whole('removed'),
    kept: whole('kept'),
    note: readText(typed.note),
  };
}

const NOT_COUNTED = { counts: null, total: null, branches: null };

function shapeOf(value: Extract<ReturnType<typeof parseCounts>, { ok: true }>['value']) {
  if (value === null) return NOT_COUNTED;
  if ('total' in value) return { counts: null, total: value.total, branches: value.branches };
  return { counts: [...value.counts], total: null, branches: null };
}

/** Where two fields contradict each other, both keep what is stored, which is known to agree. */
function reconciled(content: EntryContent, base: EntryContent, problems: FieldError[]): Written {
  const baseReading = (id: string) => base.readings.find((reading) => reading.id === id);
  let { cut, readings } = content;

  const early = readings.filter(({ date }) => date && cut.date && date < cut.date);
  for (const { id } of early) {
    problems.push({
      path: `readings.${id}.date`,
      message: `This lies before the cut of ${dateInWords(cut.date ?? '')}.`,
    });
  }
  if (early.length > 0) {
    cut = { ...cut, date: base.cut.date };
    readings = readings.map((reading) => ({ ...reading, date: baseReading(reading.id)?.date ?? null }));
  }

  const over = readings.some(
    (reading) => cut.branches !== null && (reading.counts?.length ?? reading.branches ?? 0) > cut.branches,
  );
  if (over) {
    cut = { ...cut, branches: base.cut.branches };
    readings = readings.map((reading) => {
      const { counts, total, branches } = baseReading(reading.id) ?? EMPTY_READING_CONTENT;
      return { ...reading, counts, total, branches };
    });
  }

  if (cut.severity !== null && cut.severity <= CLASS_TOLERANCE && cut.kind !== 'none') {
    problems.push({
      path: 'cut.severity',
      message: 'Too little to be told from no cut. Move it, or choose “uncut control” as the kind.',
    });
    const { kind, severity, severityEstimated, tip } = base.cut;
    cut = { ...cut, kind, severity, severityEstimated, tip };
  }
  return { content: { ...content, cut, readings: inOrder(readings) }, problems };
}
