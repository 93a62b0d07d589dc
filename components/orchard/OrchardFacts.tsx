import { cellOf } from '@/lib/orchards/cell';
import type { StoredOrchard } from '@/lib/orchards/table';
import { elevationForField } from '@/lib/units/elevation';
import type { Units } from '@/lib/units/units';
import { sayPlace } from './place-words';

type Props = { content: StoredOrchard['content']; units: Units };

/** Where an orchard lies and how it stands, with what others are shown of it. For its members. */
export function OrchardFacts({ content, units }: Props) {
  const { latitude, longitude, elevation, timeZone, place } = content;
  const unit = units === 'imperial' ? 'ft' : 'm';
  const rows: [string, string][] = [
    ['How it stands', sayPlace(place)],
    [
      'Elevation',
      elevation === null ? 'not noted' : `${Math.round(Number(elevationForField(elevation, units)))} ${unit}`,
    ],
    ['Time zone', timeZone],
  ];
  if (latitude !== null && longitude !== null) {
    const cell = cellOf(latitude, longitude);
    rows.push(
      ['Exact point, for members alone', `${latitude}, ${longitude}`],
      ['What everyone else sees', `the cell of 0.1 degree around ${cell.latitude}, ${cell.longitude}`],
    );
  }
  return (
    <dl className="mt-4 max-w-measure">
      {rows.map(([term, text]) => (
        <div key={term} className="flex flex-wrap gap-x-4 border-b border-rule py-2">
          <dt className="min-w-40 text-soft">{term}</dt>
          <dd>{text}</dd>
        </div>
      ))}
    </dl>
  );
}
