'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useRef, useTransition, type ReactNode } from 'react';
import { isChanged } from '@/components/form/changed';

/** The form around the question: asks again as soon as a word changes. Without a script its button does. */
export function AskAgain({ children }: { children: ReactNode }) {
  const router = useRouter();
  const form = useRef<HTMLFormElement>(null);
  const [asking, start] = useTransition();
  useEffect(() => {
    const here = form.current;
    if (!here) return;
    const again = () => here.requestSubmit();
    // A word may have been changed before this script was there to hear of it.
    if (isChanged(here)) again();
    // The sentence is markup, in which React hears no change.
    here.addEventListener('change', again);
    return () => here.removeEventListener('change', again);
  }, []);
  const ask = () => {
    if (!form.current) return;
    const words = new URLSearchParams();
    new FormData(form.current).forEach((value, name) => words.set(name, String(value)));
    start(() => router.replace(`/?${words}`, { scroll: false }));
  };
  return (
    <form
      ref={form}
      action="/"
      method="get"
      onSubmit={(event) => {
        event.preventDefault();
        ask();
      }}
      className="border-b-2 border-ink pb-4"
    >
      {children}
      <p className="mt-3 flex min-h-finger flex-wrap items-center gap-4">
        <button className="action-plain">Ask</button>
        <span role="status" className="text-note text-soft">
          {asking ? 'Looking it up…' : ''}
        </span>
      </p>
    </form>
  );
}
