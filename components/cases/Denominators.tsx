/** What each column of the table is a share of. */
export function Denominators({ weeks }: { weeks: number }) {
  return (
    <div className="mt-3 max-w-measure text-note text-soft">
      <p>
        <strong>Shoots a branch</strong>: all new shoots over all pruned branches that were counted, bare ones
        included, lost ones left out, at the last visit within two weeks of week {weeks}.{' '}
        <strong>Spread</strong>: standard deviation of the records’ own rates. <strong>A metre</strong>:
        shoots for each metre of wood left, where lengths were measured. <strong>Bare</strong>: share of
        branches without one shoot. Rows in soft ink rest on fewer than five records, or on one grower.
        Branches thinned at an earlier visit are in none of it.
      </p>
      <p className="mt-2">
        These are sums of what was seen, and not a forecast: orchards and hands differ.{' '}
        <a href="/guides/counting">How to count</a> · <a href="/data">the data</a>
      </p>
    </div>
  );
}
