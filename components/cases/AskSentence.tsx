import { allSpecies, commonName } from '@/lib/species/catalogue';
import { DEPTHS, type Question } from '@/lib/cases/question';
import { MOST_WEEKS } from '@/lib/cases/schema';
import { severityInWords } from '@/lib/severity/severity';

const WORD =
  'inline-block min-h-finger max-w-full cursor-pointer border-0 border-b-2 border-ink bg-transparent px-1 font-bold [field-sizing:content]';

/** The question as one sentence whose words are the controls. */
export function AskSentence({ question }: { question: Question }) {
  const species = [...allSpecies()].sort((a, b) => commonName(a).localeCompare(commonName(b)));
  const depths = DEPTHS.some(({ severity }) => severity === question.severity)
    ? DEPTHS
    : [...DEPTHS, { severity: question.severity, words: severityInWords(question.severity) }].sort(
        (a, b) => a.severity - b.severity,
      );
  return (
    <p className="text-question">
      If I take{' '}
      <select name="severity" aria-label="How much" defaultValue={String(question.severity)} className={WORD}>
        {depths.map(({ severity, words }) => (
          <option key={severity} value={severity}>
            {words}
          </option>
        ))}
      </select>{' '}
      off a limb of{' '}
      <select name="species" aria-label="Species" defaultValue={question.species} className={WORD}>
        {species.map((one) => (
          <option key={one.slug} value={one.slug}>
            {commonName(one).toLowerCase()}
          </option>
        ))}
      </select>{' '}
      and{' '}
      <select name="tip" aria-label="Tip" defaultValue={question.tip} className={WORD}>
        <option value="removed">leave no tip</option>
        <option value="kept">leave the tip</option>
      </select>
      , what will I find after{' '}
      <input
        name="weeks"
        type="number"
        inputMode="numeric"
        min={1}
        max={MOST_WEEKS}
        aria-label="Weeks"
        defaultValue={question.weeks}
        className={`${WORD} min-w-[2.2em] text-center`}
      />{' '}
      weeks?
    </p>
  );
}
