import type { EntryContent, Reading } from '@/lib/entries/schema';
import { addDays, evening, latestDay } from './calendar';
import { emptyReading } from './flush';
import { demoId } from './ids';
import { SETTLED_DAYS, type OrchardsWork } from './orchards-work';
import type { Random } from './random';
import { ringSpecies } from './species';
import type { DemoEntry, DocNode, Handwritten } from './types';

/**
 * Gives a handwritten entry its year, its tree and its ids. The year is the latest in which its last reading is past.
 * @throws Error naming the file where its writer is not of the ring.
 */
export function placeHandwritten(random: Random, work: OrchardsWork, text: Handwritten): DemoEntry {
  const writer = work.ring.people.find(({ name }) => name === text.writer);
  const orchard = work.ring.orchards.find(({ ownerId }) => ownerId === writer?.id);
  if (!writer || !orchard) throw new Error(`${text.slug}: ${text.writer} has no orchard in the ring`);
  const lastDay = text.readings.at(-1)?.days ?? 0;
  const date = latestDay(text.day, addDays(work.today, -lastDay - SETTLED_DAYS));
  const tree = work.tree(random, orchard, ringSpecies(text.species), text.tree);
  tree.cultivar = text.cultivar;
  tree.yearPlanted = text.planted;
  const readings = text.readings.map(({ days, ...measured }): Reading => ({
    ...emptyReading(random, addDays(date, days), work.today),
    ...measured,
  }));
  const content: EntryContent = {
    title: text.title,
    species: text.species,
    cultivar: text.cultivar,
    orchard: orchard.id,
    tree: tree.id,
    place: { ...text.place, elevation: orchard.elevationM },
    cut: { ...text.cut, date, dateApproximate: null },
    readings,
    doc: withIds(text.doc, readings),
    schemaVersion: 1,
  };
  const createdAt = evening(date, random.whole(0, 200), work.today);
  const last = addDays(date, lastDay);
  return {
    id: demoId(random, createdAt),
    ownerId: writer.id,
    origin: 'handwritten',
    status: 'accepted',
    content,
    pending: null,
    returnedNote: null,
    readBy: readings.map(() => writer.id),
    createdAt,
    savedAt: evening(last, 60, work.today),
    waitingSince: null,
    acceptedAt: evening(addDays(last, 2), 30, work.today),
  };
}

function withIds(node: DocNode, readings: readonly Reading[]): DocNode {
  if (node.type === 'reading') {
    const reading = readings[Number(node.attrs?.id) - 1];
    if (!reading) throw new Error(`there is no reading ${String(node.attrs?.id)}`);
    return { type: 'reading', attrs: { id: reading.id } };
  }
  return node.content ? { ...node, content: node.content.map((child) => withIds(child, readings)) } : node;
}
