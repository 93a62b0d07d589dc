'use client';

import type { Editor } from '@tiptap/react';
import { v7 } from 'uuid';
import { dateInWords } from '@/lib/words/words';
import { isDate } from './dates';
import { useForm } from './editor-context';
import { EMPTY_READING, type ReadingForm } from './form';
import { focusSoon } from './focus';
import { fieldId } from './paths';
import type { Desk } from './desk';

interface Props {
  readonly desk: Desk;
  readonly editor: Editor;
  readonly inDocument: readonly string[];
}

/** Adds a reading, and gives back one that was taken out: its figures are kept as long as the page is open. */
export function Readings({ desk, editor, inDocument }: Props) {
  const readings = useForm((form) => form.readings);
  const out = Object.entries(readings).filter(
    ([id, reading]) => !inDocument.includes(id) && Object.values(reading).some((value) => value !== ''),
  );
  const show = (id: string) => {
    desk.place(id);
    focusSoon(`readings.${id}.date`);
  };
  const add = () => {
    const id = v7();
    desk.store.setReading(id, EMPTY_READING);
    show(id);
  };
  return (
    <div className="mt-3">
      <button
        type="button"
        id={fieldId('readings')}
        className="action-plain"
        disabled={!editor.isEditable}
        onClick={add}
      >
        Add a reading
      </button>
      <div role="status">
        {out.map(([id, reading]) => (
          <p key={id} className="mt-2 border-l-[3px] border-rule pl-3">
            {nameOf(reading)} was taken out.{' '}
            <button
              type="button"
              id={fieldId(`readings.${id}.back`)}
              className="min-h-finger px-2 underline"
              onClick={() => show(id)}
            >
              Put it back
            </button>
          </p>
        ))}
      </div>
    </div>
  );
}

function nameOf({ date, counts }: ReadingForm): string {
  const when = isDate(date) ? `The reading of ${dateInWords(date)}` : 'A reading without a date';
  return counts === '' ? when : `${when}, ${counts},`;
}
