import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { readSpeciesFile } from './read-file';
import type { Species } from './schema';

export type { Species } from './schema';

type Catalogue = { all: readonly Species[]; bySlug: ReadonlyMap<string, Species> };
let loaded: Catalogue | undefined;

/** Reads every file of content/species once a process, from the folder that the commands run in. */
function catalogue(): Catalogue {
  if (loaded) return loaded;
  const folder = join('content', 'species');
  const all = readdirSync(join(process.cwd(), folder))
    .filter((name) => name.endsWith('.yaml'))
    .sort()
    .map((name) => {
      const path = join(folder, name);
      return readSpeciesFile(path, readFileSync(join(process.cwd(), path), 'utf8'));
    });
  return (loaded = { all, bySlug: new Map(all.map((species) => [species.slug, species])) });
}

/** All species, by slug. */
export const allSpecies = (): readonly Species[] => catalogue().all;

export const speciesBySlug = (slug: string): Species | undefined => catalogue().bySlug.get(slug);

export const isSpeciesSlug = (text: string): boolean => catalogue().bySlug.has(text);

/** The first English name, with a capital; the scientific one where there is none. */
export function commonName(species: Pick<Species, 'names' | 'scientific'>): string {
  const name = species.names['en']?.[0] ?? species.scientific;
  return name.charAt(0).toUpperCase() + name.slice(1);
}
