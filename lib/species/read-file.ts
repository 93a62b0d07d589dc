import { basename } from 'node:path';
import { readYaml, type ReadYaml } from './read-yaml';
import { SpeciesFile, type Plant, type Species } from './schema';
import { woodClass } from './wood';

const CONIFER_FAMILIES = new Set(['Pinaceae', 'Cupressaceae', 'Taxaceae', 'Araucariaceae', 'Podocarpaceae']);

/**
 * Reads one file of the catalogue.
 * @param path as it should stand in an error, such as content/species/ficus-carica.yaml
 * @param sourceKeys those that content/sources.yaml explains
 * @throws Error `path:line: field what is wrong`
 */
export function readSpeciesFile(path: string, text: string, sourceKeys: ReadonlySet<string>): Species {
  const file = readYaml(path, text, SpeciesFile);
  const { data, fail } = file;
  const slug = basename(path, '.yaml');
  const { scientific, genus } = data;
  if (slugOf(scientific) !== slug) {
    throw fail(['scientific'], `makes the file's name ${slugOf(scientific)}.yaml`);
  }
  if (scientific.split(' ')[0] !== genus) throw fail(['genus'], `is not the first word of ${scientific}`);
  checkSources(file, sourceKeys);
  return { ...data, slug, wood: woodClass(data), plant: plantOf(data) };
}

/** Genus and epithet in lower case, joined by a dash; the hybrid sign is dropped. */
export function slugOf(scientific: string): string {
  return scientific.replace('× ', '').replaceAll(' ', '-').toLowerCase();
}

function plantOf({ family, genus }: Pick<SpeciesFile, 'family' | 'genus'>): Plant | null {
  if (CONIFER_FAMILIES.has(family)) return 'conifer';
  if (family === 'Arecaceae') return 'palm';
  return genus === 'Ginkgo' ? null : 'broadleaf';
}

/** A mistyped key would pass for a source that nobody can look up. */
function checkSources({ data, fail }: ReadYaml<SpeciesFile>, known: ReadonlySet<string>): void {
  const { woodDensity, resprouts, cautions, season } = data;
  const cited: [field: PropertyKey[], key: string][] = [
    ...(woodDensity ? [[['woodDensity', 'source'], woodDensity.source] as [string[], string]] : []),
    ...listed(['resprouts', 'sources'], resprouts.sources),
    ...listed(['resprouts', 'oldWoodSources'], resprouts.oldWoodSources),
    ...cautions.map(({ source }, index): [PropertyKey[], string] => [['cautions', index, 'source'], source]),
    ...listed(['season', 'sources'], season?.sources ?? []),
  ];
  for (const [field, key] of cited) {
    if (!known.has(key)) throw fail(field, `names ${key}, which content/sources.yaml does not explain`);
  }
}

function listed(field: string[], keys: readonly string[]): [PropertyKey[], string][] {
  return keys.map((key, index) => [[...field, index], key]);
}
