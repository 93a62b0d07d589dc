import { describe, expect, it } from 'vitest';
import { commonName, nameInSentence, speciesBySlug } from '@/lib/species/catalogue';
import { findSpecies } from '@/lib/species/find';
import type { Species } from '@/lib/species/schema';

const slugs = (found: readonly Species[]) => found.map(({ slug }) => slug);

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

  it('reads a group’s name in brackets, and no name that belongs to another species as well', () => {
    expect(slugs(findSpecies('citrus aurantium grapefruit group'))).toEqual(['citrus-paradisi']);
    expect(slugs(findSpecies('betula alba'))).toEqual([]);
  });

  it('finds nothing for words that no name holds, and everything for none', () => {
    expect(findSpecies('zzz')).toEqual([]);
    expect(findSpecies('  ')).toHaveLength(207);
  });
});

describe('a species is called', () => {
  it('by its first English name, which keeps its own capitals amid a sentence', () => {
    const [pine, fig] = ['pinus-sylvestris', 'ficus-carica'].map((slug) => speciesBySlug(slug) as Species);
    expect([pine, fig].map((one) => nameInSentence(one as Species))).toEqual(['Scots pine', 'fig']);
    expect(commonName(fig as Species)).toBe('Fig');
  });
});
