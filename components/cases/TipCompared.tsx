import { TwigMark } from '@/components/twig/TwigMark';
import type { Question } from '@/lib/cases/question';
import type { SpeciesCase } from '@/lib/cases/schema';
import { plural, rateInWords } from '@/lib/words/words';

/** The same depth of cut with the tip removed and with it kept, side by side. */
export function TipCompared({ question, cases }: { question: Question; cases: readonly SpeciesCase[] }) {
  if (question.class === 'uncut') return null;
  const both = (['removed', 'kept'] as const).map((tip) => ({
    tip,
    seen: cases.find((one) => one.class === question.class && one.tip === tip)?.seen,
  }));
  return (
    <section className="mt-12">
      <h2>The same cut, tip left or taken</h2>
      <div className="mt-4 grid gap-8 md:grid-cols-2">
        {both.map(({ tip, seen }) => (
          <div key={tip}>
            <div className={tip === 'removed' ? 'tape-orange' : 'tape-blue'} />
            <p className="mt-2">
              <strong>Tip {tip}</strong>:{' '}
              {seen && seen.rate !== null
                ? `${rateInWords(seen.rate)} shoots a branch, ${plural(seen.entries, 'record')}`
                : 'nobody has recorded it'}
            </p>
            <TwigMark severity={question.severity} tip={tip} middle={seen?.rate ?? null} className="mt-2" />
          </div>
        ))}
      </div>
    </section>
  );
}
