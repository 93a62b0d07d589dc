import { TwigMark } from '@/components/twig/TwigMark';
import type { EntryView } from '@/lib/entries/schema';
import { severityInWords } from '@/lib/severity/severity';
import { formatLength, type Units } from '@/lib/units/units';
import { AIM_WORDS, capital, dateInWords, KIND_WORDS, plural, STAGE_WORDS } from '@/lib/words/words';
import { countedMean } from './counted';

/** The cut of an entry: its mark and its values, what was not noted left out. */
export function CutFacts({ entry, units }: { entry: EntryView; units: Units }) {
  const { cut } = entry;
  const last = entry.readings.findLast((reading) => !reading.thinned && countedMean(reading) !== null);
  return (
    <section className="my-6 border-l-[3px] border-ink bg-wash px-4 py-4" aria-label="The cut">
      <h3>{cut.date ? `Cut, ${dateInWords(cut.date, cut.dateApproximate)}` : 'Cut, no date yet'}</h3>
      {cut.severity !== null && (
        <TwigMark
          className="my-3 max-w-measure"
          severity={cut.severity}
          tip={cut.tip ?? 'kept'}
          middle={last ? countedMean(last) : null}
        />
      )}
      <dl className="grid grid-cols-[max-content_1fr] gap-x-5 gap-y-1">
        {facts(entry, units).map(([name, value]) => (
          <div key={name} className="contents">
            <dt className="text-soft">{name}</dt>
            <dd>{value}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}

function facts({ cut, class: severity }: EntryView, units: Units): [string, string][] {
  const length = (metres: number) => formatLength(metres, units);
  const all: [string, string | null][] = [
    ['Kind', cut.kind && KIND_WORDS[cut.kind]],
    ['How deep', cut.severity === null ? null : depth(cut, severity)],
    ['Tip', cut.tip],
    ['Branches marked', cut.branches === null ? null : plural(cut.branches, 'branch', 'branches')],
    ['Taken', cut.removedLength === null ? null : length(cut.removedLength)],
    ['Left', cut.retainedLength === null ? null : length(cut.retainedLength)],
    ['Thick at the cut', cut.diameter === null ? null : length(cut.diameter)],
    ['Share of limbs cut', cut.intensity === null ? null : `${Math.round(cut.intensity * 100)} %`],
    ['Stage', cut.stage && STAGE_WORDS[cut.stage]],
    ['Aim', cut.aim && AIM_WORDS[cut.aim]],
  ];
  return all.filter((fact): fact is [string, string] => fact[1] !== null);
}

function depth(cut: EntryView['cut'], severity: EntryView['class']): string {
  if (cut.severity === 0) return 'not cut: a control to compare with';
  const said = cut.severityEstimated
    ? `a ${severity} cut, its depth estimated from the class`
    : `${severityInWords(cut.severity ?? 0)} ${cut.tip === 'kept' ? 'of the side growth' : 'of the branch'}, a ${severity} cut`;
  return capital(said);
}
