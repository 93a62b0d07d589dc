import { z } from 'zod';
import { SCHEMA_VERSION } from '@/lib/documents/schema';

/** The one definition of an entry's shape and bounds. Units are SI: metres, dates ISO 8601, shares 0 to 1. */
export const KINDS = ['heading', 'reduction', 'thinning', 'pollarding', 'coppicing', 'none'] as const;
export const STAGES = ['dormant', 'bud-break', 'growing', 'flowering', 'fruiting', 'after-harvest'] as const;
export const AIMS = ['size', 'width', 'fruit', 'shade', 'shape', 'health', 'rejuvenation', 'other'] as const;
export const SUN = ['full', 'part', 'shade'] as const;
export const WIND = ['sheltered', 'breezy', 'exposed'] as const;
export const WATER = ['dry', 'moderate', 'wet'] as const;
export const STATUSES = ['draft', 'waiting', 'returned', 'accepted', 'withdrawn', 'merged'] as const;
export const APPROXIMATE = ['month', 'season'] as const;
export const MOST_BRANCHES = 500;
export const MOST_SHOOTS = 999;

export type EntryStatus = (typeof STATUSES)[number];

export const Uuid = z
  .string('must be a UUID')
  .regex(/^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i, 'must be a UUID')
  .transform((id) => id.toLowerCase());

const oneOf = <const T extends readonly [string, ...string[]]>(values: T) =>
  z.enum(values, `must be one of ${values.join(', ')}`);
const between = (low: number, high: number, unit = '') =>
  z
    .number(`must be a number from ${low} to ${high}${unit}`)
    .min(low, `must be ${low}${unit} or more`)
    .max(high, `must be ${high}${unit} or less`);
const whole = (low: number, high: number) =>
  between(low, high).int(`must be a whole number from ${low} to ${high}`);
const text = (most: number) =>
  z
    .string('must be text')
    .max(most, `must have at most ${most} characters`)
    .regex(/^[^\u0000-\u0008\u000b\u000c\u000e-\u001f]*$/, 'must not hold control characters');
const left = <T extends z.ZodType>(schema: T) => schema.nullable().default(null as never);

/** Micrometre, so that what is stored is what is read back. */
const metres = (most: number) => between(0, most, ' m').transform((value) => Math.round(value * 1e6) / 1e6);
const share = between(0, 1).transform((value) => Math.round(value * 1e6) / 1e6);

export const IsoDate = z.iso
  .date('must be a date such as 2026-03-03')
  .refine((date) => date >= '1900-01-01', 'must be in 1900 or later');

export const Place = z.strictObject({
  sun: left(oneOf(SUN)),
  wind: left(oneOf(WIND)),
  water: left(oneOf(WATER)),
  elevation: left(between(-500, 9000, ' m').transform((value) => Math.round(value * 10) / 10)),
});

export const Cut = z.strictObject({
  date: left(IsoDate),
  dateApproximate: left(oneOf(APPROXIMATE)),
  kind: left(oneOf(KINDS)),
  severity: left(share),
  severityEstimated: z
    .boolean('must be true or false')
    .nullable()
    .default(false)
    .transform((value) => value ?? false),
  tip: left(oneOf(['kept', 'removed'])),
  branches: left(whole(1, MOST_BRANCHES)),
  intensity: left(share),
  removedLength: left(metres(100)),
  retainedLength: left(metres(100)),
  diameter: left(metres(5)),
  stage: left(oneOf(STAGES)),
  aim: left(oneOf(AIMS)),
});

const measured = {
  date: left(IsoDate),
  dateApproximate: left(oneOf(APPROXIMATE)),
  counts: left(
    z
      .array(
        z.union(
          [whole(0, MOST_SHOOTS), z.null()],
          `must be a whole number from 0 to ${MOST_SHOOTS}, or null`,
        ),
      )
      .min(1, 'must hold at least one branch')
      .max(MOST_BRANCHES, `must hold at most ${MOST_BRANCHES} branches`),
  ),
  total: left(whole(0, MOST_SHOOTS * MOST_BRANCHES)),
  branches: left(whole(1, MOST_BRANCHES)),
  longestShoot: left(metres(100)),
  dieback: left(metres(100)),
  removed: left(whole(0, MOST_SHOOTS * MOST_BRANCHES)),
  kept: left(whole(0, MOST_SHOOTS * MOST_BRANCHES)),
  note: left(text(2000)),
};

export const Reading = z.strictObject({ id: Uuid, ...measured });
/** A reading's own body: the address says which. */
export const ReadingBody = z.strictObject({ id: Uuid.optional(), ...measured });

const emptyPlace = { sun: null, wind: null, water: null, elevation: null };
const emptyCut = Cut.parse({});

export const EntryBody = z.strictObject({
  title: left(text(200)),
  species: left(text(80)),
  cultivar: left(text(120)),
  orchard: left(Uuid),
  tree: left(Uuid),
  place: Place.nullable()
    .default(null)
    .transform((place) => place ?? emptyPlace),
  cut: Cut.nullable()
    .default(null)
    .transform((cut) => cut ?? emptyCut),
  readings: z.array(Reading).max(200, 'must hold at most 200 readings').optional(),
  doc: z
    .record(z.string(), z.unknown(), 'must be a document')
    .nullable()
    .default(null)
    .transform((doc) => doc ?? { type: 'doc', content: [] }),
  // A document of another version is refused, so that nothing in it is lost unseen.
  schemaVersion: z
    .literal(SCHEMA_VERSION, `must be ${SCHEMA_VERSION}, the document version known here`)
    .default(SCHEMA_VERSION),
});

export type EntryBody = z.output<typeof EntryBody>;
export type Reading = z.output<typeof Reading>;
export type ReadingBody = z.output<typeof ReadingBody>;
export type Cut = z.output<typeof Cut>;
/** All that a person writes into an entry, complete with its readings. */
export type EntryContent = Omit<EntryBody, 'readings'> & { readings: Reading[] };

/** What a submitted or accepted entry looks like from outside. */
export const EntryView = z.object({
  id: z.string(),
  status: z.enum(STATUSES),
  revision: z.number().int(),
  pending: z.boolean().optional(),
  returnedNote: z.string().nullable().optional(),
  owner: z.string(),
  mine: z.boolean(),
  createdAt: z.string(),
  updatedAt: z.string(),
  title: z.string().nullable(),
  species: z.string().nullable(),
  cultivar: z.string().nullable(),
  orchard: z.string().nullable().optional(),
  tree: z.string().nullable().optional(),
  cell: z.object({ latitude: z.number(), longitude: z.number() }).nullable().optional(),
  place: z.object({
    sun: z.enum(SUN).nullable(),
    wind: z.enum(WIND).nullable(),
    water: z.enum(WATER).nullable(),
    elevation: z.number().nullable(),
  }),
  class: z.enum(['uncut', 'light', 'moderate', 'heavy', 'severe']).nullable(),
  cut: z.object({
    date: z.string().nullable(),
    dateApproximate: z.enum(APPROXIMATE).nullable(),
    kind: z.enum(KINDS).nullable(),
    severity: z.number().nullable(),
    severityEstimated: z.boolean(),
    tip: z.enum(['kept', 'removed']).nullable(),
    branches: z.number().nullable(),
    intensity: z.number().nullable(),
    removedLength: z.number().nullable(),
    retainedLength: z.number().nullable(),
    diameter: z.number().nullable(),
    stage: z.enum(STAGES).nullable(),
    aim: z.enum(AIMS).nullable(),
  }),
  readings: z.array(
    z.object({
      id: z.string(),
      revision: z.number().int(),
      date: z.string().nullable(),
      dateApproximate: z.enum(APPROXIMATE).nullable(),
      weeks: z.number().nullable(),
      counts: z.array(z.number().nullable()).nullable(),
      total: z.number().nullable(),
      branches: z.number().nullable(),
      longestShoot: z.number().nullable(),
      dieback: z.number().nullable(),
      removed: z.number().nullable(),
      kept: z.number().nullable(),
      note: z.string().nullable(),
      thinned: z.boolean(),
      setAside: z.boolean(),
    }),
  ),
  doc: z.record(z.string(), z.unknown()),
  schemaVersion: z.number().int(),
  credits: z.array(z.object({ name: z.string() })),
});
export type EntryView = z.output<typeof EntryView>;
export type ReadingView = EntryView['readings'][number];
