'use client';

import { useEffect, useRef } from 'react';
import type { EntryContent, EntryView } from '@/lib/entries/schema';
import { contentOf } from './content';
import { differences, type Names } from './differences';

interface Props {
  readonly mine: EntryContent;
  readonly theirs: EntryView;
  readonly names: Names;
  readonly onKeepMine: () => void;
  readonly onTakeTheirs: () => void;
}

const WHEN = new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeStyle: 'short' });

/** Both versions of an entry that was changed in two places, field by field, before either is overwritten. */
export function ConflictView({ mine, theirs, names, onKeepMine, onTakeTheirs }: Props) {
  const box = useRef<HTMLElement>(null);
  useEffect(() => box.current?.focus(), []);
  const found = differences(mine, contentOf(theirs), names);
  return (
    <section
      ref={box}
      tabIndex={-1}
      aria-labelledby="conflict"
      className="my-4 border-l-[3px] border-tape bg-wash px-4 py-3"
    >
      <h2 id="conflict">This was also changed elsewhere</h2>
      <p>
        It was saved from another place on {WHEN.format(new Date(theirs.updatedAt))}. Nothing is overwritten
        before you choose.
      </p>
      <div className="overflow-x-auto">
        <table className="mt-2">
          <caption className="sr-only">What differs between the two versions</caption>
          <thead>
            <tr>
              <th scope="col">What differs</th>
              <th scope="col">Mine, here</th>
              <th scope="col">Theirs, stored</th>
            </tr>
          </thead>
          <tbody>
            {found.map(({ path, name, mine: here, theirs: there }) => (
              <tr key={path} className="align-top">
                <th scope="row">{name}</th>
                <td className="whitespace-pre-line">{here}</td>
                <td className="whitespace-pre-line">{there}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <div className="mt-3 flex flex-wrap gap-2">
        <button type="button" className="action" onClick={onKeepMine}>
          Keep mine
        </button>
        <button type="button" className="action-plain" onClick={onTakeTheirs}>
          Take theirs
        </button>
      </div>
    </section>
  );
}
