'use client';

import { parseCounts, type ParsedCounts } from '@/lib/counts/parse';
import { countsSummary } from '@/lib/counts/summary';
import { lengthField } from '@/lib/units/units';
import { DateKnown } from './DateKnown';
import { today } from './dates';
import { useEditorParts, useForm, useReading } from './editor-context';
import { More } from './More';
import { AreaField, TextField } from './fields';

/** The fields of one reading block. */
export function ReadingFields({ id }: { id: string }) {
  const { store, units } = useEditorParts();
  const reading = useReading(id);
  const marked = useForm((form) => (/^\d{1,3}$/.test(form.cut.branches) ? Number(form.cut.branches) : null));
  const { unit } = lengthField(units, 'short');
  const at = (name: string) => `readings.${id}.${name}`;
  return (
    <>
      <div className="field-row">
        <TextField
          path={at('date')}
          type="date"
          label="Date counted"
          value={reading.date}
          onChange={(date) => store.setReading(id, { date })}
        />
        {reading.date === '' && (
          <button
            type="button"
            className="action-plain beside-field"
            onClick={() => store.setReading(id, { date: today() })}
          >
            Today
          </button>
        )}
        <TextField
          path={at('counts')}
          label="Shoots on each branch"
          inputClassName="w-52"
          hint={
            reading.counts === '' ? 'As shouted: 7 9 - 11, a dash for a branch that broke off' : undefined
          }
          value={reading.counts}
          onChange={(counts) => store.setReading(id, { counts })}
        />
        <TextField
          path={at('longestShoot')}
          label={`Longest, ${unit}`}
          inputMode="decimal"
          inputClassName="w-24"
          value={reading.longestShoot}
          onChange={(longestShoot) => store.setReading(id, { longestShoot })}
        />
      </div>
      <Counted parsed={parseCounts(reading.counts, marked)} />
      <More
        summary="Dieback, shoots taken off, a note"
        isOpen={Boolean(
          reading.dieback || reading.removed || reading.kept || reading.note || reading.dateApproximate,
        )}
      >
        <div className="field-row">
          <TextField
            path={at('dieback')}
            label={`Died back, ${unit}`}
            inputMode="decimal"
            inputClassName="w-24"
            value={reading.dieback}
            onChange={(dieback) => store.setReading(id, { dieback })}
          />
          <TextField
            path={at('removed')}
            label="Taken off after counting"
            inputMode="numeric"
            inputClassName="w-24"
            value={reading.removed}
            onChange={(removed) => store.setReading(id, { removed })}
          />
          <TextField
            path={at('kept')}
            label="Kept"
            inputMode="numeric"
            inputClassName="w-24"
            value={reading.kept}
            onChange={(kept) => store.setReading(id, { kept })}
          />
          <DateKnown
            path={at('dateApproximate')}
            value={reading.dateApproximate}
            onChange={(dateApproximate) => store.setReading(id, { dateApproximate })}
          />
        </div>
        <AreaField
          path={at('note')}
          label="Note"
          maxLength={2000}
          className="mt-3"
          value={reading.note}
          onChange={(note) => store.setReading(id, { note })}
        />
      </More>
    </>
  );
}

/** What the counts come to, said aloud as they change. */
function Counted({ parsed }: { parsed: ParsedCounts }) {
  const summary = parsed.ok && parsed.value ? countsSummary(parsed.value) : null;
  return (
    <p className="mt-2 min-h-6" role="status">
      {summary && summary.mean === null && 'Every branch was lost.'}
      {summary && summary.mean !== null && (
        <>
          <strong>{summary.sum}</strong> on{' '}
          {summary.branches === 1 ? '1 branch' : `${summary.branches} branches`}
          {summary.branches > 1 && (
            <>
              , <strong>{summary.mean.toFixed(1)}</strong> each
            </>
          )}
          {summary.lost > 0 && `, ${summary.lost} lost`}
        </>
      )}
    </p>
  );
}
