import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { sayPlace } from '@/components/orchard/place-words';
import { database } from '@/lib/database';
import { Cursor } from '@/lib/lists/cursor';
import { listOrchards } from '@/lib/orchards/list';
import { currentActor } from '@/lib/people/session';

export const metadata: Metadata = { title: 'Orchards' };

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

/** The orchards somebody keeps or helps in. */
export default async function Orchards({ searchParams }: Props) {
  const actor = await currentActor();
  if (!actor) redirect('/sign-in?callbackUrl=/orchards');
  const cursor = Cursor.safeParse((await searchParams)['cursor']);
  const page = await listOrchards(database(), actor, { limit: 100, cursor: cursor.data });
  return (
    <main id="main" className="mx-auto max-w-page px-4 pt-12">
      <h1>Orchards</h1>
      {page.items.length === 0 ? (
        <p className="mt-4 max-w-measure">
          You keep no orchard here yet. An orchard is a place with trees: add yours, then its trees, then
          write down a cut.
        </p>
      ) : (
        <table className="mt-6">
          <thead>
            <tr>
              <th scope="col">orchard</th>
              <th scope="col">how it stands</th>
              <th scope="col">yours?</th>
            </tr>
          </thead>
          <tbody>
            {page.items.map((orchard) => (
              <tr key={orchard.id}>
                <th scope="row">
                  <a href={`/orchards/${orchard.id}`} className="inline-flex min-h-finger items-center">
                    {orchard.name}
                  </a>
                </th>
                <td>{sayPlace(orchard.place)}</td>
                <td>{orchard.role === 'owner' ? 'yours' : `you help ${orchard.owner}`}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <p className="mt-6 flex flex-wrap gap-3">
        <a href="/orchards/new" className="action">
          Add an orchard
        </a>
        {page.nextCursor && (
          <a href={`/orchards?cursor=${encodeURIComponent(page.nextCursor)}`} className="action-plain">
            More orchards
          </a>
        )}
      </p>
    </main>
  );
}
