import type { Option } from '@/components/form/Select';

/** How a place's three are said. */
export const SUN_OPTIONS: readonly Option[] = [
  { value: 'full', text: 'full sun' },
  { value: 'part', text: 'part sun' },
  { value: 'shade', text: 'shade' },
];
export const WIND_OPTIONS: readonly Option[] = [
  { value: 'sheltered', text: 'sheltered' },
  { value: 'breezy', text: 'breezy' },
  { value: 'exposed', text: 'exposed' },
];
export const WATER_OPTIONS: readonly Option[] = [
  { value: 'dry', text: 'dry' },
  { value: 'moderate', text: 'moderate' },
  { value: 'wet', text: 'wet' },
];

/** `full sun, sheltered, moderate water`, of as much as is known. */
export function sayPlace(place: { sun: string | null; wind: string | null; water: string | null }): string {
  const textOf = (options: readonly Option[], value: string | null) =>
    options.find((option) => option.value === value)?.text;
  const water = textOf(WATER_OPTIONS, place.water);
  const known = [
    textOf(SUN_OPTIONS, place.sun),
    textOf(WIND_OPTIONS, place.wind),
    water === 'moderate' ? 'moderate water' : water,
  ].filter(Boolean);
  return known.length > 0 ? known.join(', ') : 'not noted';
}
