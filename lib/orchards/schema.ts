import { z } from 'zod';
import { SUN, WATER, WIND } from '@/lib/entries/schema';

/** The one definition of an orchard's and a tree's shape and bounds. Degrees, metres. */
const PRINTABLE = /^\P{Cc}*$/u;
export const EARLIEST_PLANTING = 1000;

const line = (most: number) =>
  z
    .string('must be text')
    .trim()
    .max(most, `must have at most ${most} characters`)
    .regex(PRINTABLE, 'must be one line without control characters');

/** A number in bounds, rounded to what is stored of it, so that what is read back is what was sent. */
const rounded = (low: number, high: number, unit: string, steps: number) =>
  z
    .number(`must be a number from ${low} to ${high}${unit}`)
    .min(low, `must be ${low}${unit} or more`)
    .max(high, `must be ${high}${unit} or less`)
    // Adding 0 turns -0 into 0, which is how it comes back.
    .transform((value) => Math.round(value * steps) / steps + 0);

const oneOf = <const T extends readonly [string, ...string[]]>(values: T) =>
  z.enum(values, `must be one of ${values.join(', ')}`);

/** A zone of the IANA time zone database that this server knows. */
export function isTimeZone(name: string): boolean {
  if (!/^[A-Za-z][A-Za-z0-9_+/-]*$/.test(name)) return false;
  try {
    return new Intl.DateTimeFormat('en', { timeZone: name }) instanceof Intl.DateTimeFormat;
  } catch {
    return false;
  }
}

export const Place = z.strictObject(
  { sun: oneOf(SUN), wind: oneOf(WIND), water: oneOf(WATER) },
  'must say sun, wind and water',
);

export const OrchardBody = z.strictObject({
  name: line(120).min(1, 'is needed'),
  latitude: rounded(-90, 90, '°', 1e6),
  longitude: rounded(-180, 180, '°', 1e6),
  elevation: rounded(-500, 9000, ' m', 10).nullable().default(null),
  timeZone: z
    .string('must be text')
    .max(64, 'must have at most 64 characters')
    .refine(isTimeZone, 'must be a time zone such as Europe/Lisbon or Etc/UTC')
    .default('Etc/UTC'),
  place: Place,
});
export type OrchardBody = z.output<typeof OrchardBody>;

export const TreeBody = z.strictObject({
  label: line(80).min(1, 'is needed'),
  species: z.string('must be text').max(80, 'must have at most 80 characters').nullable().default(null),
  cultivar: line(120)
    .nullable()
    .default(null)
    .transform((text) => text || null),
  yearPlanted: z
    .number('must be a year')
    .int('must be a whole year')
    .min(EARLIEST_PLANTING, `must be ${EARLIEST_PLANTING} or later`)
    .refine((year) => year <= new Date().getUTCFullYear() + 1, 'must not be later than next year')
    .nullable()
    .default(null),
});
export type TreeBody = z.output<typeof TreeBody>;

export const Tree = z.object({
  id: z.string(),
  revision: z.number().int(),
  label: z.string(),
  species: z.string().nullable(),
  cultivar: z.string().nullable(),
  yearPlanted: z.number().int().nullable(),
});
export type Tree = z.output<typeof Tree>;

/** An orchard as its members see it. */
export const Orchard = z.object({
  id: z.string(),
  revision: z.number().int(),
  /** The owner's display name. */
  owner: z.string(),
  /** What the person who asks is here. */
  role: z.enum(['owner', 'helper']),
  createdAt: z.string(),
  updatedAt: z.string(),
  name: z.string(),
  latitude: z.number().nullable(),
  longitude: z.number().nullable(),
  elevation: z.number().nullable(),
  timeZone: z.string(),
  place: z.object({
    sun: z.enum(SUN).nullable(),
    wind: z.enum(WIND).nullable(),
    water: z.enum(WATER).nullable(),
  }),
});
export type Orchard = z.output<typeof Orchard>;

export const OrchardWithTrees = Orchard.extend({ trees: z.array(Tree) });
export type OrchardWithTrees = z.output<typeof OrchardWithTrees>;

export const Member = z.object({ id: z.string(), name: z.string(), role: z.enum(['owner', 'helper']) });
export type Member = z.output<typeof Member>;
