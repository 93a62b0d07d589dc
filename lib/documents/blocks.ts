import type { DocumentNode } from './schema';

export interface Mentioned {
  readonly cut: boolean;
  /** Ids in the order they stand in. */
  readonly readings: readonly string[];
}

/** Which record blocks a valid document places. What it does not mention is shown after it, never left out. */
export function mentionedBlocks(doc: { content?: unknown }): Mentioned {
  const top = Array.isArray(doc.content) ? (doc.content as DocumentNode[]) : [];
  return {
    cut: top.some(({ type }) => type === 'cut'),
    readings: top.flatMap(({ type, attrs }) =>
      type === 'reading' && typeof attrs?.id === 'string' ? [attrs.id] : [],
    ),
  };
}
