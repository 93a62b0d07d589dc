import { basename } from 'node:path';
import { isNode, LineCounter, parseDocument, type Document } from 'yaml';
import type { z } from 'zod';
import { SpeciesFile, type Plant, type Species, type WoodClass } from './schema';

/** Growers' bounds of wood density in g/cm3; between the orchard species' gap from 0.447 to 0.463, and the highest that keeps every oak hard. */
export const SOFT_BELOW = 0.45;
export const HARD_FROM = 0.56;

const CONIFER_FAMILIES = new Set(['Pinaceae', 'Cupressaceae', 'Taxaceae', 'Araucariaceae', 'Podocarpaceae']);

/**
 * Reads one file of the catalogue.
 * @param path as it should stand in an error, such as content/species/ficus-carica.yaml
 * @throws Error `path:line: field what is wrong`
 */
export function readSpeciesFile(path: string, text: string): Species {
  const lines = new LineCounter();
  const document = parseDocument(text, { lineCounter: lines });
  const broken = document.errors[0];
  if (broken) {
    throw new Error(
      `${path}:${lines.linePos(broken.pos[0]).line}: is not valid YAML: ${broken.message.split('\n')[0]}`,
    );
  }
  const parsed = SpeciesFile.safeParse(document.toJS());
  if (!parsed.success) {
    const issue = parsed.error.issues[0] as z.core.$ZodIssue;
    throw new Error(`${path}:${lineOf(document, issue.path, lines)}: ${issue.path.join('.')} ${said(issue)}`);
  }
  const slug = basename(path, '.yaml');
  const fail = (field: string, why: string) =>
    new Error(`${path}:${lineOf(document, [field], lines)}: ${field} ${why}`);
  const { scientific, genus } = parsed.data;
  if (slugOf(scientific) !== slug)
    throw fail('scientific', `makes the file's name ${slugOf(scientific)}.yaml`);
  if (scientific.split(' ')[0] !== genus) throw fail('genus', `is not the first word of ${scientific}`);
  return { ...parsed.data, slug, wood: woodClass(parsed.data), plant: plantOf(parsed.data) };
}

/** Genus and epithet in lower case, joined by a dash; the hybrid sign is dropped. */
export function slugOf(scientific: string): string {
  return scientific.replace('× ', '').replaceAll(' ', '-').toLowerCase();
}

export function woodClass({ woodDensity }: Pick<SpeciesFile, 'woodDensity'>): WoodClass | null {
  if (!woodDensity) return null;
  if (woodDensity.value < SOFT_BELOW) return 'soft';
  return woodDensity.value >= HARD_FROM ? 'hard' : 'medium';
}

function plantOf({ family, genus }: Pick<SpeciesFile, 'family' | 'genus'>): Plant | null {
  if (CONIFER_FAMILIES.has(family)) return 'conifer';
  if (family === 'Arecaceae') return 'palm';
  return genus === 'Ginkgo' ? null : 'broadleaf';
}

/** The line of a field, or of the nearest one around it that is there. */
function lineOf(document: Document, path: readonly PropertyKey[], lines: LineCounter): number {
  for (let depth = path.length; depth > 0; depth -= 1) {
    const node: unknown = document.getIn(path.slice(0, depth), true);
    if (isNode(node) && node.range) return lines.linePos(node.range[0]).line;
  }
  return 1;
}

function said(issue: z.core.$ZodIssue): string {
  if (issue.code === 'unrecognized_keys') return `holds ${issue.keys.join(', ')}, which is no field here`;
  return issue.code === 'invalid_type' && issue.input === undefined ? 'is missing' : issue.message;
}
