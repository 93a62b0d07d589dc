import { Marked } from 'marked';

const SAFE_LINK = /^(https?:\/\/|mailto:|\/(?!\/)|#)/;

function escape(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;');
}

const markdown = new Marked({
  renderer: {
    // Content is prose: raw HTML in it is shown as the text it is.
    html: ({ text }) => escape(text),
    heading({ tokens, depth, text }) {
      const id = text
        .toLowerCase()
        .replace(/[^\p{L}\p{N}]+/gu, '-')
        .replace(/^-|-$/g, '');
      return `<h${depth} id="${id}">${this.parser.parseInline(tokens)}</h${depth}>\n`;
    },
    link({ href, tokens }) {
      const text = this.parser.parseInline(tokens);
      return SAFE_LINK.test(href) ? `<a href="${escape(href)}">${text}</a>` : text;
    },
  },
});

/** Markdown as HTML, without raw HTML and with http, mailto and own links alone. */
export function renderMarkdown(text: string): string {
  return markdown.parse(text, { async: false });
}
