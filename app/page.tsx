import { notFound } from 'next/navigation';
import { Answered } from '@/components/cases/Answered';
import { AskAgain } from '@/components/cases/AskAgain';
import { AskSentence } from '@/components/cases/AskSentence';
import { Still } from '@/components/page/Still';
import { readQuestion } from '@/lib/cases/question';
import { speciesResponse } from '@/lib/cases/species-response';
import { database } from '@/lib/database';
import { currentActor } from '@/lib/people/session';
import { mayKeepRecords } from '@/lib/policy/policy';
import { speciesBySlug } from '@/lib/species/catalogue';
import { dataVersion, speciesSubject } from '@/lib/versions/versions';

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function Home({ searchParams }: Props) {
  const question = readQuestion(await searchParams);
  const species = speciesBySlug(question.species);
  if (!species) notFound();
  const db = database();
  const [version, actor] = await Promise.all([
    dataVersion(db, [speciesSubject(species.slug)]),
    currentActor(),
  ]);
  const mayWrite = mayKeepRecords(actor);
  const asked = JSON.stringify(question);
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <h1 className="sr-only">What a tree does after the cut</h1>
      <AskAgain key={asked}>
        <Still keptBy={`sentence ${asked}`} render={() => <AskSentence question={question} />} />
      </AskAgain>
      <Still
        keptBy={`answer ${asked} ${mayWrite} ${version}`}
        render={async () => {
          const { cases } = await speciesResponse(db, species.slug, question.weeks);
          return <Answered question={question} species={species} cases={cases} mayWrite={mayWrite} />;
        }}
      />
    </main>
  );
}
