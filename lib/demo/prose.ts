import type { EntryContent, Reading } from '@/lib/entries/schema';
import {
  ABOUT_CROPS,
  CUT_MADE,
  LESSON,
  ONE_BRANCH,
  PLACE_SAID,
  SAP_GENERA,
  SAP_SAID,
  SEEN,
  SIDES_HEADED,
  TIP_LEFT,
  WHY,
} from './prose-parts';
import type { Random } from './random';
import { ringSpecies } from './species';
import type { DocNode } from './types';

/** A short document around the blocks of that entry; whatever it says follows from the entry's own values. */
export function writeDocument(random: Random, content: EntryContent): DocNode {
  const style = random.weighted(
    ['blocks', 'note', 'diary', 'headed', 'listed'] as const,
    (name) => STYLES[name],
  );
  const before = sentences(random, content);
  const seen = content.readings.map((reading, index) =>
    sayReading(random, reading, content.readings[index - 1]),
  );
  const lesson = random.chance(0.3) ? [random.pick(LESSON)] : [];
  const blocks = content.readings.map(readingBlock);
  const told = content.readings.flatMap((reading, index) => [
    readingBlock(reading),
    ...paragraphs(seen[index] ?? [], random.chance(0.75)),
  ]);
  switch (style) {
    case 'blocks':
      return doc([CUT_BLOCK, ...blocks]);
    case 'note':
      return doc([CUT_BLOCK, ...paragraphs(before), ...blocks, ...paragraphs(lesson)]);
    case 'diary':
      return doc([...paragraphs(before), CUT_BLOCK, ...told, ...paragraphs(lesson)]);
    case 'headed':
      return doc([
        heading(random.pick(['The cut', 'What I did', 'Cut'])),
        CUT_BLOCK,
        ...paragraphs(before),
        heading(random.pick(['What came', 'The flush', 'Since then'])),
        ...told,
        ...paragraphs(lesson),
      ]);
    case 'listed':
      return doc([
        CUT_BLOCK,
        ...bullets(before),
        ...blocks,
        ...paragraphs([...(seen.at(-1) ?? []), ...lesson]),
      ]);
  }
}

const STYLES = { blocks: 24, note: 24, diary: 30, headed: 12, listed: 10 } as const;

export const CUT_BLOCK: DocNode = { type: 'cut' };

export function readingBlock({ id }: { id: string }): DocNode {
  return { type: 'reading', attrs: { id } };
}

export function doc(content: DocNode[]): DocNode {
  return { type: 'doc', content };
}

export function paragraph(text: string): DocNode {
  return { type: 'paragraph', content: [{ type: 'text', text }] };
}

function paragraphs(said: readonly string[], wanted = true): DocNode[] {
  return said.length > 0 && wanted ? [paragraph(said.join(' '))] : [];
}

function heading(text: string): DocNode {
  return { type: 'heading', attrs: { level: 2 }, content: [{ type: 'text', text }] };
}

function bullets(said: readonly string[]): DocNode[] {
  if (said.length === 0) return [];
  return [
    { type: 'bulletList', content: said.map((text) => ({ type: 'listItem', content: [paragraph(text)] })) },
  ];
}

/** Why, how and where, from what is known of them. */
function sentences(random: Random, { cut, place, species }: EntryContent): string[] {
  const grown = species === null ? null : ringSpecies(species);
  const said: string[] = [];
  const reasons = cut.aim ? WHY[cut.aim].filter((reason) => grown?.bears || !ABOUT_CROPS.test(reason)) : [];
  if (reasons.length > 0) said.push(random.pick(reasons).replace('{tree}', grown?.name ?? 'tree'));
  const alone = cut.branches === 1;
  if (cut.kind) said.push(random.pick(alone ? ONE_BRANCH : howMade(cut.kind, cut.tip)));
  if (!alone && cut.tip && cut.kind !== 'none' && cut.kind !== 'coppicing' && random.chance(0.5))
    said.push(random.pick(TIP_LEFT[cut.tip]));
  const wet = cut.kind !== 'none' && SAP_GENERA.has(grown?.genus ?? '');
  if (wet && random.chance(0.35)) said.push(random.pick(SAP_SAID));
  const where = random.pick(['sun', 'water', 'wind'] as const);
  if (random.chance(0.35)) said.push(...placeSaid(random, where, place));
  return said;
}

function howMade(
  kind: NonNullable<EntryContent['cut']['kind']>,
  tip: EntryContent['cut']['tip'],
): readonly string[] {
  return kind === 'heading' && tip === 'kept' ? SIDES_HEADED : CUT_MADE[kind];
}

function placeSaid(random: Random, where: 'sun' | 'water' | 'wind', place: EntryContent['place']): string[] {
  if (where === 'sun') return place.sun ? [random.pick(PLACE_SAID.sun[place.sun])] : [];
  if (where === 'water') return place.water ? [random.pick(PLACE_SAID.water[place.water])] : [];
  return place.wind ? [random.pick(PLACE_SAID.wind[place.wind])] : [];
}

/** What a visit showed against the one before it. */
function sayReading(random: Random, reading: Reading, before: Reading | undefined): string[] {
  const counts = (reading.counts ?? []).filter((count) => count !== null);
  const rate = rateOf(reading);
  const said: string[] = [];
  const afterThinning = (before?.removed ?? 0) > 0;
  if (afterThinning) said.push(random.pick(SEEN.after));
  else if (rate === 0) said.push(random.pick(SEEN.nothing));
  else if (!before) said.push(random.pick(SEEN.first));
  else said.push(random.pick(SEEN[trend(rateOf(before), rate)]));
  if (rate > 0 && counts.length >= 3 && random.chance(0.5)) {
    const most = Math.max(...counts);
    const least = Math.min(...counts);
    if (least === 0) said.push(random.pick(SEEN.bare));
    else if (most > 0.6 * sum(counts)) said.push(SEEN.uneven[0]);
    else if (most >= 3 * least) said.push(random.pick(SEEN.uneven.slice(1)));
    else if (most <= 1.5 * least) said.push(random.pick(SEEN.even));
  }
  const lost = lostOn(reading);
  if (lost === 1 && lostOn(before) === 0 && before) said.push(random.pick(SEEN.lost));
  if ((reading.removed ?? 0) > 0) said.push(random.pick(SEEN.thinned));
  return said;
}

function trend(before: number, now: number): 'rising' | 'level' | 'falling' {
  if (now > before * 1.2) return 'rising';
  return now < before * 0.85 ? 'falling' : 'level';
}

function lostOn(reading: Reading | undefined): number {
  return (reading?.counts ?? []).filter((count) => count === null).length;
}

function rateOf({ counts, total, branches }: Reading): number {
  if (counts) {
    const seen = counts.filter((count) => count !== null);
    return seen.length === 0 ? 0 : sum(seen) / seen.length;
  }
  return (total ?? 0) / (branches ?? 1);
}

function sum(counts: readonly number[]): number {
  return counts.reduce((total, count) => total + count, 0);
}
