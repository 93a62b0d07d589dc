import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import { parseCounts } from '@/lib/counts/parse';
import { AIMS, KINDS, STAGES, SUN, WATER, WIND } from '@/lib/entries/schema';
import { roundSeverity, severityFromLengths } from '@/lib/severity/severity';
import { documentOf } from './markdown-document';
import type { Handwritten } from './types';

const FOLDER = join(process.cwd(), 'content', 'demo');

const number = z.coerce.number().min(0);
const orNull = <T extends z.ZodType>(schema: T) => schema.optional().transform((value) => value ?? null);

/** The lines above the prose of content/demo/*.md: `name: value`, lengths in metres. */
const Head = z.strictObject({
  title: z.string().max(200),
  writer: z.string(),
  species: z.string(),
  cultivar: orNull(z.string()),
  tree: z.string().max(80),
  planted: orNull(z.coerce.number().int()),
  sun: z.enum(SUN),
  wind: z.enum(WIND),
  water: z.enum(WATER),
  day: z.string().regex(/^\d\d-\d\d$/, 'must be month and day, such as 02-11'),
  kind: z.enum(KINDS),
  tip: z.enum(['kept', 'removed']),
  branches: z.coerce.number().int().min(1),
  took: orNull(number),
  left: orNull(number),
  severity: orNull(number.max(1)),
  estimated: z.literal('yes').optional().transform(Boolean),
  intensity: orNull(number.max(1)),
  diameter: orNull(number),
  stage: z.enum(STAGES),
  aim: orNull(z.enum(AIMS)),
});

/** A line `reading: 57 days; 9 4 12 - 7; longest 0.41; dieback 0; removed 20; kept 12; note …`. */
const Visit = z.strictObject({
  longest: orNull(number),
  dieback: orNull(number),
  removed: orNull(number.int()),
  kept: orNull(number.int()),
  note: orNull(z.string()),
});

/** The entries written by hand, in order of their files' names. */
export function readHandwritten(folder = FOLDER): Handwritten[] {
  return readdirSync(folder)
    .filter((name) => name.endsWith('.md'))
    .sort()
    .map((name) => parseHandwritten(name.replace(/\.md$/, ''), readFileSync(join(folder, name), 'utf8')));
}

/** @throws Error naming the entry and what cannot be read in it. */
export function parseHandwritten(slug: string, text: string): Handwritten {
  const [, head, body] = /^---\n([\s\S]*?)\n---\n([\s\S]*)$/.exec(text) ?? [];
  if (head === undefined || body === undefined)
    throw new Error(`${slug}: there is no head between two lines of ---`);
  const lines = head.split('\n').map((line) => {
    const colon = line.indexOf(':');
    if (colon < 1) throw new Error(`${slug}: "${line}" is not "name: value"`);
    return [line.slice(0, colon).trim(), line.slice(colon + 1).trim()] as const;
  });
  const parsed = Head.safeParse(Object.fromEntries(lines.filter(([name]) => name !== 'reading')));
  if (!parsed.success) throw new Error(`${slug}: ${z.prettifyError(parsed.error)}`);
  const { title, writer, species, cultivar, tree, planted, day, sun, wind, water, ...cut } = parsed.data;
  const readings = lines
    .filter(([name]) => name === 'reading')
    .map(([, value]) => visit(slug, value, cut.branches));
  return {
    slug,
    title,
    writer,
    species,
    cultivar,
    tree,
    planted,
    place: { sun, wind, water },
    day,
    cut: cutOf(slug, cut),
    readings,
    doc: documentOf(body, readings.length),
  };
}

type CutLines = Pick<
  z.output<typeof Head>,
  | 'kind'
  | 'tip'
  | 'branches'
  | 'took'
  | 'left'
  | 'severity'
  | 'estimated'
  | 'intensity'
  | 'diameter'
  | 'stage'
  | 'aim'
>;

function cutOf(slug: string, { took, left, severity, estimated, ...cut }: CutLines): Handwritten['cut'] {
  const byTape =
    cut.tip === 'removed' && took !== null && left !== null ? severityFromLengths(took, left) : null;
  const depth = byTape ?? severity ?? (cut.kind === 'none' ? 0 : null);
  if (depth === null) throw new Error(`${slug}: say took and left, or severity`);
  return {
    kind: cut.kind,
    severity: roundSeverity(depth),
    severityEstimated: estimated,
    tip: cut.tip,
    branches: cut.branches,
    intensity: cut.intensity,
    removedLength: took,
    retainedLength: left,
    diameter: cut.diameter,
    stage: cut.stage,
    aim: cut.aim,
  };
}

function visit(slug: string, line: string, marked: number): Handwritten['readings'][number] {
  const [when = '', typed = '', ...rest] = line.split(';').map((part) => part.trim());
  const days = /^(\d+) days$/.exec(when)?.[1];
  const counted = parseCounts(typed, marked);
  const noted = Visit.safeParse(Object.fromEntries(rest.map((part) => part.split(/ (.*)/s).slice(0, 2))));
  if (days === undefined || !counted.ok || counted.value === null || !noted.success) {
    throw new Error(`${slug}: the reading "${line}" cannot be read`);
  }
  return {
    days: Number(days),
    counts: 'counts' in counted.value ? [...counted.value.counts] : null,
    total: 'total' in counted.value ? counted.value.total : null,
    branches: 'branches' in counted.value ? counted.value.branches : null,
    longestShoot: noted.data.longest,
    dieback: noted.data.dieback,
    removed: noted.data.removed,
    kept: noted.data.kept,
    note: noted.data.note,
  };
}
