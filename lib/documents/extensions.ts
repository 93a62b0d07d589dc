import { Mark, Node, type Extensions } from '@tiptap/core';
import { Blockquote } from '@tiptap/extension-blockquote';
import { Bold } from '@tiptap/extension-bold';
import { Document } from '@tiptap/extension-document';
import { HardBreak } from '@tiptap/extension-hard-break';
import { Heading } from '@tiptap/extension-heading';
import { Italic } from '@tiptap/extension-italic';
import { BulletList, ListItem, OrderedList } from '@tiptap/extension-list';
import { Paragraph } from '@tiptap/extension-paragraph';
import { Text } from '@tiptap/extension-text';
import { isSafeLink } from './links';
import { HEADING_LEVELS, MOST_LIST_START } from './schema';

/** A link that leads out of the record and brings nothing back: no referrer, no opener, no endorsement. */
export const Link = Mark.create({
  name: 'link',
  inclusive: false,
  addAttributes: () => ({ href: { default: null } }),
  parseHTML: () => [
    { tag: 'a[href]', getAttrs: (element) => (isSafeLink(element.getAttribute('href')) ? null : false) },
  ],
  renderHTML({ HTMLAttributes }) {
    const href: unknown = HTMLAttributes.href;
    return ['a', { href: isSafeLink(href) ? href : '', rel: 'noopener noreferrer nofollow ugc' }, 0];
  },
});

/** The one cut of the entry. Values are kept apart from the document. */
export const CutBlock = Node.create({
  name: 'cut',
  group: 'record',
  atom: true,
  draggable: false,
  parseHTML: () => [{ tag: 'div[data-block="cut"]' }],
  renderHTML: () => ['div', { 'data-block': 'cut' }],
});

/** One reading of the entry, by its id. */
export const ReadingBlock = Node.create({
  name: 'reading',
  group: 'record',
  atom: true,
  draggable: false,
  addAttributes: () => ({
    id: { default: null, parseHTML: (element: HTMLElement) => element.getAttribute('data-reading') },
  }),
  parseHTML: () => [{ tag: 'div[data-block="reading"]' }],
  renderHTML: ({ node }) => ['div', { 'data-block': 'reading', 'data-reading': String(node.attrs.id) }],
});

/** Numbers alone: a list pasted with letters or a negative start becomes an ordinary one. */
const Numbered = OrderedList.extend({
  addAttributes: () => ({
    start: { default: 1, parseHTML: (element: HTMLElement) => firstNumber(element.getAttribute('start')) },
  }),
});

/** Tab leaves the prose, as it leaves any field: the list's own use of it would hold a keyboard in the list. */
const Item = ListItem.extend({
  addKeyboardShortcuts() {
    return { Enter: () => this.editor.commands.splitListItem(this.name) };
  },
});

/** Prose without its blocks: what the editor and the server's renderer have in common. */
export const PROSE: Extensions = [
  Document.extend({ content: '(block | record)+' }),
  Paragraph,
  Text,
  Bold,
  Italic,
  Link,
  HardBreak,
  Heading.configure({ levels: [...HEADING_LEVELS] }),
  Blockquote,
  BulletList,
  Numbered,
  Item,
];

function firstNumber(start: string | null): number {
  const number = Number(start ?? 1);
  return Number.isInteger(number) && number >= 0 && number <= MOST_LIST_START ? number : 1;
}
