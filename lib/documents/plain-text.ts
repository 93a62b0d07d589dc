import type { DocumentNode } from './schema';

const SPACED = new Set(['bulletList', 'orderedList', 'blockquote']);

/** The prose of a valid document without its blocks and marks: paragraphs parted by an empty line, list items by a dash. */
export function plainText(doc: { content?: unknown }): string {
  return parts(doc as { content?: readonly DocumentNode[] })
    .join('\n\n')
    .trim();
}

function parts(node: { content?: readonly DocumentNode[] }): string[] {
  return (node.content ?? []).map(block).filter((text) => text !== '');
}

function block(node: DocumentNode): string {
  if (node.type === 'bulletList' || node.type === 'orderedList') {
    return (node.content ?? []).map((item) => `- ${parts(item).join('\n')}`).join('\n');
  }
  return SPACED.has(node.type) ? parts(node).join('\n\n') : inline(node).trim();
}

function inline(node: DocumentNode): string {
  if (node.type === 'text') return node.text ?? '';
  if (node.type === 'hardBreak') return '\n';
  return (node.content ?? []).map(inline).join('');
}
