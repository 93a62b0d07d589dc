import { renderToStaticMarkup } from 'react-dom/server';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { EntryDocument } from '@/components/entry/EntryDocument';

const ID = '0198c2f0-0000-7000-8000-000000000001';
const paragraph = (...content: object[]) => ({ type: 'paragraph', content });

function show(...content: object[]): string {
  return renderToStaticMarkup(
    <EntryDocument
      doc={{ type: 'doc', content }}
      renderCut={() => <section>the cut</section>}
      renderReading={(id) => <section>reading {id}</section>}
    />,
  );
}

describe('a stored document shown on the server', () => {
  const complaints = vi.spyOn(console, 'error');
  afterEach(() => expect(complaints).not.toHaveBeenCalled());

  it('keeps its prose and puts each block where it stands', () => {
    const html = show(
      { type: 'heading', attrs: { level: 2 }, content: [{ type: 'text', text: 'Row 2' }] },
      { type: 'cut' },
      paragraph({ type: 'text', text: 'strong', marks: [{ type: 'bold' }] }, { type: 'hardBreak' }),
      { type: 'reading', attrs: { id: ID } },
      { type: 'orderedList', attrs: { start: 3 }, content: [{ type: 'listItem', content: [paragraph()] }] },
      { type: 'bulletList', content: [{ type: 'listItem', content: [paragraph(), paragraph()] }] },
    );
    expect(html).toBe(
      '<div class="prose-record"><h2>Row 2</h2><section>the cut</section><p><strong>strong</strong><br/></p>' +
        `<section>reading ${ID}</section><ol start="3"><li><p></p></li></ol><ul><li><p></p><p></p></li></ul></div>`,
    );
  });

  it('escapes what was typed', () => {
    const html = show(paragraph({ type: 'text', text: '<script>alert(1)</script> & "so on"' }));
    expect(html).toContain('&lt;script&gt;alert(1)&lt;/script&gt; &amp;');
    expect(html).not.toContain('<script');
  });

  it('sends links out without a referrer or an opener', () => {
    const link = { type: 'link', attrs: { href: 'https://example.org/' } };
    expect(show(paragraph({ type: 'text', text: 'x', marks: [link] }))).toContain(
      '<a href="https://example.org/" rel="noopener noreferrer nofollow ugc">x</a>',
    );
  });

  it('says so, and runs nothing, where the document is not one that may be stored', () => {
    const link = { type: 'link', attrs: { href: 'javascript:alert(1)' } };
    const html = show(paragraph({ type: 'text', text: 'x', marks: [link] }));
    expect(html).toContain('cannot be shown');
    expect(html).not.toContain('javascript');
  });

  it('an empty document is empty', () => {
    expect(show()).toBe('<div class="prose-record"></div>');
  });
});
