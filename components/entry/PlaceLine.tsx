import type { EntryView } from '@/lib/entries/schema';
import { formatElevation } from '@/lib/units/elevation';
import type { Units } from '@/lib/units/units';
import { SUN_WORDS, WATER_WORDS, WIND_WORDS } from '@/lib/words/words';

/** Where the tree stands, as far as this reader may know. */
export function PlaceLine({ entry, units }: { entry: EntryView; units: Units }) {
  const { sun, wind, water, elevation } = entry.place;
  const words = [
    sun && SUN_WORDS[sun],
    wind && WIND_WORDS[wind],
    water && WATER_WORDS[water],
    elevation !== null && `${formatElevation(elevation, units)} above the sea`,
    entry.cell &&
      `within the cell around ${degrees(entry.cell.latitude, 'N', 'S')} ${degrees(entry.cell.longitude, 'E', 'W')}`,
  ].filter((word): word is string => Boolean(word));
  return words.length === 0 ? null : <p className="text-soft">{words.join(' · ')}</p>;
}

function degrees(value: number, positive: string, negative: string): string {
  return `${Math.abs(value).toFixed(2)}° ${value < 0 ? negative : positive}`;
}
