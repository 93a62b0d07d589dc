'use client';

import { useEditorState, type Editor } from '@tiptap/react';
import { useRef, useState, type KeyboardEvent } from 'react';
import { LinkForm } from './LinkForm';

interface Tool {
  readonly name: string;
  /** Null for one that is not on or off. */
  readonly isOn: ((editor: Editor) => boolean) | null;
  readonly isPossible?: (editor: Editor) => boolean;
  readonly act: (editor: Editor) => void;
}

const TOOLS: readonly Tool[] = [
  { name: 'Bold', isOn: (e) => e.isActive('bold'), act: (e) => e.chain().focus().toggleBold().run() },
  { name: 'Italic', isOn: (e) => e.isActive('italic'), act: (e) => e.chain().focus().toggleItalic().run() },
  {
    name: 'Heading',
    isOn: (e) => e.isActive('heading'),
    act: (e) => e.chain().focus().toggleHeading({ level: 2 }).run(),
  },
  {
    name: 'List',
    isOn: (e) => e.isActive('bulletList'),
    act: (e) => e.chain().focus().toggleBulletList().run(),
  },
  {
    name: 'Numbered',
    isOn: (e) => e.isActive('orderedList'),
    act: (e) => e.chain().focus().toggleOrderedList().run(),
  },
  {
    name: 'Quote',
    isOn: (e) => e.isActive('blockquote'),
    act: (e) => e.chain().focus().toggleBlockquote().run(),
  },
];

const HISTORY: readonly Tool[] = [
  { name: 'Undo', isOn: null, isPossible: (e) => e.can().undo(), act: (e) => e.chain().focus().undo().run() },
  { name: 'Redo', isOn: null, isPossible: (e) => e.can().redo(), act: (e) => e.chain().focus().redo().run() },
];

/** What can be done to the prose, in words. One stop for Tab; the arrow keys move along it. */
export function Toolbar({ editor }: { editor: Editor }) {
  const bar = useRef<HTMLDivElement>(null);
  const [at, setAt] = useState(0);
  const [isLinking, setLinking] = useState(false);
  const link: Tool = { name: 'Link', isOn: (e) => e.isActive('link'), act: () => setLinking(true) };
  const tools = [...TOOLS, link, ...HISTORY];
  const states = useEditorState({
    editor,
    selector: ({ editor: now }) =>
      tools.map(({ isOn, isPossible }) => `${isOn?.(now) ?? '-'} ${isPossible?.(now) ?? true}`),
  });
  const move = (event: KeyboardEvent) => {
    const to = { ArrowRight: at + 1, ArrowLeft: at - 1, Home: 0, End: tools.length - 1 }[event.key];
    if (to === undefined) return;
    event.preventDefault();
    const next = (to + tools.length) % tools.length;
    setAt(next);
    bar.current?.querySelectorAll('button')[next]?.focus();
  };
  return (
    <>
      <div ref={bar} role="toolbar" aria-label="Prose" className="toolbar" onKeyDown={move}>
        {tools.map((tool, index) => {
          const [isOn, isPossible] = (states[index] ?? '- true').split(' ');
          return (
            <button
              key={tool.name}
              type="button"
              tabIndex={index === at ? 0 : -1}
              aria-pressed={isOn === '-' ? undefined : isOn === 'true'}
              aria-disabled={isPossible === 'false' || undefined}
              onFocus={() => setAt(index)}
              // Keeps the selection in the prose, which a click on a button would drop.
              onMouseDown={(event) => event.preventDefault()}
              onClick={() => tool.act(editor)}
            >
              {tool.name}
            </button>
          );
        })}
      </div>
      {isLinking && <LinkForm editor={editor} onDone={() => setLinking(false)} />}
    </>
  );
}
