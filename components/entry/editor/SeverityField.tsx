'use client';

import {
  CLASS_MIDPOINT,
  severityClass,
  severityInWords,
  SEVERITY_CLASSES,
  type SeverityClass,
} from '@/lib/severity/severity';
import type { CutForm } from './form';
import { severityByLengths } from './form-store';
import { useEditorParts } from './editor-context';
import { FieldNotes, SelectField, useFieldState } from './fields';

const CLASSES = SEVERITY_CLASSES.filter((name) => name !== 'uncut').map(
  (name) => [name, `a ${name} cut`] as const,
);
const VISIBLE_DIFFERENCE = 0.005;

/** "two fifths, a heavy cut", as the slider and its readers say it. */
export function severityText({
  severity,
  severityEstimated,
}: Pick<CutForm, 'severity' | 'severityEstimated'>): string {
  if (severity === null) return 'not said yet';
  const name = severityClass(severity);
  if (name === 'uncut') return 'nothing';
  if (severityEstimated) return `a ${name} cut, not known closer`;
  return `${severityInWords(severity)}, a ${name} cut`;
}

/** How deep the cut went: by eye on a slider, from the lengths, or by its class alone. */
export function SeverityField({ cut }: { cut: CutForm }) {
  const { store, units } = useEditorParts();
  const { message, control } = useFieldState('cut.severity', false);
  if (cut.kind === 'none') {
    return (
      <p className="text-soft">
        Nothing came off: this branch is marked and left, to compare with its neighbours.
      </p>
    );
  }
  const byLengths = severityByLengths(cut, units);
  const differs = byLengths !== null && Math.abs(byLengths - (cut.severity ?? -1)) > VISIBLE_DIFFERENCE;
  const text = severityText(cut);
  return (
    <div>
      <div className="flex flex-wrap gap-x-[0.35em] text-note text-soft">
        <label htmlFor={control.id}>
          How much of the {cut.tip === 'kept' ? 'side growth' : 'branch'} came off:
        </label>
        <strong aria-hidden="true">{text}</strong>
      </div>
      <input
        type="range"
        min={0}
        max={1}
        step={0.01}
        className="h-12 w-full accent-ink"
        value={cut.severity ?? 0}
        aria-valuetext={text}
        {...control}
        onChange={(event) => store.setCut({ severity: Number(event.target.value), severityEstimated: false })}
      />
      <FieldNotes path="cut.severity" message={message} />
      {differs && (
        <p className="text-note">
          The lengths say {severityInWords(byLengths)}.{' '}
          <button
            type="button"
            className="min-h-finger underline"
            onClick={() => store.setCut({ severity: byLengths, severityEstimated: false })}
          >
            Go by the lengths
          </button>
        </p>
      )}
      <SelectField
        path="cut.severityEstimated"
        label="If you only know roughly"
        none="–"
        className="mt-1"
        value={cut.severityEstimated && cut.severity !== null ? severityClass(cut.severity) : ''}
        options={CLASSES}
        onChange={(name) =>
          store.setCut(
            name === ''
              ? { severity: null, severityEstimated: false }
              : { severity: roundedMidpoint(name as SeverityClass), severityEstimated: true },
          )
        }
      />
    </div>
  );
}

function roundedMidpoint(name: SeverityClass): number {
  return Math.round(CLASS_MIDPOINT[name] * 1e6) / 1e6;
}
