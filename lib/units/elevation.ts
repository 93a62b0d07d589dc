import { FOOT_M, type ParsedLength, type Units } from './units';

export const LOWEST_M = -500;
export const HIGHEST_M = 9000;

/** Reads a height above the sea, in the unit named beside the field unless the text names its own (m, ft). */
export function parseElevation(typed: string, units: Units): ParsedLength {
  const text = typed.trim().replace(/^[\u2212\u2013]/, '-');
  if (text === '') return { ok: true, metres: null };
  const read = /^(-?\d{1,6}(?:[.,]\d+)?)\s*(m|ft)?\.?$/i.exec(text);
  if (!read)
    return { ok: false, message: `“${text.slice(0, 20)}” is not a height above the sea. Write a number.` };
  const unit = read[2]?.toLowerCase() ?? (units === 'imperial' ? 'ft' : 'm');
  const metres = Number((read[1] ?? '').replace(',', '.')) * (unit === 'ft' ? FOOT_M : 1);
  const rounded = Math.round(metres * 10) / 10;
  if (rounded < LOWEST_M || rounded > HIGHEST_M) {
    return { ok: false, message: `Land where trees grow lies between ${LOWEST_M} m and ${HIGHEST_M} m.` };
  }
  return { ok: true, metres: rounded };
}

export function elevationForField(metres: number | null, units: Units): string {
  if (metres === null) return '';
  return String(Number((metres / (units === 'imperial' ? FOOT_M : 1)).toFixed(1)));
}

/** An elevation to read: "420 m", "1,380 ft". */
export function formatElevation(metres: number, units: Units): string {
  const value = Math.round(units === 'imperial' ? metres / FOOT_M : metres);
  return `${value.toLocaleString('en-GB')} ${units === 'imperial' ? 'ft' : 'm'}`;
}
