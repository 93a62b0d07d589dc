'use client';

import { useRef, useState, useSyncExternalStore } from 'react';
import type { EntryView } from '@/lib/entries/schema';
import type { FieldError } from '@/lib/errors/errors';
import { ErrorSummary } from './ErrorSummary';
import { send } from './send';
import type { Desk } from './desk';

interface Hindrance {
  readonly at: number;
  readonly title: string;
  readonly errors: readonly FieldError[];
}

/** Sends the record to the bench, or puts it aside. Both save first; neither leaves before that is done. */
export function SendButtons({ desk, status }: { desk: Desk; status: EntryView['status'] }) {
  const [hindrance, setHindrance] = useState<Hindrance | null>(null);
  const { problems, errors, lacks } = useSyncExternalStore(desk.saver.subscribe, desk.saver.state);
  const [isBusy, setBusy] = useState(false);
  // A second click may come before the button is drawn as busy.
  const underWay = useRef(false);
  const once = async (act: () => Promise<void>) => {
    if (underWay.current) return;
    underWay.current = true;
    setBusy(true);
    setHindrance(null);
    await act();
    underWay.current = false;
    setBusy(false);
  };
  const stopped = (title: string, errors: readonly FieldError[] = []) =>
    setHindrance({ at: Date.now(), title, errors });
  const submit = () =>
    once(async () => {
      const result = await send(desk.saver);
      if (result.kind === 'sent') window.location.assign(`/entries/${desk.session.id}`);
      else stopped(result.title, result.errors);
    });
  const putAside = () =>
    once(async () => {
      if (await desk.saver.flush()) return window.location.assign('/entries');
      const { onDevice, problems: unread, errors: refused } = desk.saver.state();
      const where = onDevice
        ? 'It is safe on this device and goes up from this page; it is not on the server yet'
        : 'It is not saved yet';
      stopped(where, [...unread, ...refused]);
    });
  // A line goes as soon as its field is mended, and the box with its last line.
  const standing = (hindrance?.errors ?? []).filter(({ path }) =>
    [...problems, ...errors, ...lacks].some((error) => error.path === path),
  );
  const isShown = hindrance !== null && (standing.length > 0 || hindrance.errors.length === 0);
  return (
    <div className="mt-6">
      {hindrance && isShown && (
        <ErrorSummary
          key={hindrance.at}
          title={hindrance.title}
          errors={standing}
          readingIds={desk.readingIds()}
        />
      )}
      <p className="mb-3 text-note text-soft">
        Place names in the prose are public once the record is. Sending it agrees to the{' '}
        <a href="/data">licence of the open data</a>. The orchard’s place itself is shown only to about 10 km.
      </p>
      <div className="flex flex-wrap gap-2">
        <button
          type="button"
          className="action"
          aria-disabled={isBusy || undefined}
          onClick={() => void submit()}
        >
          Send to the bench
        </button>
        <button
          type="button"
          className="action-plain"
          aria-disabled={isBusy || undefined}
          onClick={() => void putAside()}
        >
          {status === 'draft' || status === 'returned' ? 'Keep as draft' : 'Keep for later'}
        </button>
      </div>
    </div>
  );
}
