import { Cautions } from '@/components/species/Cautions';
import type { Question } from '@/lib/cases/question';
import type { SpeciesCase } from '@/lib/cases/schema';
import { commonName } from '@/lib/species/catalogue';
import type { Species } from '@/lib/species/schema';
import { Answer } from './Answer';
import { CasesTable } from './CasesTable';
import { TipCompared } from './TipCompared';

type Props = { question: Question; species: Species; cases: readonly SpeciesCase[]; mayWrite: boolean };

/** The whole answer: what was seen, cautions, the tip treated the other way, other depths. */
export function Answered({ question, species, cases, mayWrite }: Props) {
  const name = commonName(species).toLowerCase();
  return (
    <>
      <Answer question={question} name={name} cases={cases} mayWrite={mayWrite} />
      <Cautions species={species} />
      <TipCompared question={question} cases={cases} />
      <section className="mt-12">
        <h2>Other depths of cut, tip {question.tip}</h2>
        <CasesTable
          species={species.slug}
          weeks={question.weeks}
          cases={cases.filter((one) => one.class === 'uncut' || one.tip === question.tip)}
          caption={`Shoots on a branch of ${name}, seen within two weeks of week ${question.weeks}`}
        />
        <p className="mt-3">
          <a href={`/species/${species.slug}`}>All of {name}</a>
        </p>
      </section>
    </>
  );
}
