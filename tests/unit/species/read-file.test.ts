import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { readSpeciesFile } from '@/lib/species/read-file';
import { readYaml } from '@/lib/species/read-yaml';
import { allSources } from '@/lib/species/sources';

const path = 'content/species/ficus-carica.yaml';
const text = readFileSync(path, 'utf8');
const line = (part: string) => text.split('\n').findIndex((one) => one.includes(part)) + 1;
const read = (edited: string) => readSpeciesFile(path, edited, new Set(allSources().keys()));

describe('a file of the catalogue', () => {
  it('is read whole', () => {
    expect(read(text)).toMatchObject({
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
    ['a word for a number', 'records: 91', 'records: many', 'woodDensity.records must be a whole number'],
    ['a number out of bounds', 'value: 0.404', 'value: 4.04', 'woodDensity.value must be 1.3 or less'],
    [
      'a name that is not the file’s',
      'scientific: Ficus carica',
      'scientific: Ficus alba',
      "scientific makes the file's name ficus-alba.yaml",
    ],
    [
      'a source that nobody can look up',
      'source: zanne-2009',
      'source: zane-2009',
      'woodDensity.source names zane-2009, which content/sources.yaml does not explain',
    ],
    ['a caution that nobody knows', 'code: latex', 'code: sticky', 'cautions.0.code must be one of'],
  ])('with %s is refused with its line', (_, right, wrong, message) => {
    const broken = text.replace(right, wrong);
    expect(() => read(broken)).toThrow(`${path}:${line(right)}: ${message}`);
  });

  it('that lacks a field, has one too many, or is no YAML is refused too', () => {
    expect(() => read(text.replace('family: Moraceae\n', ''))).toThrow(`${path}:1: family is missing`);
    expect(() => read(`${text}colour: green\n`)).toThrow('holds colour, which is no field here');
    expect(() => read(`${text}names: [\n`)).toThrow(
      /^content\/species\/ficus-carica\.yaml:\d+: is not valid YAML/,
    );
  });
});

describe('any other file that people edit', () => {
  it('is refused with its line too, and its own top named plainly', () => {
    const schema = z.strictObject({ title: z.string('must be text') });
    expect(() => readYaml('content/x.yaml', '# a note\ntitle: 3\n', schema)).toThrow(
      'content/x.yaml:2: title must be text',
    );
    expect(() => readYaml('content/x.yaml', 'title: a\ncolour: b\n', schema)).toThrow(
      'content/x.yaml:1: holds colour, which is no field here',
    );
  });
});
