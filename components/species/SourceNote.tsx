/** Where a fact comes from, small beside it. */
export function SourceNote({ said }: { said: readonly string[] }) {
  return <span className="text-note text-soft"> ({said.join('; ')})</span>;
}
