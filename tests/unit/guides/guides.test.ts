import { existsSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { parseCounts } from '@/lib/counts/parse';
import { allGuides, glossary, guide } from '@/lib/guides/guides';
import { renderMarkdown } from '@/lib/guides/markdown';

describe('guides', () => {
  it('are all there, with a title and a description', () => {
    expect(allGuides().map(({ slug }) => slug)).toEqual(
      expect.arrayContaining(['counting', 'working-safely']),
    );
    for (const { title, description, html } of [...allGuides(), glossary()]) {
      expect(title && description).toBeTruthy();
      expect(html).toContain('<h2 id=');
    }
  });

  it('are found by their address alone, which leads nowhere else', () => {
    expect(guide('counting')?.title).toBe('How to count');
    expect(guide('../glossary')).toBeUndefined();
    expect(guide('nothing')).toBeUndefined();
  });

  it('explain in the glossary every word that records are kept in', () => {
    const words = [...glossary().html.matchAll(/<p><strong>(.+?)\.?<\/strong>/g)].map(([, word]) => word);
    expect(words).toEqual(
      expect.arrayContaining([
        ...['Orchard', 'Tree', 'Entry', 'Cut', 'Severity', 'Intensity', 'Class', 'Tip kept, tip removed'],
        ...['Reading', 'Thinned', 'Control', 'Flush', 'Flush rate', 'Microclimate', 'Return visit'],
        ...['Soft-wooded, medium, hard-wooded', 'Twig mark', 'Bench', 'Softwood', 'Per what?'],
        ...['Heading', 'Reduction', 'Thinning cut', 'Pollarding', 'Coppicing'],
      ]),
    );
    expect(new Set(words).size).toBe(words.length);
  });

  it('give for example only counts that the counting field reads, with the sums they name', () => {
    const html = guide('counting')?.html ?? '';
    const shouted = parseCounts('7 9 - 11');
    expect(html).toContain('7 9 - 11');
    expect(html).toContain('27 shoots on three branches');
    expect(shouted).toEqual({ ok: true, value: { counts: [7, 9, null, 11] } });
    expect(html).toContain('31 on 4');
    expect(parseCounts('31 on 4')).toEqual({ ok: true, value: { total: 31, branches: 4 } });
  });

  it('link to pages of this site that are there', () => {
    for (const { html } of [...allGuides(), glossary()]) {
      for (const [, href = ''] of html.matchAll(/href="(\/[^"#]*)"/g)) {
        const [, room = '', page] = href.split('/');
        expect(page ? guide(page)?.slug : existsSync(`app/${room}/page.tsx`), href).toBeTruthy();
      }
    }
  });

  it('show raw HTML as text and drop links that run something', () => {
    const html = renderMarkdown(
      '<script>alert(1)</script>\n\n[a](javascript:alert(1)) [b](//elsewhere.example) <b onclick="x">c</b> [d](/data)',
    );
    expect(html).not.toMatch(/<script|javascript:|<b |href="\/\//);
    expect(html).toContain('<a href="/data">d</a>');
  });
});
