import type { EntryView } from '@/lib/entries/schema';

const STATUS_WORDS: Record<EntryView['status'], string> = {
  draft: 'draft',
  waiting: 'waits on the bench',
  returned: 'sent back',
  accepted: 'published',
  withdrawn: 'withdrawn',
  merged: 'merged',
};

/** What was written down in an orchard, as far as whoever looks may see it. */
export function EntriesOfOrchard({
  entries,
  mayWrite,
}: {
  entries: readonly EntryView[];
  mayWrite: boolean;
}) {
  if (entries.length === 0) {
    return (
      <p className="mt-2 max-w-measure">
        {mayWrite
          ? 'Nothing is written down here yet. Begin with the last cut you made.'
          : 'Nothing is written down here yet.'}
      </p>
    );
  }
  return (
    <table className="mt-2">
      <thead>
        <tr>
          <th scope="col">entry</th>
          <th scope="col">cut on</th>
          <th scope="col">state</th>
        </tr>
      </thead>
      <tbody>
        {entries.map((entry) => (
          <tr key={entry.id}>
            <th scope="row">
              <a href={`/entries/${entry.id}`} className="inline-flex min-h-finger items-center">
                {entry.title || 'Without a title'}
              </a>
            </th>
            <td>{entry.cut.date ?? 'not said'}</td>
            <td>{STATUS_WORDS[entry.status]}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
