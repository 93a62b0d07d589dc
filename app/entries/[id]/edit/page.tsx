import type { Metadata } from 'next';
import { notFound, redirect } from 'next/navigation';
import { EditorLoader } from '@/components/entry/editor/EditorLoader';
import { database } from '@/lib/database';
import { choicesFor } from '@/lib/entries/choices';
import { readEntryPage } from '@/lib/entries/page';
import { currentActor } from '@/lib/people/session';
import { mayEditEntry } from '@/lib/policy/policy';

export const metadata: Metadata = { title: 'Change an entry' };

type Props = { params: Promise<{ id: string }> };

export default async function EditEntry({ params }: Props) {
  const { id } = await params;
  const actor = await currentActor();
  if (!actor) redirect(`/sign-in?callbackUrl=/entries/${encodeURIComponent(id)}/edit`);
  const { view, facts } = await readEntryPage(database(), actor, id);
  if (!mayEditEntry(actor, facts)) notFound();
  if (view.status === 'withdrawn' || view.status === 'merged') redirect(`/entries/${view.id}`);
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <h1 className="sr-only">Change an entry</h1>
      {view.returnedNote && (
        <p className="mb-5 max-w-measure border-l-4 border-tape pl-3">
          <strong>From the bench:</strong> {view.returnedNote}
        </p>
      )}
      <EditorLoader
        person={actor.id}
        entry={view}
        units={actor.units}
        {...await choicesFor(database(), actor)}
      />
    </main>
  );
}
