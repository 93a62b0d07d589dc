import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { allSpecies, speciesBySlug } from '@/lib/species/catalogue';
import { cautionsFor, sproutingSentence } from '@/lib/species/cautions';
import { findSpecies } from '@/lib/species/find';
import { readSpeciesFile } from '@/lib/species/read-file';
import type { Species } from '@/lib/species/schema';

const path = 'content/species/ficus-carica.yaml';
const text = readFileSync(path, 'utf8');
const line = (part: string) => text.split('\n').findIndex((one) => one.includes(part)) + 1;
const slugs = (found: readonly Species[]) => found.map(({ slug }) => slug);

describe('a file of the catalogue', () => {
  it('is read whole', () => {
    expect(readSpeciesFile(path, text)).toMatchObject({
      slug: 'ficus-carica',
      wood: 'soft',
      plant: 'broadleaf',
    });
  });

  it.each([
    [
      'a value that is not one of the words',
      'degree: freely',
      'degree: often',
      'resprouts.degree must be one of freely, moderately, weakly, no',
    ],
    ['a number out of bounds', 'value: 0.404', 'value: 4.04', 'woodDensity.value must be 1.3 or less'],
    [
      'a name that is not the file’s',
      'scientific: Ficus carica',
      'scientific: Ficus alba',
      "scientific makes the file's name ficus-alba.yaml",
    ],
    ['a caution that nobody knows', 'code: latex', 'code: sticky', 'cautions.0.code must be one of'],
  ])('with %s is refused with its line', (_, right, wrong, message) => {
    const broken = text.replace(right, wrong);
    expect(() => readSpeciesFile(path, broken)).toThrow(`${path}:${line(right)}: ${message}`);
  });

  it('that lacks a field, has one too many, or is no YAML is refused too', () => {
    expect(() => readSpeciesFile(path, text.replace('family: Moraceae\n', ''))).toThrow(
      `${path}:1: family is missing`,
    );
    expect(() => readSpeciesFile(path, `${text}colour: green\n`)).toThrow(
      'holds colour, which is no field here',
    );
    expect(() => readSpeciesFile(path, `${text}names: [\n`)).toThrow(
      /^content\/species\/ficus-carica\.yaml:\d+: is not valid YAML/,
    );
  });
});

describe('finding species', () => {
  it.each([
    ['higuera', 'ficus-carica'],
    ['higuéra', 'ficus-carica'],
    ['FIG', 'ficus-carica'],
    ['prunus dulcis', 'prunus-amygdalus'],
    ['arbol del pan', 'artocarpus-altilis'],
    ['figuier', 'ficus-carica'],
    ['carica fic', 'ficus-carica'],
  ])('%s finds %s first', (query, slug) => {
    expect(slugs(findSpecies(query))[0]).toBe(slug);
  });

  it('narrows by wood and by resprouting from old wood', () => {
    const found = findSpecies('', { wood: 'soft', oldWood: 'no' });
    expect(found.length).toBeGreaterThan(0);
    expect(found.every(({ wood, resprouts }) => wood === 'soft' && resprouts.fromOldWood === 'no')).toBe(
      true,
    );
    expect(findSpecies('', { wood: 'unknown' })).toHaveLength(18);
  });

  it('finds nothing for words that no name holds, and everything for none', () => {
    expect(findSpecies('zzz')).toEqual([]);
    expect(findSpecies('  ')).toHaveLength(207);
  });
});

describe('what is said before any figure', () => {
  it('begins with not resprouting from old wood, for all that do not', () => {
    const dry = allSpecies().filter(({ resprouts }) => resprouts.fromOldWood !== 'yes');
    expect(dry.length).toBeGreaterThan(10);
    for (const species of dry) expect(cautionsFor(species)[0]?.code).toMatch(/^(no|weak)-resprout$/);
  });

  it('holds every caution of the file with its source', () => {
    for (const species of allSpecies()) {
      const said = cautionsFor(species);
      for (const { code, source } of species.cautions) {
        expect(said).toContainEqual(
          expect.objectContaining({ code, source, title: expect.any(String) as string }),
        );
      }
    }
  });

  it('never promises a palm anything', () => {
    const palm = speciesBySlug('cocos-nucifera') as Species;
    expect(sproutingSentence(palm)).toBe('It does not resprout: a palm has one growing point.');
  });
});
