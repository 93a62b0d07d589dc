import type { Metadata } from 'next';
import { notFound, redirect } from 'next/navigation';
import { AddTree } from '@/components/orchard/AddTree';
import { EntriesOfOrchard } from '@/components/orchard/EntriesOfOrchard';
import { OrchardFacts } from '@/components/orchard/OrchardFacts';
import { TreesTable } from '@/components/orchard/TreesTable';
import { database } from '@/lib/database';
import { listEntries } from '@/lib/entries/list';
import { orchardForPage } from '@/lib/orchards/find';
import { membersOf, treesOf } from '@/lib/orchards/table';
import { currentActor } from '@/lib/people/session';
import { mayChangeOrchard, mayWriteEntryIn } from '@/lib/policy/policy';
import { allSpecies, commonName } from '@/lib/species/catalogue';

export const metadata: Metadata = { title: 'Orchard' };

/** An orchard as its members see it: its trees, who belongs to it, what was written down there. */
export default async function OrchardPage({ params }: { params: Promise<{ id: string }> }) {
  const { id } = await params;
  const actor = await currentActor();
  if (!actor) redirect(`/sign-in?callbackUrl=/orchards/${encodeURIComponent(id)}`);
  const db = database();
  const orchard = await orchardForPage(db, actor, id);
  if (!orchard) notFound();
  const [trees, members, entries] = await Promise.all([
    treesOf(db, orchard.id),
    membersOf(db, orchard.facts),
    listEntries(db, actor, { orchard: orchard.id, limit: 50 }),
  ]);
  const mayChange = mayChangeOrchard(actor, orchard.facts);
  const mayWrite = mayWriteEntryIn(actor, orchard.facts);
  return (
    <main id="main" className="mx-auto max-w-page px-4 pt-12">
      <h1>{orchard.content.name}</h1>
      <OrchardFacts content={orchard.content} units={actor.units} />
      <p className="mt-6 flex flex-wrap gap-3">
        {mayWrite && (
          <a href={`/entries/new?orchard=${orchard.id}`} className="action">
            Write down a cut
          </a>
        )}
        {mayChange && (
          <a href={`/orchards/${orchard.id}/edit`} className="action-plain">
            Change this orchard
          </a>
        )}
      </p>
      <section className="mt-10">
        <h2>Trees</h2>
        <TreesTable trees={trees} mayChange={mayChange} />
        {mayChange && (
          <details className="mt-4" open={trees.length === 0}>
            <summary className="inline-flex min-h-finger items-center font-bold underline">
              Add a tree
            </summary>
            <AddTree orchardId={orchard.id} species={speciesOptions()} />
          </details>
        )}
      </section>
      <section className="mt-10">
        <h2>Entries</h2>
        <EntriesOfOrchard entries={entries.items} mayWrite={mayWrite} />
        {entries.nextCursor && (
          <p className="mt-3">
            <a href={`/entries?orchard=${orchard.id}`} className="inline-flex min-h-finger items-center">
              All entries of this orchard
            </a>
          </p>
        )}
      </section>
      <section className="mt-10">
        <h2>Members</h2>
        <ul className="mt-2">
          {members.map((member) => (
            <li key={member.id} className="border-b border-rule py-3">
              {member.name}, {member.role}
            </li>
          ))}
        </ul>
      </section>
    </main>
  );
}

function speciesOptions() {
  return allSpecies()
    .map((one) => ({ value: one.slug, text: `${commonName(one)} (${one.scientific})` }))
    .sort((a, b) => a.text.localeCompare(b.text));
}
