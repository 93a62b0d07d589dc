import fc from 'fast-check';
import { getSchema } from '@tiptap/core';
import { describe, expect, it } from 'vitest';
import { mentionedBlocks } from '@/lib/documents/blocks';
import { CutBlock, PROSE, ReadingBlock } from '@/lib/documents/extensions';
import { isSafeLink, linkFromTyped } from '@/lib/documents/links';
import { plainText } from '@/lib/documents/plain-text';
import { validateDocument } from '@/lib/documents/validate';

const ID = '0198c2f0-0000-7000-8000-000000000001';
const text = (value: string, ...marks: object[]) => ({
  type: 'text',
  text: value,
  ...(marks.length ? { marks } : {}),
});
const paragraph = (...content: object[]) => ({ type: 'paragraph', content });
const doc = (...content: unknown[]) => ({ type: 'doc', content });
const link = (href: unknown) => ({ type: 'link', attrs: { href } });
const paths = (value: unknown) => validateDocument(value).map((error) => error.path);

const WHOLE = doc(
  { type: 'heading', attrs: { level: 2 }, content: [text('By the cistern')] },
  paragraph(text('Took them back '), text('hard', { type: 'bold' }, { type: 'italic' }), {
    type: 'hardBreak',
  }),
  { type: 'cut' },
  { type: 'reading', attrs: { id: ID } },
  { type: 'bulletList', content: [{ type: 'listItem', content: [paragraph(text('one'))] }] },
  { type: 'orderedList', attrs: { start: 3 }, content: [{ type: 'listItem', content: [paragraph()] }] },
  { type: 'blockquote', content: [paragraph(text('said so', link('https://example.org/a?b=c')))] },
);

describe('the document of an entry', () => {
  it('may hold prose, the cut and its readings', () => {
    expect(validateDocument(WHOLE)).toEqual([]);
    expect(validateDocument(doc())).toEqual([]);
    expect(validateDocument({ type: 'doc' })).toEqual([]);
  });

  it.each<[string, unknown, string]>([
    ['is no document', 'prose', 'doc'],
    ['is a list', [], 'doc'],
    ['has another root', paragraph(), 'doc'],
    ['has a part nobody knows', { ...doc(), onload: 1 }, 'doc.onload'],
    ['holds a script', doc({ type: 'script', content: [text('alert(1)')] }), 'doc.content.0'],
    ['holds an image', doc({ type: 'image', attrs: { src: 'x' } }), 'doc.content.0'],
    ['has text at its top', doc(text('x')), 'doc.content.0'],
    ['has an empty text', doc(paragraph(text(''))), 'doc.content.0.content.0.text'],
    ['has a first heading', doc({ type: 'heading', attrs: { level: 1 } }), 'doc.content.0.attrs.level'],
    ['has a heading of no level', doc({ type: 'heading' }), 'doc.content.0.attrs.level'],
    ['styles a paragraph', doc({ type: 'paragraph', attrs: { style: 'x' } }), 'doc.content.0.attrs.style'],
    [
      'carries values in the cut block',
      doc({ type: 'cut', attrs: { severity: 1 } }),
      'doc.content.0.attrs.severity',
    ],
    ['has two cuts', doc({ type: 'cut' }, { type: 'cut' }), 'doc.content.1'],
    [
      'has a reading twice',
      doc({ type: 'reading', attrs: { id: ID } }, { type: 'reading', attrs: { id: ID.toUpperCase() } }),
      'doc.content.1',
    ],
    ['has a reading without an id', doc({ type: 'reading' }), 'doc.content.0.attrs.id'],
    ['has a reading of no id', doc({ type: 'reading', attrs: { id: 'first' } }), 'doc.content.0.attrs.id'],
    [
      'hides the cut in a quotation',
      doc({ type: 'blockquote', content: [{ type: 'cut' }] }),
      'doc.content.0.content.0',
    ],
    ['has an empty list', doc({ type: 'bulletList', content: [] }), 'doc.content.0'],
    ['underlines', doc(paragraph(text('x', { type: 'underline' }))), 'doc.content.0.content.0.marks.0'],
    [
      'is bold twice',
      doc(paragraph(text('x', { type: 'bold' }, { type: 'bold' }))),
      'doc.content.0.content.0.marks.1',
    ],
    ['takes a name from the prototype', doc({ type: 'constructor' }), 'doc.content.0'],
  ])('is refused where it %s, at that place', (_what, value, path) => {
    expect(paths(value)).toContain(path);
  });

  it.each([
    'javascript:alert(1)',
    'JaVaScRiPt:alert(1)',
    'java\nscript:alert(1)',
    ' javascript:alert(1)',
    'data:text/html,<script>alert(1)</script>',
    'vbscript:x',
    'file:///etc/passwd',
    '//example.org',
    '/entries',
    'example.org',
    '',
    null,
    7,
  ])('refuses a link to %j', (href) => {
    expect(paths(doc(paragraph(text('x', link(href)))))).toEqual([
      'doc.content.0.content.0.marks.0.attrs.href',
    ]);
  });

  it('refuses attributes on a link that would act on the page', () => {
    const sly = { type: 'link', attrs: { href: 'https://example.org', onclick: 'x()' } };
    expect(paths(doc(paragraph(text('x', sly))))).toEqual(['doc.content.0.content.0.marks.0.attrs.onclick']);
  });

  it('is at most eight levels deep, 5,000 parts and 200 kB', () => {
    const quoted = (levels: number): object =>
      levels === 1 ? paragraph() : { type: 'blockquote', content: [quoted(levels - 1)] };
    expect(validateDocument(doc(quoted(8)))).toEqual([]);
    expect(validateDocument(doc(quoted(9)))).toHaveLength(1);
    expect(validateDocument(doc(...Array.from({ length: 5000 }, () => paragraph())))).toEqual([]);
    expect(validateDocument(doc(...Array.from({ length: 5001 }, () => paragraph())))).toHaveLength(1);
    expect(validateDocument(doc(paragraph(text('a'.repeat(199_000)))))).toEqual([]);
    expect(validateDocument(doc(paragraph(text('ä'.repeat(101_000)))))).toHaveLength(1);
  });

  it('nested past any sense is refused and breaks nothing', () => {
    let deep: object = paragraph();
    for (let level = 0; level < 20_000; level += 1) deep = { type: 'blockquote', content: [deep] };
    expect(validateDocument(doc(deep))).toHaveLength(1);
  });

  it('any JSON gets an answer, and none an exception', () => {
    fc.assert(fc.property(fc.jsonValue(), (value) => void validateDocument(value)));
    fc.assert(
      fc.property(fc.jsonValue(), (value) => void validateDocument({ type: 'doc', content: [value] })),
    );
  });

  it('what is accepted is what the editor can load', () => {
    const schema = getSchema([...PROSE, CutBlock, ReadingBlock]);
    const word = fc.constantFrom(text('a'), text('b', { type: 'bold' }), { type: 'hardBreak' }, text(''));
    const leaf = fc.array(word, { maxLength: 3 }).map((content) => paragraph(...content) as unknown);
    const odd = fc.constantFrom<unknown>(
      { type: 'cut' },
      { type: 'reading', attrs: { id: ID } },
      text('a'),
      {},
    );
    const nested = fc.letrec<{ block: unknown }>((tie) => ({
      block: fc.oneof(
        { maxDepth: 4 },
        leaf,
        odd,
        fc.record({
          type: fc.constantFrom('blockquote', 'bulletList', 'orderedList', 'listItem', 'heading'),
          content: fc.array(tie('block'), { maxLength: 3 }),
        }),
        fc.array(tie('block'), { minLength: 1, maxLength: 2 }).map((content) => ({
          type: 'bulletList',
          content: [{ type: 'listItem', content }],
        })),
      ),
    })).block;
    let accepted = 0;
    fc.assert(
      fc.property(fc.array(nested, { minLength: 1, maxLength: 4 }), (content) => {
        if (validateDocument(doc(...content)).length > 0) return;
        accepted += 1;
        schema.nodeFromJSON(doc(...content)).check();
      }),
      { numRuns: 500 },
    );
    expect(accepted).toBeGreaterThan(20);
  });
});

describe('a link as somebody types it', () => {
  it.each([
    ['example.org/a', 'https://example.org/a'],
    ['https://example.org', 'https://example.org'],
    ['me@example.org', 'mailto:me@example.org'],
    ['localhost:3000', 'https://localhost:3000'],
  ])('“%s” becomes %s', (typed, href) => {
    expect(linkFromTyped(typed)).toBe(href);
  });

  it('becomes nothing that runs', () => {
    for (const typed of ['javascript:alert(1)', 'data:text/html,x', 'two words', '']) {
      expect(linkFromTyped(typed)).toBeNull();
    }
    fc.assert(
      fc.property(fc.webUrl(), (typed) => {
        expect(isSafeLink(linkFromTyped(typed))).toBe(true);
      }),
    );
  });
});

describe('reading a document', () => {
  it('its plain text is its prose alone', () => {
    expect(plainText(WHOLE)).toBe('By the cistern\n\nTook them back hard\n\n- one\n\n- \n\nsaid so');
    expect(plainText(doc())).toBe('');
  });

  it('it tells which blocks it places, in their order', () => {
    expect(mentionedBlocks(WHOLE)).toEqual({ cut: true, readings: [ID] });
    expect(mentionedBlocks({})).toEqual({ cut: false, readings: [] });
  });
});
