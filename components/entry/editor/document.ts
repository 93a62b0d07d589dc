import { mentionedBlocks } from '@/lib/documents/blocks';

export type Doc = { type: string; content: Block[] };
type Block = { type: string; [part: string]: unknown };

/** A document to write in: with its cut, with every reading, and with a line of prose before and after them. */
export function editable(doc: Record<string, unknown>, readingIds: readonly string[]): Doc {
  const content = Array.isArray(doc.content) ? [...(doc.content as Block[])] : [];
  const mentioned = mentionedBlocks(doc);
  if (!mentioned.cut) content.push({ type: 'cut' });
  for (const id of readingIds) {
    if (!mentioned.readings.includes(id)) content.push({ type: 'reading', attrs: { id } });
  }
  if (isRecord(content[0])) content.unshift({ type: 'paragraph' });
  if (isRecord(content.at(-1))) content.push({ type: 'paragraph' });
  return { type: 'doc', content };
}

/** The document as it is stored: without the empty lines that only hold the caret. */
export function trimmed(doc: { content?: unknown }): Doc {
  const content = Array.isArray(doc.content) ? [...(doc.content as Block[])] : [];
  while (isBlank(content[0])) content.shift();
  while (isBlank(content.at(-1))) content.pop();
  return { type: 'doc', content };
}

/** The document with these readings taken out of it. */
export function withoutReadings(doc: { content?: unknown }, ids: readonly string[]): Doc {
  const content = Array.isArray(doc.content) ? (doc.content as Block[]) : [];
  const isOut = ({ type, attrs }: Block) =>
    type === 'reading' && ids.includes(String((attrs as { id?: unknown } | undefined)?.id));
  return trimmed({ content: content.filter((block) => !isOut(block)) });
}

function isRecord(block: Block | undefined): boolean {
  return block?.type === 'cut' || block?.type === 'reading';
}

function isBlank(block: Block | undefined): boolean {
  return block?.type === 'paragraph' && !(Array.isArray(block.content) && block.content.length > 0);
}
