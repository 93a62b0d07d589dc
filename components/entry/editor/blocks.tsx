'use client';

import { NodeViewWrapper, ReactNodeViewRenderer, type ReactNodeViewProps } from '@tiptap/react';
import { NodeSelection } from '@tiptap/pm/state';
import type { Editor } from '@tiptap/core';
import type { KeyboardEvent, ReactNode } from 'react';
import { CutBlock, ReadingBlock } from '@/lib/documents/extensions';
import { dateInWords, weeksInWords } from '@/lib/words/words';
import { CutFields } from './CutFields';
import { isDate, weeksAfter } from './dates';
import { useCut, useReading } from './editor-context';
import { focusSoon } from './focus';
import { ReadingFields } from './ReadingFields';

/** The fields handle their own events: the prose hears nothing of what happens in a block. */
const ISLAND = { stopEvent: () => true, ignoreMutation: () => true };

/** Enter, on a block that the arrow keys have selected, goes into its first field. */
function enterBlock(editor: Editor): boolean {
  const { selection } = editor.state;
  if (!(selection instanceof NodeSelection) || selection.node.type.spec.group !== 'record') return false;
  const block = editor.view.nodeDOM(selection.from);
  if (!(block instanceof HTMLElement)) return false;
  block.querySelector<HTMLElement>('input, select, textarea, button')?.focus();
  return true;
}

function isCutSelected(editor: Editor): boolean {
  const { selection } = editor.state;
  return selection instanceof NodeSelection && selection.node.type.name === 'cut';
}

export const EditableCut = CutBlock.extend({
  addNodeView: () => ReactNodeViewRenderer(CutView, ISLAND),
  addKeyboardShortcuts() {
    return {
      Enter: () => enterBlock(this.editor),
      // An entry has its cut: the keys that would take it out do nothing.
      Backspace: () => isCutSelected(this.editor),
      Delete: () => isCutSelected(this.editor),
    };
  },
});

export const EditableReading = ReadingBlock.extend({
  addNodeView: () => ReactNodeViewRenderer(ReadingView, ISLAND),
});

function CutView(props: ReactNodeViewProps) {
  const cut = useCut();
  const what = cut.kind === 'none' ? 'Uncut control' : 'Cut';
  return (
    <Block
      {...props}
      heading={isDate(cut.date) ? `${what}, ${dateInWords(cut.date)}` : `${what}, no date yet`}
    >
      <CutFields />
    </Block>
  );
}

function ReadingView(props: ReactNodeViewProps) {
  const id = String(props.node.attrs.id);
  const { date } = useReading(id);
  const weeks = weeksAfter(useCut().date, date);
  const takeOut = () => {
    props.deleteNode();
    focusSoon(`readings.${id}.back`, 'readings');
  };
  const parts = ['Reading', isDate(date) ? dateInWords(date) : 'no date yet'];
  if (weeks !== null) parts.push(weeksInWords(weeks));
  return (
    <Block {...props} heading={parts.join(', ')}>
      <ReadingFields id={id} />
      <button type="button" className="mt-2 min-h-finger underline" onClick={takeOut}>
        Take this reading out
      </button>
    </Block>
  );
}

function Block({
  editor,
  node,
  getPos,
  heading,
  children,
}: ReactNodeViewProps & { heading: string; children: ReactNode }) {
  const leave = (event: KeyboardEvent) => {
    const at = getPos();
    if (event.key !== 'Escape' || at === undefined) return;
    event.preventDefault();
    proseAfter(editor, at + node.nodeSize);
  };
  return (
    <NodeViewWrapper className="record-block" role="group" aria-label={heading} onKeyDown={leave}>
      <h2>{heading}</h2>
      {children}
    </NodeViewWrapper>
  );
}

/** Puts the caret into the prose behind a block, making a line there where none is. */
function proseAfter(editor: Editor, position: number): void {
  const chain = editor.chain();
  if (!editor.state.doc.nodeAt(position)?.isTextblock) chain.insertContentAt(position, { type: 'paragraph' });
  chain.focus(position + 1).run();
}
