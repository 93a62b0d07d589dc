import type { SpeciesResponse } from '@/lib/cases/schema';
import { KIND_WORDS, plural, rateInWords } from '@/lib/words/words';

/** Cuts that are summed up apart, each under its own denominators. */
export function OtherCuts({ otherCuts }: { otherCuts: SpeciesResponse['otherCuts'] }) {
  if (otherCuts.length === 0) return null;
  return (
    <section className="mt-10">
      <h2>Other kinds of cut</h2>
      <p className="mt-2 max-w-measure text-soft">
        Summed up apart: what is left standing differs too much to mix them in.
      </p>
      <ul className="mt-3">
        {otherCuts.map(({ kind, entries, branches, rate }) => (
          <li key={kind} className="border-b border-rule py-2">
            <strong>{KIND_WORDS[kind]}</strong>:{' '}
            {rate === null ? 'not counted' : `${rateInWords(rate)} shoots a branch`}{' '}
            <span className="text-soft">
              ({plural(branches, 'branch', 'branches')} in {plural(entries, 'record')})
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
