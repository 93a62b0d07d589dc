import { describe, expect, it } from 'vitest';
import { allSpecies, speciesBySlug } from '@/lib/species/catalogue';
import { cautionsFor, generalCautions, ownCautions } from '@/lib/species/cautions';
import type { Species } from '@/lib/species/schema';
import { sproutingSentence, sproutingSources } from '@/lib/species/sprouting';
import { densityInWords, HARD_FROM, SOFT_BELOW, woodClass } from '@/lib/species/wood';

const species = (slug: string) => speciesBySlug(slug) as Species;

describe('what is said before any figure', () => {
  it('begins with not resprouting from old wood, for all that do not', () => {
    const dry = allSpecies().filter(({ resprouts }) => resprouts.fromOldWood !== 'yes');
    expect(dry).toHaveLength(48);
    for (const one of dry) expect(cautionsFor(one)[0]?.code).toMatch(/^(no|weak)-resprout$/);
    const free = allSpecies().filter(({ resprouts }) => resprouts.fromOldWood === 'yes');
    for (const one of free) expect(cautionsFor(one)[0]?.code).not.toMatch(/resprout/);
  });

  it('holds every caution of the file with its source', () => {
    for (const one of allSpecies()) {
      const said = ownCautions(one);
      for (const { code, source } of one.cautions) {
        expect(said).toContainEqual({
          code,
          source,
          title: expect.any(String) as string,
          text: expect.any(String) as string,
        });
      }
    }
  });

  it('ends with what holds for every cut, marked as common practice: stress, tools, ladders, aloft, local rules', () => {
    const codes = ['heavy-cut', 'clean-tools', 'ladder', 'arborist', 'local-rules'];
    expect(generalCautions().map(({ code }) => code)).toEqual(codes);
    expect(cautionsFor(species('ficus-carica')).slice(-5)).toEqual(generalCautions());
    for (const { source } of generalCautions()) expect(source).toBe('common practice, no source');
  });
});

describe('how a species answers a hard cut', () => {
  it.each([
    ['ficus-carica', 'It resprouts freely after a hard cut, from old wood too.'],
    ['pinus-sylvestris', 'It does not resprout after a hard cut.'],
    [
      'cupressus-leylandii',
      'It resprouts weakly after a hard cut, from green wood alone, not from old bare wood.',
    ],
    ['cocos-nucifera', 'A cut stem does not resprout, for it has one growing point.'],
    [
      'bactris-gasipaes',
      'It sends up new stems from its foot freely; a cut stem does not resprout, for it has one growing point.',
    ],
  ])('%s: %s', (slug, sentence) => {
    expect(sproutingSentence(species(slug))).toBe(sentence);
  });

  it.each([
    ['memory alone is said once', 'ficus-carica', ['from memory']],
    ['a no is backed by a source of yes and no', 'pinus-radiata', ['USDA PLANTS, for yes or no alone']],
    [
      'a yes is, but neither how freely nor from old wood',
      'mangifera-indica',
      ['USDA PLANTS, for yes or no alone', 'how freely and old wood from memory'],
    ],
    [
      'a study backs how freely',
      'erythrina-poeppigiana',
      ['Russo and Budowski 1986', 'old wood from memory'],
    ],
    ['one page backs both', 'ilex-aquifolium', ['Intergardening']],
  ])('%s', (_, slug, said) => {
    expect(sproutingSources(species(slug))).toEqual(said);
  });
});

describe('wood density', () => {
  const of = (value: number) =>
    woodClass({ woodDensity: { value, records: 1, level: 'species', source: 'zanne-2009' } });

  it('is soft below 0.45 g/cm³, hard from 0.56, medium between', () => {
    expect([0.449, 0.45, 0.559, 0.56].map(of)).toEqual(['soft', 'medium', 'medium', 'hard']);
    expect(woodClass({ woodDensity: null })).toBeNull();
  });

  it('as written on a page never contradicts its class', () => {
    for (const { wood, woodDensity } of allSpecies()) {
      if (!woodDensity) continue;
      const written = parseFloat(densityInWords(woodDensity.value));
      expect(wood).toBe(written < SOFT_BELOW ? 'soft' : written >= HARD_FROM ? 'hard' : 'medium');
    }
  });
});
