import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { OrchardForm } from '@/components/orchard/OrchardForm';
import { currentActor } from '@/lib/people/session';

export const metadata: Metadata = { title: 'Add an orchard' };

export default async function NewOrchard() {
  const actor = await currentActor();
  if (!actor) redirect('/sign-in?callbackUrl=/orchards/new');
  return (
    <main id="main" className="mx-auto max-w-page px-4 pt-12">
      <h1>Add an orchard</h1>
      <OrchardForm units={actor.units} />
    </main>
  );
}
