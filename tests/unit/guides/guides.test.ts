import { describe, expect, it } from 'vitest';
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

  it('show raw HTML as text and drop links that run something', () => {
    const html = renderMarkdown(
      '<script>alert(1)</script>\n\n[a](javascript:alert(1)) [b](//elsewhere.example) <b onclick="x">c</b> [d](/data)',
    );
    expect(html).not.toMatch(/<script|javascript:|<b |href="\/\//);
    expect(html).toContain('<a href="/data">d</a>');
  });
});
