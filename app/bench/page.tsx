import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { DecisionForm } from '@/components/bench/DecisionForm';
import { EntryRecord } from '@/components/entry/EntryRecord';
import { PlaceLine } from '@/components/entry/PlaceLine';
import { countedOf } from '@/components/entry/counted';
import { countsInWords } from '@/lib/counts/summary';
import { database } from '@/lib/database';
import { benchQueue, type QueueItem } from '@/lib/entries/queue';
import type { Actor } from '@/lib/people/actor';
import { currentActor } from '@/lib/people/session';
import { mayOpenBench } from '@/lib/policy/policy';
import { commonName, speciesBySlug } from '@/lib/species/catalogue';
import { dateInWords } from '@/lib/words/words';

export const metadata: Metadata = { title: 'Bench', robots: { index: false } };

type Props = { searchParams: Promise<{ open?: string | string[] }> };

export default async function BenchPage({ searchParams }: Props) {
  const actor = await currentActor();
  if (!actor || !mayOpenBench(actor)) notFound();
  const queue = await benchQueue(database(), actor);
  const { open } = await searchParams;
  const opened =
    queue.find(({ entry }) => entry.id === open) ?? queue.find(({ yours }) => !yours) ?? queue[0];
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <h1>The bench</h1>
      {queue.length === 0 ? (
        <p className="mt-4 max-w-measure">
          Nothing waits. Entries come here when growers send them, and changes to accepted ones too; the
          longest waiting stands first.
        </p>
      ) : (
        <>
          <Waiting queue={queue} opened={opened} />
          {opened && <Opened item={opened} actor={actor} />}
        </>
      )}
    </main>
  );
}

function Waiting({ queue, opened }: { queue: QueueItem[]; opened: QueueItem | undefined }) {
  return (
    <table className="mt-4">
      <caption className="pb-2 text-left text-note text-soft">Waiting, the longest first</caption>
      <thead>
        <tr>
          <th scope="col">entry</th>
          <th scope="col">species</th>
          <th scope="col" className="hidden sm:table-cell">
            grower
          </th>
          <th scope="col" className="hidden sm:table-cell">
            what
          </th>
          <th scope="col">since</th>
        </tr>
      </thead>
      <tbody>
        {queue.map(({ entry, reason, yours, waitingSince }) => (
          <tr key={entry.id}>
            <th scope="row">
              <a
                href={`/bench?open=${entry.id}#record`}
                aria-current={entry.id === opened?.entry.id ? 'true' : undefined}
                className="inline-flex min-h-finger items-center"
              >
                {entry.title ?? 'Untitled'}
              </a>
            </th>
            <td>{speciesName(entry.species)}</td>
            <td className="hidden sm:table-cell">{yours ? 'you' : entry.owner}</td>
            <td className="hidden sm:table-cell">{reason === 'entry' ? 'a new entry' : 'a change'}</td>
            <td>{dateInWords(waitingSince.slice(0, 10))}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Opened({ item: { entry, reason, yours }, actor }: { item: QueueItem; actor: Actor }) {
  return (
    <article id="record" className="mt-12">
      <h2>{entry.title ?? 'Untitled entry'}</h2>
      <p className="mt-1 text-soft">
        {speciesName(entry.species)}
        {entry.cultivar && ` ‘${entry.cultivar}’`} · by {entry.owner} ·{' '}
        {reason === 'entry' ? (
          'read here for the first time'
        ) : (
          <>
            a change; <a href={`/entries/${entry.id}`}>its page</a>
          </>
        )}
      </p>
      <PlaceLine entry={entry} units={actor.units} />
      <EntryRecord entry={entry} units={actor.units} />
      {yours ? (
        <p className="mt-6 border-t-2 border-ink pt-4">This one is yours; another moderator decides.</p>
      ) : (
        <DecisionForm
          key={`${entry.id} ${entry.revision}`}
          id={entry.id}
          revision={entry.revision}
          readings={entry.readings.map((reading) => {
            const counted = countedOf(reading);
            const when = reading.date ? dateInWords(reading.date, reading.dateApproximate) : 'no date';
            return {
              id: reading.id,
              words: `${when}: ${counted ? countsInWords(counted) : 'nothing counted'}`,
            };
          })}
        />
      )}
    </article>
  );
}

function speciesName(slug: string | null): string {
  const species = slug ? speciesBySlug(slug) : undefined;
  return species ? commonName(species) : 'no species';
}
