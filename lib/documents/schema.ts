/**
 * The document of an entry: prose with record blocks placed in it. A block says where it stands and, for a reading,
 * which one it is; what was measured lives in typed columns and never in here.
 */
export const SCHEMA_VERSION = 1;

export const MOST_DEPTH = 8;
export const MOST_NODES = 5000;
export const MOST_BYTES = 200_000;
export const MOST_LIST_START = 9999;
export const HEADING_LEVELS = [2, 3] as const;

export interface DocumentMark {
  readonly type: string;
  readonly attrs?: Readonly<Record<string, unknown>>;
}

export interface DocumentNode {
  readonly type: string;
  readonly attrs?: Readonly<Record<string, unknown>>;
  readonly marks?: readonly DocumentMark[];
  readonly content?: readonly DocumentNode[];
  readonly text?: string;
}

type Group = 'block' | 'record' | 'item' | 'inline';

interface NodeRule {
  readonly group: Group;
  /** What may stand in it; absent in a node that holds nothing. */
  readonly holds?: readonly Group[];
  /** At least one child is asked for. */
  readonly needsContent?: boolean;
  /** What its first child must be. */
  readonly first?: string;
  readonly attrs?: Readonly<Record<string, (value: unknown) => boolean>>;
  readonly needs?: readonly string[];
}

export const TOP: readonly Group[] = ['block', 'record'];

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i;
const startsAt = (value: unknown) =>
  Number.isInteger(value) && (value as number) >= 0 && (value as number) <= MOST_LIST_START;

/** Every node that may stand in a document, under its top. */
export const NODES: ReadonlyMap<string, NodeRule> = new Map<string, NodeRule>([
  ['text', { group: 'inline' }],
  ['hardBreak', { group: 'inline' }],
  ['paragraph', { group: 'block', holds: ['inline'] }],
  [
    'heading',
    {
      group: 'block',
      holds: ['inline'],
      attrs: { level: (value) => HEADING_LEVELS.some((level) => level === value) },
      needs: ['level'],
    },
  ],
  ['blockquote', { group: 'block', holds: ['block'], needsContent: true }],
  ['bulletList', { group: 'block', holds: ['item'], needsContent: true }],
  ['orderedList', { group: 'block', holds: ['item'], needsContent: true, attrs: { start: startsAt } }],
  ['listItem', { group: 'item', holds: ['block'], needsContent: true, first: 'paragraph' }],
  ['cut', { group: 'record' }],
  [
    'reading',
    {
      group: 'record',
      attrs: { id: (value) => typeof value === 'string' && UUID.test(value) },
      needs: ['id'],
    },
  ],
]);

/** Every mark that text may carry, with the attributes it has. */
export const MARKS: ReadonlyMap<string, readonly string[]> = new Map([
  ['bold', []],
  ['italic', []],
  ['link', ['href']],
]);
