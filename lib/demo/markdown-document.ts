import { lexer, type Token, type Tokens } from 'marked';
import { CUT_BLOCK, doc } from './prose';
import type { DocNode } from './types';

type Mark = NonNullable<DocNode['marks']>[number];

/**
 * The document of a text in Markdown: paragraphs, headings of level 2 and 3, lists, quotations, bold, italic, links.
 * A line `{cut}` or `{reading 1}` alone places that block.
 * @throws Error for what a document cannot hold, and where a block is missing or stands twice.
 */
export function documentOf(markdown: string, readings: number): DocNode {
  const content = lexer(markdown).flatMap(block);
  const placed = content.filter(({ type }) => type === 'reading').map(({ attrs }) => Number(attrs?.id));
  const cuts = content.filter(({ type }) => type === 'cut').length;
  const wanted = Array.from({ length: readings }, (_, index) => index + 1);
  if (cuts !== 1 || placed.toSorted((a, b) => a - b).join() !== wanted.join()) {
    throw new Error(`the prose must place the cut and each of ${readings} readings once`);
  }
  return doc(content);
}

function block(token: Token): DocNode[] {
  switch (token.type) {
    case 'space':
      return [];
    case 'paragraph':
      return [recordBlock(token.raw.trim()) ?? { type: 'paragraph', content: inline(token.tokens) }];
    case 'text':
      return [
        {
          type: 'paragraph',
          content: token.tokens ? inline(token.tokens) : [{ type: 'text', text: token.raw }],
        },
      ];
    case 'heading':
      return [{ type: 'heading', attrs: { level: token.depth }, content: inline(token.tokens) }];
    case 'blockquote':
      return [{ type: 'blockquote', content: (token.tokens ?? []).flatMap(block) }];
    case 'list': {
      const { ordered, items } = token as Tokens.List;
      return [
        {
          type: ordered ? 'orderedList' : 'bulletList',
          content: items.map((item) => ({ type: 'listItem', content: item.tokens.flatMap(block) })),
        },
      ];
    }
    default:
      throw new Error(`a document cannot hold a ${token.type}: ${token.raw.slice(0, 40)}`);
  }
}

function recordBlock(line: string): DocNode | null {
  if (line === '{cut}') return CUT_BLOCK;
  const place = /^\{reading (\d+)\}$/.exec(line)?.[1];
  return place === undefined ? null : { type: 'reading', attrs: { id: place } };
}

function inline(tokens: Token[] | undefined, marks: Mark[] = []): DocNode[] {
  return (tokens ?? []).flatMap((token): DocNode[] => {
    switch (token.type) {
      case 'text':
      case 'escape':
        return [{ type: 'text', text: token.text.replaceAll('\n', ' '), ...(marks.length > 0 && { marks }) }];
      case 'strong':
        return inline(token.tokens, [...marks, { type: 'bold' }]);
      case 'em':
        return inline(token.tokens, [...marks, { type: 'italic' }]);
      case 'link':
        return inline(token.tokens, [...marks, { type: 'link', attrs: { href: token.href } }]);
      case 'br':
        return [{ type: 'hardBreak' }];
      default:
        throw new Error(`a line of a document cannot hold a ${token.type}: ${token.raw.slice(0, 40)}`);
    }
  });
}
