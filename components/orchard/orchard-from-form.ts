import type { FormError } from '@/components/form/ErrorSummary';
import { parseElevation } from '@/lib/units/elevation';
import type { Units } from '@/lib/units/units';

/** Names of the fields, by the paths of the API's errors. */
export const ORCHARD_LABELS: Record<string, string> = {
  name: 'Name',
  latitude: 'Latitude',
  longitude: 'Longitude',
  elevation: 'Elevation',
  timeZone: 'Time zone',
  'place.sun': 'Sun',
  'place.wind': 'Wind',
  'place.water': 'Water',
};

/**
 * What was typed, as the API takes it, or what is wrong with it. A comma counts as a point in a number.
 * @param units of a bare elevation
 */
export function orchardFromForm(form: FormData, units: Units): { body: unknown; faults: FormError[] } {
  const faults: FormError[] = [];
  const text = (name: string) => String(form.get(name) ?? '').trim();
  const missing = (path: string, message: string) => {
    if (text(path) === '') faults.push({ path, message });
  };
  const degrees = (path: string, most: number): number | null => {
    const typed = text(path).replace(/^[\u2212\u2013]/, '-');
    const value = Number(typed.replace(',', '.').replace(/°$/, ''));
    if (typed !== '' && Number.isFinite(value) && Math.abs(value) <= most) return value;
    faults.push({ path, message: `write degrees from -${most} to ${most}, such as 12.3456` });
    return null;
  };
  missing('name', 'how do you call this place?');
  const latitude = degrees('latitude', 90);
  const longitude = degrees('longitude', 180);
  const elevation = parseElevation(text('elevation'), units);
  if (!elevation.ok) faults.push({ path: 'elevation', message: elevation.message });
  missing('place.sun', 'choose one');
  missing('place.wind', 'choose one');
  missing('place.water', 'choose one');
  const body = {
    name: text('name'),
    latitude,
    longitude,
    elevation: elevation.ok ? elevation.metres : null,
    timeZone: text('timeZone') || 'Etc/UTC',
    place: { sun: text('place.sun'), wind: text('place.wind'), water: text('place.water') },
  };
  return { body, faults };
}
