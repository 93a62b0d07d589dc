'use client';

import type { Editor } from '@tiptap/react';
import { useState, type KeyboardEvent } from 'react';
import { linkFromTyped } from '@/lib/documents/links';

/** Asks where the selected words lead. */
export function LinkForm({ editor, onDone }: { editor: Editor; onDone: () => void }) {
  const [typed, setTyped] = useState(() => String(editor.getAttributes('link').href ?? ''));
  const [isRefused, setRefused] = useState(false);
  const done = () => {
    onDone();
    editor.commands.focus();
  };
  const apply = () => {
    const href = linkFromTyped(typed);
    if (href === null) return setRefused(true);
    const chain = editor.chain().focus().extendMarkRange('link');
    if (editor.state.selection.empty && !editor.isActive('link')) {
      chain.insertContent({ type: 'text', text: typed.trim(), marks: [{ type: 'link', attrs: { href } }] });
    } else {
      chain.setMark('link', { href });
    }
    chain.run();
    onDone();
  };
  const key = (event: KeyboardEvent) => {
    if (event.key === 'Escape') done();
    if (event.key !== 'Enter') return;
    event.preventDefault();
    apply();
  };
  const remove = () => {
    editor.chain().focus().extendMarkRange('link').unsetMark('link').run();
    onDone();
  };
  return (
    <div className="border-b border-rule p-3" role="group" aria-label="Link">
      <div className="field-row">
        <div className="field-cell grow">
          <label htmlFor="link-address">Where the words lead</label>
          <input
            id="link-address"
            className="field w-full"
            type="text"
            inputMode="url"
            // The button that opened this was pressed to type here.
            ref={(input) => input?.focus()}
            placeholder="https://"
            value={typed}
            aria-invalid={isRefused || undefined}
            aria-describedby={isRefused ? 'link-error' : undefined}
            onChange={(event) => {
              setTyped(event.target.value);
              setRefused(false);
            }}
            onKeyDown={key}
          />
        </div>
        <button type="button" className="action-plain beside-field" onClick={apply}>
          Link it
        </button>
        {editor.isActive('link') && (
          <button type="button" className="action-plain beside-field" onClick={remove}>
            Take the link off
          </button>
        )}
        <button type="button" className="action-plain beside-field" onClick={done}>
          Leave it
        </button>
      </div>
      {isRefused && (
        <p id="link-error" className="field-error" role="alert">
          This is not an address on the web, nor an e-mail address.
        </p>
      )}
    </div>
  );
}
