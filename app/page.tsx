import { notFound } from 'next/navigation';
import { Answer } from '@/components/cases/Answer';
import { AskSentence } from '@/components/cases/AskSentence';
import { CasesTable } from '@/components/cases/CasesTable';
import { TipCompared } from '@/components/cases/TipCompared';
import { Cautions } from '@/components/species/Cautions';
import { readQuestion } from '@/lib/cases/question';
import { speciesResponse } from '@/lib/cases/species-response';
import { database } from '@/lib/database';
import { currentActor } from '@/lib/people/session';
import { mayKeepRecords } from '@/lib/policy/policy';
import { allSpecies, commonName, speciesBySlug } from '@/lib/species/catalogue';

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function Home({ searchParams }: Props) {
  const question = readQuestion(await searchParams);
  const species = speciesBySlug(question.species);
  if (!species) notFound();
  const [{ cases }, actor] = await Promise.all([
    speciesResponse(database(), species.slug, question.weeks),
    currentActor(),
  ]);
  const name = commonName(species).toLowerCase();
  const byName = [...allSpecies()].sort((a, b) => commonName(a).localeCompare(commonName(b)));
  const others = cases.filter((one) => one.class === 'uncut' || one.tip === question.tip);
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <h1 className="sr-only">What a tree does after the cut</h1>
      <AskSentence key={JSON.stringify(question)} question={question} species={byName} />
      <Answer question={question} name={name} cases={cases} mayWrite={mayKeepRecords(actor)} />
      <Cautions species={species} />
      <TipCompared question={question} cases={cases} />
      <section className="mt-12">
        <h2>Other depths of cut, tip {question.tip}</h2>
        <CasesTable
          species={species.slug}
          weeks={question.weeks}
          cases={others}
          caption={`Shoots on a branch of ${name}, seen within two weeks of week ${question.weeks}`}
        />
        <p className="mt-3">
          <a href={`/species/${species.slug}`}>All of {name}</a>
        </p>
      </section>
    </main>
  );
}
