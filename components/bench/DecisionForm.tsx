'use client';

import { useState } from 'react';
import { ErrorSummary, errorOf } from '@/components/form/ErrorSummary';
import { describedBy, fieldId, FieldFrame } from '@/components/form/FieldFrame';
import { useSending } from '@/components/form/use-sending';

type Props = {
  id: string;
  /** Of the record that is on the page: a record changed since is not decided on. */
  revision: number;
  readings: readonly { id: string; words: string }[];
};

const HINT = 'The grower sees it. Needed when it goes back.';

/** Accept, or send back with a note; a reading can be set aside, so that the rest may count. */
export function DecisionForm({ id, revision, readings }: Props) {
  const { sending, errors, summary, send } = useSending();
  const [note, setNote] = useState('');
  const [aside, setAside] = useState<readonly string[]>([]);

  async function decide(decision: 'accept' | 'return') {
    const body = { decision, note: note.trim() || null, setAside: decision === 'accept' ? aside : [] };
    const done = await send({
      method: 'POST',
      url: `/api/bench/entries/${id}/decision`,
      body,
      ifMatch: revision,
    });
    if (done) window.location.assign('/bench');
  }

  return (
    <form
      className="mt-6 max-w-measure border-t-2 border-ink pt-4"
      onSubmit={(event) => event.preventDefault()}
    >
      <h3>Your decision</h3>
      <ErrorSummary ref={summary} errors={errors} labels={{ note: 'Note' }} />
      {readings.length > 0 && (
        <fieldset className="mt-4">
          <legend className="font-bold">Set aside: kept and shown, left out of every figure</legend>
          {readings.map((reading) => (
            <label key={reading.id} className="flex min-h-finger items-center gap-3">
              <input
                type="checkbox"
                className="size-5"
                checked={aside.includes(reading.id)}
                onChange={({ target }) =>
                  setAside(
                    target.checked ? [...aside, reading.id] : aside.filter((one) => one !== reading.id),
                  )
                }
              />
              {reading.words}
            </label>
          ))}
        </fieldset>
      )}
      <FieldFrame name="note" label="Note" hint={HINT} error={errorOf(errors, 'note')}>
        <textarea
          id={fieldId('note')}
          rows={3}
          maxLength={2000}
          className="field w-full"
          value={note}
          aria-invalid={errorOf(errors, 'note') ? true : undefined}
          aria-describedby={describedBy('note', HINT, errorOf(errors, 'note'))}
          onChange={({ target }) => setNote(target.value)}
        />
      </FieldFrame>
      <p className="mt-4 flex flex-wrap gap-3">
        <button type="button" className="action" disabled={sending} onClick={() => void decide('accept')}>
          Accept
        </button>
        <button
          type="button"
          className="action-plain"
          disabled={sending}
          onClick={() => void decide('return')}
        >
          Send back with the note
        </button>
      </p>
    </form>
  );
}
