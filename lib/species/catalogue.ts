import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { readSpeciesFile } from './read-file';
import type { Species } from './schema';
import { allSources } from './sources';

export type { Species } from './schema';

type Catalogue = { all: readonly Species[]; bySlug: ReadonlyMap<string, Species> };
let loaded: Catalogue | undefined;

/** Reads every file of content/species once a process, from the folder that the commands run in. */
function catalogue(): Catalogue {
  if (loaded) return loaded;
  const folder = join('content', 'species');
  const sourceKeys = new Set(allSources().keys());
  const all = readdirSync(join(process.cwd(), folder))
    .filter((name) => name.endsWith('.yaml'))
    .sort()
    .map((name) => {
      const path = join(folder, name);
      return readSpeciesFile(path, readFileSync(join(process.cwd(), path), 'utf8'), sourceKeys);
    });
  return (loaded = { all, bySlug: new Map(all.map((species) => [species.slug, species])) });
}

/** All species, by slug. */
export const allSpecies = (): readonly Species[] => catalogue().all;

export const speciesBySlug = (slug: string): Species | undefined => catalogue().bySlug.get(slug);

export const isSpeciesSlug = (text: string): boolean => catalogue().bySlug.has(text);

type Named = Pick<Species, 'names' | 'scientific'>;

/** The first English name as it stands amid a sentence: "fig", "Scots pine"; the scientific one where there is none. */
export const nameInSentence = (species: Named): string => species.names['en']?.[0] ?? species.scientific;

/** The same with a capital, for a heading or a table. */
export function commonName(species: Named): string {
  const name = nameInSentence(species);
  return name.charAt(0).toUpperCase() + name.slice(1);
}
