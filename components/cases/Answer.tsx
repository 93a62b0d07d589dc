import { TwigMark } from '@/components/twig/TwigMark';
import type { Question } from '@/lib/cases/question';
import { questionHref } from '@/lib/cases/question';
import type { SpeciesCase } from '@/lib/cases/schema';
import { denominators, isThin, nearestCases, thinWords } from '@/lib/cases/standing';
import { CLASS_MIDPOINT } from '@/lib/severity/severity';
import { rateInWords, shareInWords } from '@/lib/words/words';

type Props = { question: Question; name: string; cases: readonly SpeciesCase[]; mayWrite: boolean };

/** What was seen in the very case that was asked for, or that nobody has recorded it, with what is nearest. */
export function Answer({ question, name, cases, mayWrite }: Props) {
  const index = cases.findIndex((one) => one.class === question.class && one.tip === question.tip);
  const seen = cases[index]?.seen;
  const known = seen && seen.rate !== null;
  return (
    <section aria-label="Answer" className="mt-6 grid items-center gap-6 md:grid-cols-2">
      <TwigMark
        severity={question.severity}
        tip={question.tip}
        middle={known ? seen.rate : null}
        high={known && seen.rate !== null && seen.sd !== null ? seen.rate + seen.sd : null}
      />
      <div>
        {known && seen.rate !== null ? (
          <>
            <p>
              <span className="text-answer font-bold">{rateInWords(seen.rate)}</span> new shoots on a branch,
              on average
            </p>
            <p className="mt-2">
              Seen within two weeks of week {question.weeks} on {name} with{' '}
              {question.class === 'uncut' ? 'no cut' : `a ${question.class} cut, tip ${question.tip}`}.
              {seen.sd !== null &&
                seen.entries > 1 &&
                ` Records differ: their spread (SD) is ${rateInWords(seen.sd)}.`}
              {seen.none !== null && seen.none > 0 && ` ${shareInWords(seen.none)} of branches stayed bare.`}
            </p>
            <p className={`mt-4 border-l-4 pl-3 ${isThin(seen) ? 'border-rule text-soft' : 'border-ink'}`}>
              <strong>What stands behind it:</strong> {denominators(seen)}. {thinWords(seen)}{' '}
              <a href={`/species/${question.species}#entries`}>See them</a>
            </p>
          </>
        ) : (
          <NotRecorded question={question} name={name} near={nearestCases(cases, index)} />
        )}
        <p className="mt-5">
          <a className="action" href={mayWrite ? '/entries/new' : '/sign-in?callbackUrl=/entries/new'}>
            Write down a cut
          </a>
        </p>
      </div>
    </section>
  );
}

function NotRecorded({ question, name, near }: { question: Question; name: string; near: SpeciesCase[] }) {
  return (
    <>
      <p className="text-[1.3rem] font-bold">
        Nobody has recorded this cut on {name} at {question.weeks} weeks yet.
      </p>
      {near.length > 0 ? (
        <>
          <p className="mt-2">Nearest, of the same species:</p>
          <ul className="mt-1">
            {near.map((one) => (
              <li key={`${one.class} ${one.tip}`} className="border-b border-rule">
                <a
                  className="inline-flex min-h-finger items-center"
                  href={questionHref({ ...question, severity: CLASS_MIDPOINT[one.class], tip: one.tip })}
                >
                  {one.class === 'uncut' ? 'uncut' : `${one.class}, tip ${one.tip}`}
                </a>
                {': '}
                {one.seen.rate !== null && rateInWords(one.seen.rate)} shoots a branch{' '}
                <span className="text-soft">({denominators(one.seen)})</span>
              </li>
            ))}
          </ul>
        </>
      ) : (
        <p className="mt-2">
          Nor any other cut of it at that time. Ask for another number of weeks, or be the first: cut, count,
          and write it down.
        </p>
      )}
    </>
  );
}
