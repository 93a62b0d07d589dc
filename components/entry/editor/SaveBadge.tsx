'use client';

import { useSyncExternalStore } from 'react';
import { badgeOf } from './badge';
import type { Saver } from './save';

/** Says where the draft is, aloud too. Its shape says it as well as its colour. */
export function SaveBadge({ saver }: { saver: Saver }) {
  const state = useSyncExternalStore(saver.subscribe, saver.state);
  const { mark, text } = badgeOf(state);
  return (
    <p className="flex min-h-finger flex-wrap items-center gap-x-2 text-note text-soft">
      <span className={`badge-mark badge-${mark}`} aria-hidden="true" />
      <span role="status">{text}</span>
      {['signed-out', 'waiting', 'refused', 'invalid'].includes(state.phase) && (
        <button type="button" className="min-h-finger px-2 underline" onClick={() => void saver.flush()}>
          Try now
        </button>
      )}
      {state.phase === 'signed-out' && (
        <a
          href="/sign-in"
          target="_blank"
          rel="noopener"
          className="inline-flex min-h-finger items-center px-2"
        >
          Sign in (another tab)
        </a>
      )}
      {state.phase === 'gone' && (
        <button type="button" className="min-h-finger px-2 underline" onClick={() => void saver.keepMine()}>
          Save it again
        </button>
      )}
    </p>
  );
}
