'use client';

import { useState } from 'react';
import { ErrorSummary } from './ErrorSummary';
import { useSending } from './use-sending';

type Props = {
  /** What the button does, such as `Remove this orchard`. */
  label: string;
  /** What is asked before it is done, with whom or what it concerns. */
  question: string;
  yes: string;
  no: string;
  method: 'POST' | 'DELETE';
  url: string;
  ifMatch?: number;
  /** Where to go afterwards; without it the page is loaded again. */
  then?: string;
};

/** A button that asks once more before it does something, in its own place. */
export function ConfirmButton({ label, question, yes, no, method, url, ifMatch, then }: Props) {
  const [asking, setAsking] = useState(false);
  const { sending, errors, summary, send } = useSending();

  async function act() {
    if (!(await send({ method, url, ifMatch }))) return;
    if (then) location.assign(then);
    else location.reload();
  }

  if (!asking) {
    return (
      <button type="button" className="action-plain" onClick={() => setAsking(true)}>
        {label}
      </button>
    );
  }
  return (
    <div role="group" aria-label={label}>
      <p>{question}</p>
      <ErrorSummary ref={summary} errors={errors} labels={{}} />
      <p className="mt-2 flex flex-wrap gap-3">
        <button type="button" className="action" disabled={sending} onClick={() => void act()}>
          {yes}
        </button>
        <button
          type="button"
          className="action-plain"
          autoFocus
          disabled={sending}
          onClick={() => setAsking(false)}
        >
          {no}
        </button>
      </p>
    </div>
  );
}
