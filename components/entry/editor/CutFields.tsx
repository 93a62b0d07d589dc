'use client';

import { TwigLive } from '@/components/twig/TwigLive';
import { MOST_BRANCHES, parseCounts } from '@/lib/counts/parse';
import { countsSummary } from '@/lib/counts/summary';
import type { Tip } from '@/lib/severity/severity';
import { lengthField } from '@/lib/units/units';
import { AIM_WORDS, dateInWords, KIND_WORDS, STAGE_WORDS } from '@/lib/words/words';
import { DateKnown } from './DateKnown';
import type { EntryForm } from './form';
import { useCut, useEditorParts, useForm } from './editor-context';
import { ChoiceField, SelectField, TextField } from './fields';
import { isDate, returnDate } from './dates';
import { More } from './More';
import { SeverityField } from './SeverityField';

const KINDS = Object.entries(KIND_WORDS);
const STAGES = Object.entries(STAGE_WORDS);
const AIMS = Object.entries(AIM_WORDS);
const TIPS = [
  ['kept', 'kept'],
  ['removed', 'removed'],
] as const;

/** The fields of the cut block, with the mark that moves as they are filled in. */
export function CutFields() {
  const { store, units } = useEditorParts();
  const cut = useCut();
  const middle = useForm(latestMean);
  const { unit } = lengthField(units, 'long');
  const isUncut = cut.kind === 'none';
  const thick = lengthField(units, 'short').unit;
  return (
    <>
      <div className="field-row">
        <TextField
          path="cut.date"
          type="date"
          label={isUncut ? 'Date marked' : 'Date of the cut'}
          value={cut.date}
          onChange={(date) => store.setCut({ date })}
        />
        <SelectField
          path="cut.kind"
          label="Kind"
          value={cut.kind}
          options={KINDS}
          onChange={(kind) => store.setCut({ kind })}
        />
      </div>
      <TwigLive
        className="my-3"
        severity={isUncut ? 0 : cut.severity}
        tip={(isUncut ? 'kept' : cut.tip || 'removed') as Tip}
        middle={middle}
      />
      <SeverityField cut={cut} />
      <div className="field-row mt-3">
        <ChoiceField
          path="cut.tip"
          label="Tip"
          value={isUncut ? 'kept' : cut.tip}
          disabled={isUncut}
          options={TIPS}
          onChange={(tip) => store.setCut({ tip })}
        />
        <TextField
          path="cut.branches"
          label="Branches"
          inputMode="numeric"
          inputClassName="w-20"
          value={cut.branches}
          onChange={(branches) => store.setCut({ branches })}
        />
        {!isUncut && (
          <TextField
            path="cut.removedLength"
            label={`Took, ${unit}`}
            inputMode="decimal"
            inputClassName="w-24"
            value={cut.removedLength}
            onChange={(removedLength) => store.setCut({ removedLength })}
          />
        )}
        <TextField
          path="cut.retainedLength"
          label={`Left, ${unit}`}
          inputMode="decimal"
          inputClassName="w-24"
          value={cut.retainedLength}
          onChange={(retainedLength) => store.setCut({ retainedLength })}
        />
        <SelectField
          path="cut.stage"
          label="Stage"
          value={cut.stage}
          options={STAGES}
          onChange={(stage) => store.setCut({ stage })}
        />
      </div>
      {isDate(cut.date) && (
        <p className="mt-2 text-note text-soft">
          {cut.branches === '1' ? 'Count it' : 'Count every marked branch'} again about{' '}
          {dateInWords(returnDate(cut.date))}, 8 weeks after.
        </p>
      )}
      <More
        summary="More about the cut"
        isOpen={Boolean(cut.aim || cut.intensity || cut.diameter || cut.dateApproximate)}
      >
        <div className="field-row">
          <SelectField
            path="cut.aim"
            label="Aim"
            value={cut.aim}
            options={AIMS}
            onChange={(aim) => store.setCut({ aim })}
          />
          <TextField
            path="cut.intensity"
            label="Share of the tree’s limbs cut, %"
            inputMode="decimal"
            inputClassName="w-24"
            value={cut.intensity}
            onChange={(intensity) => store.setCut({ intensity })}
          />
          <TextField
            path="cut.diameter"
            label={`Thick at the cut, ${thick}`}
            inputMode="decimal"
            inputClassName="w-24"
            value={cut.diameter}
            onChange={(diameter) => store.setCut({ diameter })}
          />
          <DateKnown
            path="cut.dateApproximate"
            value={cut.dateApproximate}
            onChange={(dateApproximate) => store.setCut({ dateApproximate })}
          />
        </div>
      </More>
    </>
  );
}

/** Shoots a branch at the latest reading that can be read, for the mark. */
function latestMean({ readings }: EntryForm): number | null {
  const latest = Object.values(readings)
    .filter(({ date, counts }) => date !== '' && counts !== '')
    .sort((a, b) => (a.date < b.date ? 1 : -1))[0];
  const parsed = latest ? parseCounts(latest.counts, MOST_BRANCHES) : null;
  return parsed?.ok && parsed.value ? countsSummary(parsed.value).mean : null;
}
