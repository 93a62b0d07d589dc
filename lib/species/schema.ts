import { z } from 'zod';

/** The shape of one file of content/species, as a horticulturist edits it. */
const oneOf = <const T extends readonly [string, ...string[]]>(values: T) =>
  z.enum(values, `must be one of ${values.join(', ')}`);
const words = z.string('must be text').trim().min(1, 'must not be empty');
const sources = z.array(words, 'must be a list of source keys').min(1, 'must name a source, or memory');

export const GROUPS = [
  'tropical-fruit',
  'temperate-fruit',
  'nut',
  'citrus',
  'agroforestry',
  'coppice-and-hedge',
  'ornamental',
  'conifer',
  'palm',
] as const;
export const CAUTION_CODES = [
  'latex',
  'sap-irritant',
  'urushiol',
  'thorns',
  'toxic',
  'silver-leaf',
  'fire-blight',
  'bleeding-sap',
  'brittle',
  'protected-often',
] as const;

export const SpeciesFile = z.strictObject({
  scientific: words,
  family: words.regex(/aceae$/, 'must be a family name, ending in aceae'),
  genus: words,
  synonyms: z.array(words, 'must be a list of names'),
  names: z.record(
    z.string().regex(/^[a-z]{2,3}$/, 'must be a language code such as en, es, haw'),
    z.array(words, 'must be a list of names').min(1, 'must hold a name, or be left out'),
  ),
  group: oneOf(GROUPS),
  habit: oneOf(['tree', 'shrub', 'palm', 'vine']),
  woodDensity: z
    .strictObject({
      /** Oven-dry mass over fresh volume, g/cm3. */
      value: z
        .number('must be a number in g/cm3')
        .min(0.1, 'must be 0.1 or more')
        .max(1.3, 'must be 1.3 or less'),
      /** Records at level species, congeners at level genus. */
      records: z.number('must be a whole number').int('must be a whole number').min(1, 'must be 1 or more'),
      level: oneOf(['species', 'genus']),
      source: words,
    })
    .nullable(),
  resprouts: z.strictObject({
    degree: oneOf(['freely', 'moderately', 'weakly', 'no']),
    fromOldWood: oneOf(['yes', 'weak', 'no']),
    /** Behind the degree. */
    sources,
    oldWoodSources: sources,
  }),
  cautions: z.array(z.strictObject({ code: oneOf(CAUTION_CODES), source: words }), 'must be a list'),
  season: z.strictObject({ note: words.max(120, 'must have at most 120 characters'), sources }).nullable(),
});
export type SpeciesFile = z.output<typeof SpeciesFile>;

export type WoodClass = 'soft' | 'medium' | 'hard';
export type Plant = 'conifer' | 'palm' | 'broadleaf';

/** One species of the catalogue, with what follows from its file. */
export type Species = SpeciesFile & {
  slug: string;
  /** Growers' classes of wood density; null where it is not known. */
  wood: WoodClass | null;
  /** Null for a plant that is none of these, such as ginkgo. */
  plant: Plant | null;
};
