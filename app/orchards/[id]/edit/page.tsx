import type { Metadata } from 'next';
import { notFound, redirect } from 'next/navigation';
import { ConfirmButton } from '@/components/form/ConfirmButton';
import { OrchardForm } from '@/components/orchard/OrchardForm';
import { database } from '@/lib/database';
import { orchardForPage } from '@/lib/orchards/find';
import { currentActor } from '@/lib/people/session';
import { mayChangeOrchard } from '@/lib/policy/policy';

export const metadata: Metadata = { title: 'Change an orchard' };

export default async function EditOrchard({ params }: { params: Promise<{ id: string }> }) {
  const { id } = await params;
  const actor = await currentActor();
  if (!actor) redirect(`/sign-in?callbackUrl=/orchards/${encodeURIComponent(id)}/edit`);
  const orchard = await orchardForPage(database(), actor, id);
  if (!orchard || !mayChangeOrchard(actor, orchard.facts)) notFound();
  return (
    <main id="main" className="mx-auto max-w-page px-4 pt-12">
      <h1>Change {orchard.content.name}</h1>
      <OrchardForm orchard={{ id, revision: orchard.revision, ...orchard.content }} units={actor.units} />
      <section className="mt-12 max-w-measure border-t border-rule pt-6">
        <h2 className="mb-3">Remove it</h2>
        <ConfirmButton
          label="Remove this orchard"
          question={`${orchard.content.name} and its trees will be gone for good. It can only go while no entry names it.`}
          yes="Remove it"
          no="Keep it"
          method="DELETE"
          url={`/api/orchards/${id}`}
          ifMatch={orchard.revision}
          then="/orchards"
        />
      </section>
    </main>
  );
}
