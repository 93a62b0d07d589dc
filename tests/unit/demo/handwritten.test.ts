import { describe, expect, it } from 'vitest';
import { parseHandwritten, readHandwritten } from '@/lib/demo/handwritten';
import { documentOf } from '@/lib/demo/markdown-document';

const HEAD = `title: A fig
writer: Ines Ombrel
species: ficus-carica
tree: Fig 1
sun: full
wind: sheltered
water: dry
day: 02-11
kind: heading
tip: removed
branches: 3
took: 1.2
left: 1.8
stage: dormant
reading: 57 days; 7 - 11; longest 0.31; removed 12; kept 6; note One broke.`;
const text = (head = HEAD, body = 'Once.\n\n{cut}\n\n{reading 1}\n') => `---\n${head}\n---\n${body}`;

describe('an entry written by hand', () => {
  it('is read from its lines: depth from lengths, counts as they are shouted', () => {
    const entry = parseHandwritten('fig', text());
    expect(entry.cut).toMatchObject({
      severity: 0.4,
      removedLength: 1.2,
      retainedLength: 1.8,
      diameter: null,
    });
    expect(entry.readings).toEqual([
      {
        days: 57,
        counts: [7, null, 11],
        total: null,
        branches: null,
        longestShoot: 0.31,
        dieback: null,
        removed: 12,
        kept: 6,
        note: 'One broke.',
      },
    ]);
  });

  it.each([
    ['a line that is no "name: value"', text(`${HEAD}\nwhat`), /what/],
    ['an unknown name', text(`${HEAD}\ncolour: red`), /colour/],
    ['more counts than branches', text(HEAD.replace('7 - 11', '7 - 11 4')), /7 - 11 4/],
    [
      'a note cut in two by a semicolon',
      text(HEAD.replace('broke.', 'broke; it was old.')),
      /cannot be read/,
    ],
    ['no depth', text(HEAD.replace('took: 1.2\n', '')), /severity/],
    ['a reading that the prose does not place', text(HEAD, 'Once.\n\n{cut}'), /once/],
    ['no head', 'Once.', /head/],
  ])('is refused for %s', (_, file, message) => {
    expect(() => parseHandwritten('fig', file)).toThrow(message);
  });

  it('keeps headings, lists, quotations, bold, italic and links, and refuses the rest', () => {
    const { content = [] } = documentOf(
      '## Then\n\nA **b** *c* [d](https://e.example)\n\n- f\n\n1. g\n\n> h\n\n{cut}',
      0,
    );
    expect(content.map(({ type }) => type)).toEqual([
      'heading',
      'paragraph',
      'bulletList',
      'orderedList',
      'blockquote',
      'cut',
    ]);
    expect(content[1]?.content?.map(({ marks }) => marks?.[0]?.type)).toEqual([
      undefined,
      'bold',
      undefined,
      'italic',
      undefined,
      'link',
    ]);
    expect(() => documentOf('{cut}\n\n<b>x</b>', 0)).toThrow(/html/);
    expect(() => documentOf('{cut}\n\n![x](y.png)', 0)).toThrow(/image/);
  });

  it('all twelve can be read, each with prose of 50 words or more', () => {
    const all = readHandwritten();
    expect(all).toHaveLength(12);
    for (const { doc, slug } of all) {
      const words = [...JSON.stringify(doc).matchAll(/"text":"([^"]*)"/g)]
        .map((match) => match[1])
        .join(' ')
        .split(' ');
      expect(words.length, slug).toBeGreaterThan(50);
    }
  });

  it('who writes of burning sap, ladders or wires writes the caution too', () => {
    const prose = (slug: string) =>
      JSON.stringify(readHandwritten().find((entry) => entry.slug.includes(slug))?.doc);
    for (const sappy of ['01-fig', '03-breadfruit']) expect(prose(sappy)).toMatch(/[Gg]loves/);
    expect(prose('04-mango')).toMatch(/wash/);
    for (const ladder of ['05-apple', '09-mulberry']) expect(prose(ladder)).toMatch(/three-legged|tripod/);
    expect(prose('09-mulberry')).toMatch(/wire.*not cut at all/);
  });
});
