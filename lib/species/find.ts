import { allSpecies, commonName } from './catalogue';
import type { Species, WoodClass } from './schema';

export type Narrowed = {
  wood?: WoodClass | 'unknown' | undefined;
  oldWood?: 'yes' | 'weak' | 'no' | undefined;
};

/** Names that are read: scientific, English, Spanish, French and synonyms, but for those that must not be matched. */
const LANGUAGES = ['en', 'es', 'fr'] as const;

/** Names in use for another species too: shown, and not matched. */
const NOT_MATCHED = /\((misapplied|in part)\)$/;

type Named = { species: Species; names: string[] };
let index: Named[] | undefined;

/** Lower case, without accents and signs. */
export function plain(text: string): string {
  return text
    .normalize('NFD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();
}

/**
 * Species whose names hold every word of the query as the start of one of their own words, the closest first: a whole
 * name, then the start of a name, then any; the same by common name. An empty query finds all.
 */
export function findSpecies(query: string, { wood, oldWood }: Narrowed = {}): Species[] {
  const words = plain(query).split(' ').filter(Boolean);
  return named()
    .filter(({ species }) => !wood || (species.wood ?? 'unknown') === wood)
    .filter(({ species }) => !oldWood || species.resprouts.fromOldWood === oldWood)
    .map(({ species, names }) => ({ species, rank: rank(names, words) }))
    .filter(({ rank: found }) => found < Infinity)
    .sort((a, b) => a.rank - b.rank || commonName(a.species).localeCompare(commonName(b.species)))
    .map(({ species }) => species);
}

function named(): Named[] {
  return (index ??= allSpecies().map((species) => ({
    species,
    names: [
      species.scientific,
      ...LANGUAGES.flatMap((language) => species.names[language] ?? []),
      ...species.synonyms.filter((name) => !NOT_MATCHED.test(name)),
    ].map(plain),
  })));
}

function rank(names: readonly string[], words: readonly string[]): number {
  const query = words.join(' ');
  if (query === '') return 0;
  if (names.includes(query)) return 0;
  if (names.some((name) => name.startsWith(query))) return 1;
  const inOneName = (name: string) =>
    words.every((word) => name.split(' ').some((own) => own.startsWith(word)));
  return names.some(inOneName) ? 2 : Infinity;
}
