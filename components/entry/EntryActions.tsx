import type { EntryView } from '@/lib/entries/schema';
import type { Actor } from '@/lib/people/actor';
import { mayEditEntry, mayJudge, type EntryFacts } from '@/lib/policy/policy';
import { EntryMoves } from './EntryMoves';

type Props = { actor: Actor | null; facts: EntryFacts; entry: EntryView };

/** What this person may do with this entry; nothing is offered that would be refused. */
export function EntryActions({ actor, facts, entry }: Props) {
  const waits = entry.status === 'waiting' || (entry.status === 'accepted' && entry.pending === true);
  if (mayEditEntry(actor, facts)) {
    const open = entry.status !== 'withdrawn' && entry.status !== 'merged';
    return (
      <div className="screen-only mt-6 flex flex-wrap gap-3">
        {open && (
          <a className="action" href={`/entries/${entry.id}/edit`}>
            {entry.status === 'accepted' ? 'Change it or add a reading' : 'Go on writing'}
          </a>
        )}
        <EntryMoves entry={entry} />
      </div>
    );
  }
  if (waits && mayJudge(actor, facts)) {
    return (
      <p className="screen-only mt-6">
        <a className="action" href={`/bench?open=${entry.id}`}>
          Read it on the bench
        </a>
      </p>
    );
  }
  return null;
}
