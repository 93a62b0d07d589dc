import { TwigMark } from '@/components/twig/TwigMark';
import { isThin } from '@/lib/cases/standing';
import type { SpeciesCase } from '@/lib/cases/schema';
import { questionHref } from '@/lib/cases/question';
import { CLASS_MIDPOINT } from '@/lib/severity/severity';
import { rateInWords, shareInWords } from '@/lib/words/words';

type Props = { species: string; weeks: number; cases: readonly SpeciesCase[]; caption: string };

/** What was seen, case by case. A case that nobody recorded stays in the table and says so. */
export function CasesTable({ species, weeks, cases, caption }: Props) {
  return (
    <table className="mt-4">
      <caption className="pb-2 text-left text-note text-soft">{caption}</caption>
      <thead>
        <tr>
          <th scope="col">cut</th>
          <th scope="col">
            <span className="sr-only">drawn</span>
          </th>
          <th scope="col" className="number">
            shoots a branch
          </th>
          <th scope="col" className="number hidden md:table-cell">
            spread (SD)
          </th>
          <th scope="col" className="number hidden md:table-cell">
            a metre
          </th>
          <th scope="col" className="number hidden sm:table-cell">
            bare
          </th>
          <th scope="col" className="number hidden sm:table-cell">
            branches
          </th>
          <th scope="col" className="number">
            records
          </th>
        </tr>
      </thead>
      <tbody>
        {cases.map((one) => (
          <CaseRow key={`${one.class} ${one.tip}`} species={species} weeks={weeks} {...one} />
        ))}
      </tbody>
    </table>
  );
}

function CaseRow({
  species,
  weeks,
  class: depth,
  tip,
  seen,
}: SpeciesCase & { species: string; weeks: number }) {
  const severity = CLASS_MIDPOINT[depth];
  const name = depth === 'uncut' ? 'uncut control' : `${depth}, tip ${tip}`;
  return (
    <tr className={isThin(seen) ? 'text-soft' : undefined}>
      <th scope="row">
        <a
          href={questionHref({ species, severity, tip, weeks })}
          className="inline-flex min-h-finger items-center"
        >
          {name}
        </a>
      </th>
      <td className="w-20 sm:w-40">
        <TwigMark
          size="small"
          severity={severity}
          tip={tip}
          middle={seen.rate}
          high={seen.rate !== null && seen.sd !== null ? seen.rate + seen.sd : null}
          className="w-16 sm:w-36"
        />
      </td>
      {seen.rate === null ? (
        <td colSpan={6} className="number">
          nobody has recorded it
        </td>
      ) : (
        <>
          <td className="number text-[1.1em] font-bold">{rateInWords(seen.rate)}</td>
          <td className="number hidden md:table-cell">{seen.sd === null ? '–' : rateInWords(seen.sd)}</td>
          <td className="number hidden md:table-cell">
            {seen.perMetre === null ? '–' : rateInWords(seen.perMetre)}
          </td>
          <td className="number hidden sm:table-cell">
            {seen.none === null ? '–' : shareInWords(seen.none)}
          </td>
          <td className="number hidden sm:table-cell">{seen.branches.toLocaleString('en-GB')}</td>
          <td className="number">{seen.entries.toLocaleString('en-GB')}</td>
        </>
      )}
    </tr>
  );
}
