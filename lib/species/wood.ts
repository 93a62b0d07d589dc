import type { SpeciesFile, WoodClass } from './schema';

/** Growers' bounds of wood density in g/cm3; between the orchard species' gap from 0.447 to 0.463, and the highest that keeps every oak hard. */
export const SOFT_BELOW = 0.45;
export const HARD_FROM = 0.56;

export function woodClass({ woodDensity }: Pick<SpeciesFile, 'woodDensity'>): WoodClass | null {
  if (!woodDensity) return null;
  if (woodDensity.value < SOFT_BELOW) return 'soft';
  return woodDensity.value >= HARD_FROM ? 'hard' : 'medium';
}

export const WOOD_WORDS: Record<WoodClass, string> = {
  soft: 'soft-wooded',
  medium: 'medium, neither soft nor hard',
  hard: 'hard-wooded',
};

/** To three decimals: with two, 0.447 would read as 0.45 and yet be soft, 0.558 as 0.56 and yet be medium. */
export const densityInWords = (value: number): string => `${value.toFixed(3)} g/cm³`;
