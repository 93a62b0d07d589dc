import type { EntryContent } from '@/lib/entries/schema';
import type { FieldError } from '@/lib/errors/errors';

/** Server paths count readings; here each goes by its id, so that a message stays with its field. */
export function withIds(errors: readonly FieldError[], content: EntryContent): FieldError[] {
  return errors.map(({ path, message }) => {
    const dotted = path
      .replace(/\[(\d+)\]/g, '.$1')
      .replace(/\//g, '.')
      .replace(/^\./, '');
    const counted = /^readings\.(\d+)(?=\.|$)/.exec(dotted);
    const reading = counted ? content.readings[Number(counted[1])] : undefined;
    return {
      path: counted && reading ? dotted.replace(counted[0], `readings.${reading.id}`) : dotted,
      message,
    };
  });
}

/** Of what the bench asked for, that which is still not there. */
export function stillLacking(lacks: readonly FieldError[], content: EntryContent): readonly FieldError[] {
  const left = lacks.filter(({ path }) => isMissing(path, content));
  return left.length === lacks.length ? lacks : left;
}

function isMissing(path: string, content: EntryContent): boolean {
  if (path === 'readings') return content.readings.length === 0;
  const [, id, name = ''] = /^readings\.([^.]+)\.(\w+)/.exec(path) ?? [];
  const reading = content.readings.find((one) => one.id === id);
  if (id)
    return (
      reading !== undefined &&
      valueAt(reading, name) === null &&
      !(name === 'counts' && reading.total !== null)
    );
  const [group = '', field] = path.split('.');
  const value = valueAt(content, group);
  return (field && typeof value === 'object' && value !== null ? valueAt(value, field) : value) === null;
}

function valueAt(object: object, key: string): unknown {
  return Object.entries(object).find(([name]) => name === key)?.[1] ?? null;
}

/** The field a path is shown at: the length of a list or one count of many stand at the field they are typed in. */
export function fieldOf(path: string): string {
  const reading = /^readings\.([^.]+)\.(counts|total|branches)\b/.exec(path);
  if (reading) return `readings.${reading[1]}.counts`;
  if (path.startsWith('doc')) return 'doc';
  if (path === 'place') return 'place.sun';
  return path;
}

/** The id of the element in which a field is typed. */
export function fieldId(path: string): string {
  return `field-${path.replace(/\./g, '-')}`;
}

const NAMES: Readonly<Record<string, string>> = {
  title: 'Title',
  species: 'Species',
  cultivar: 'Cultivar',
  orchard: 'Orchard',
  tree: 'Tree',
  'place.sun': 'Sun',
  'place.wind': 'Wind',
  'place.water': 'Water',
  'place.elevation': 'Height above the sea',
  'cut.date': 'Date of the cut',
  'cut.dateApproximate': 'How well the date of the cut is known',
  'cut.kind': 'Kind of cut',
  'cut.severity': 'How much came off',
  'cut.severityEstimated': 'Only the class known',
  'cut.tip': 'Tip',
  'cut.branches': 'Branches marked',
  'cut.intensity': 'Share of the limbs cut',
  'cut.removedLength': 'Length taken',
  'cut.retainedLength': 'Length left',
  'cut.diameter': 'Thickness at the cut',
  'cut.stage': 'Stage',
  'cut.aim': 'Aim',
  readings: 'Readings',
  doc: 'The prose',
  schemaVersion: 'Version of the document',
};

const READING_NAMES: Readonly<Record<string, string>> = {
  date: 'date',
  dateApproximate: 'how well its date is known',
  counts: 'shoots on each branch',
  longestShoot: 'longest shoot',
  dieback: 'dieback',
  removed: 'shoots taken off',
  kept: 'shoots kept',
  note: 'note',
};

/** What a field is called where it is spoken of away from its place: "Reading 2, longest shoot". */
export function fieldName(path: string, readingIds: readonly string[]): string {
  const [, id, name] = /^readings\.([^.]+)\.?(.*)$/.exec(path) ?? [];
  if (id === undefined) return NAMES[path] ?? path;
  const number = readingIds.indexOf(id) + 1;
  const reading = number > 0 ? `Reading ${number}` : 'A reading';
  return name ? `${reading}, ${READING_NAMES[name] ?? name}` : reading;
}
