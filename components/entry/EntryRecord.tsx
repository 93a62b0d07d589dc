import { mentionedBlocks } from '@/lib/documents/blocks';
import type { EntryView } from '@/lib/entries/schema';
import type { Units } from '@/lib/units/units';
import { CutFacts } from './CutFacts';
import { EntryDocument } from './EntryDocument';
import { ReadingFacts } from './ReadingFacts';

/** The record as it was written: prose with its blocks, then whatever the prose did not place. */
export function EntryRecord({ entry, units }: { entry: EntryView; units: Units }) {
  const mentioned = mentionedBlocks(entry.doc);
  const cut = () => <CutFacts entry={entry} units={units} />;
  const reading = (id: string) => {
    const found = entry.readings.find((one) => one.id === id);
    return found ? <ReadingFacts reading={found} units={units} /> : null;
  };
  return (
    <div className="max-w-measure">
      {!mentioned.cut && cut()}
      <EntryDocument doc={entry.doc} renderCut={cut} renderReading={reading} />
      {entry.readings
        .filter(({ id }) => !mentioned.readings.includes(id))
        .map((one) => (
          <ReadingFacts key={one.id} reading={one} units={units} />
        ))}
    </div>
  );
}
