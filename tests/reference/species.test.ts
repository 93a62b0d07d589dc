import { readFileSync } from 'node:fs';
import { parse } from 'csv-parse/sync';
import { describe, expect, it } from 'vitest';
import { allSpecies, speciesBySlug } from '@/lib/species/catalogue';
import { sourceWords } from '@/lib/species/sources';

type Row = Record<string, string>;
const rows = parse(readFileSync('tests/reference/species/species.csv', 'utf8'), { columns: true }) as Row[];
const list = (text: string | undefined) => (text ?? '').split(';').filter(Boolean);
/** The table's notes: sprouting from old wood is from memory, but for these five, read on a page about hedges. */
const OLD_WOOD_FROM_A_PAGE = new Set([
  'fagus-sylvatica',
  'taxus-baccata',
  'ilex-aquifolium',
  'prunus-laurocerasus',
  'cupressus-leylandii',
]);

describe('the catalogue holds the reference table of species facts (Global Wood Density Database, USDA PLANTS, memory)', () => {
  it('has all 207 species and no other', () => {
    expect(rows).toHaveLength(207);
    expect(allSpecies().map(({ slug }) => slug)).toEqual(rows.map(({ slug }) => slug).sort());
  });

  it.each(rows.map((row) => [row['slug'] ?? '', row] as const))('%s, field by field', (slug, row) => {
    const species = speciesBySlug(slug);
    const other = list(row['other']).map((text) => [
      text.slice(0, text.indexOf(':')),
      text.slice(text.indexOf(':') + 1),
    ]);
    const inLanguage = (code: string) =>
      other.filter(([language]) => language === code).map(([, name]) => name);
    const caution = Object.fromEntries(list(row['caution_source']).map((pair) => pair.split('=')));
    expect(species).toMatchObject({
      scientific: row['scientific'],
      family: row['family'],
      genus: row['genus'],
      synonyms: list(row['synonyms']),
      group: row['group'],
      habit: row['habit'],
      woodDensity: row['wood_density']
        ? {
            value: Number(row['wood_density']),
            records: Number(row['wood_density_n']),
            level: row['wood_density_level'],
            source: row['wood_density_source'],
          }
        : null,
      resprouts: {
        degree: row['resprouts'],
        fromOldWood: row['resprouts_from_old_wood'],
        sources: list(row['resprouts_source']),
        oldWoodSources: [OLD_WOOD_FROM_A_PAGE.has(slug) ? 'intergardening' : 'memory'],
      },
      cautions: list(row['caution']).map((code) => ({ code, source: caution[code] })),
      season: row['season_note'] ? { note: row['season_note'], sources: list(row['season_source']) } : null,
    });
    const expected = Object.fromEntries(
      [
        ...['en', 'es', 'fr', 'pt', 'sw'].map((code) => [code, list(row[code])] as const),
        ...other.map(([code = '']) => [code, inLanguage(code)] as const),
      ].filter(([, names]) => names.length > 0),
    );
    expect(species?.names).toEqual(expected);
  });

  it('sorts into growers’ wood classes as published with the table: 46 soft, 38 medium, 105 hard, 18 not known', () => {
    const count = (wood: string | null) => allSpecies().filter((species) => species.wood === wood).length;
    expect([count('soft'), count('medium'), count('hard'), count(null)]).toEqual([46, 38, 105, 18]);
  });

  it('names what each source key stands for', () => {
    const keys = new Set(
      allSpecies().flatMap(({ resprouts, season, cautions, woodDensity }) => [
        ...resprouts.sources,
        ...(season?.sources ?? []),
        ...cautions.map(({ source }) => source),
        ...(woodDensity ? [woodDensity.source] : []),
      ]),
    );
    keys.delete('memory');
    for (const key of keys) expect(sourceWords(key)).not.toBe(key);
  });
});
