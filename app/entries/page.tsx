import type { Metadata } from 'next';
import { EntriesTable } from '@/components/entry/EntriesTable';
import { database } from '@/lib/database';
import { EntryQuery, listEntries } from '@/lib/entries/list';
import { currentActor } from '@/lib/people/session';

export const metadata: Metadata = {
  title: 'Entries',
  description: 'Cuts and what grew after them, as growers wrote them down.',
};

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function EntriesPage({ searchParams }: Props) {
  const actor = await currentActor();
  const { all, cursor } = await searchParams;
  const mine = actor !== null && all !== '1';
  const asked = EntryQuery.safeParse({
    limit: 50,
    ...(mine ? { mine: '1' } : { status: 'accepted' }),
    ...(cursor ? { cursor } : {}),
  });
  const query = asked.success ? asked.data : EntryQuery.parse(mine ? { mine: '1' } : { status: 'accepted' });
  const page = await listEntries(database(), actor, query);
  const next = new URLSearchParams({ ...(all === '1' ? { all: '1' } : {}), cursor: page.nextCursor ?? '' });
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <h1>{mine ? 'My entries' : 'Entries'}</h1>
      {actor && (
        <p className="mt-4 flex flex-wrap items-center gap-4">
          <a className="action" href="/entries/new">
            Write down a cut
          </a>
          <a href={mine ? '/entries?all=1' : '/entries'} className="inline-flex min-h-finger items-center">
            {mine ? 'Everybody’s accepted entries' : 'Mine'}
          </a>
        </p>
      )}
      {page.items.length === 0 ? (
        <p className="mt-6 max-w-measure">
          {mine
            ? 'Nothing here yet. Write down a cut on the day you make it; come back in about eight weeks, count, and add what you see.'
            : 'No accepted entry yet.'}
        </p>
      ) : (
        <EntriesTable entries={page.items} withStatus={mine} />
      )}
      {page.nextCursor && (
        <p className="mt-4">
          <a className="action-plain" href={`/entries?${next}`}>
            Older ones
          </a>
        </p>
      )}
    </main>
  );
}
