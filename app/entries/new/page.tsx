import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { EditorLoader } from '@/components/entry/editor/EditorLoader';
import { database } from '@/lib/database';
import { choicesFor } from '@/lib/entries/choices';
import { currentActor } from '@/lib/people/session';

export const metadata: Metadata = { title: 'Write down a cut' };

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function NewEntry({ searchParams }: Props) {
  const { orchard, tree } = await searchParams;
  const actor = await currentActor();
  if (!actor) redirect('/sign-in?callbackUrl=/entries/new');
  const start = {
    ...(typeof orchard === 'string' ? { orchard } : {}),
    ...(typeof tree === 'string' ? { tree } : {}),
  };
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <h1 className="sr-only">Write down a cut</h1>
      <EditorLoader
        person={actor.id}
        entry={null}
        start={start}
        units={actor.units}
        {...await choicesFor(database(), actor)}
      />
    </main>
  );
}
