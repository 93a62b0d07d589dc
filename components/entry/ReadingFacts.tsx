import { formatCounts } from '@/lib/counts/parse';
import { countsInWords } from '@/lib/counts/summary';
import type { ReadingView } from '@/lib/entries/schema';
import { formatLength, type Units } from '@/lib/units/units';
import { dateInWords, plural, weeksInWords } from '@/lib/words/words';
import { countedOf } from './counted';

/** One return visit as it was noted. */
export function ReadingFacts({ reading, units }: { reading: ReadingView; units: Units }) {
  const counted = countedOf(reading);
  const when = reading.date ? dateInWords(reading.date, reading.dateApproximate) : 'no date yet';
  const weeks = reading.weeks === null ? '' : `, ${weeksInWords(reading.weeks)}`;
  return (
    <section className="my-6 border-l-[3px] border-ink bg-wash px-4 py-4" aria-label={`Reading, ${when}`}>
      <h3>
        Reading, {when}
        {weeks}
      </h3>
      {counted ? (
        <p className="mt-1">
          {'counts' in counted && <span className="mr-4">{formatCounts(counted)}</span>}
          <strong>{countsInWords(counted)}</strong>
        </p>
      ) : (
        <p className="mt-1 text-soft">Nothing counted yet.</p>
      )}
      <p className="text-soft">{extras(reading, units).join(' · ')}</p>
      {reading.note && <p className="mt-1 whitespace-pre-line">{reading.note}</p>}
      {reading.thinned && (
        <p className="mt-1 text-note text-soft">
          Flush had been taken off before: shown here, and left out of every summary.
        </p>
      )}
      {reading.setAside && (
        <p className="mt-1 text-note text-soft">Set aside by the bench: left out of every summary.</p>
      )}
    </section>
  );
}

function extras(reading: ReadingView, units: Units): string[] {
  const length = (metres: number) => formatLength(metres, units);
  return [
    ...(reading.longestShoot === null ? [] : [`longest ${length(reading.longestShoot)}`]),
    ...(reading.dieback === null
      ? []
      : [reading.dieback === 0 ? 'no dieback' : `${length(reading.dieback)} died back`]),
    ...(reading.removed === null || reading.removed === 0
      ? []
      : [`${plural(reading.removed, 'shoot')} then taken off`]),
    ...(reading.kept === null ? [] : [`${reading.kept} kept`]),
  ];
}
