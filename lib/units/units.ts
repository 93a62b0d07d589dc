/** Lengths are metres inside; the reader's units are a way of writing them down. */

export type Units = 'metric' | 'imperial';

export const INCH_M = 0.0254;
export const FOOT_M = 12 * INCH_M;

export type ParsedLength =
  { readonly ok: true; readonly metres: number | null } | { readonly ok: false; readonly message: string };

const UNIT_M: ReadonlyMap<string, number> = new Map([
  ...['mm', 'millimetre', 'millimetres', 'millimeter', 'millimeters'].map((name) => [name, 0.001] as const),
  ...['cm', 'centimetre', 'centimetres', 'centimeter', 'centimeters'].map((name) => [name, 0.01] as const),
  ...['m', 'metre', 'metres', 'meter', 'meters'].map((name) => [name, 1] as const),
  ...['in', 'inch', 'inches', '"', '″', '”', "''"].map((name) => [name, INCH_M] as const),
  ...['ft', 'foot', 'feet', "'", '′', '’'].map((name) => [name, FOOT_M] as const),
]);

/** Longest unit first, so that two primes are inches and not feet twice. */
const UNIT = [...UNIT_M.keys()].sort((a, b) => b.length - a.length).join('|');
const NUMBER = String.raw`\d+(?:[.,]\d+)?|[.,]\d+`;
const PART = String.raw`(${NUMBER})(?:\s+(\d{1,2})/(\d{1,2}))?\s*(${UNIT})?\.?`;
const WHOLE = new RegExp(String.raw`^(?:${PART})(?:\s*(?:,\s)?${PART})?$`, 'i');

/**
 * Reads a length in metres: `1.8`, `0,31` (a comma is a point here), `75 cm`, `2 ft 6`, `2' 6 1/2"`. A bare number is in the
 * unit named beside the field. Nothing typed is null.
 * @param bare metres in one unit of a bare number: 1 for a field in metres, INCH_M for one in inches.
 * @param mostM the longest length that can be, in metres.
 */
export function parseLength(typed: string, bare: number, mostM = 100): ParsedLength {
  const text = typed.trim();
  if (text === '') return { ok: true, metres: null };
  if (/^[-\u2212\u2013]\s*[\d.,]/.test(text)) return refuse('A length cannot be below 0.');
  const read = WHOLE.exec(text);
  if (!read) return refuse(`“${text.slice(0, 20)}” is not a length. Write it as 0.75, 75 cm, or 2 ft 6 in.`);
  const [, first = '', top, bottom, unit, second, secondTop, secondBottom, secondUnit] = read;
  const firstM = unitOf(unit) ?? bare;
  const metres = amount(first, top, bottom) * firstM;
  if (second === undefined) return within(metres, mostM);
  const secondM = unitOf(secondUnit) ?? smallerUnit(unit);
  if (unit === undefined || secondM === null || secondM >= firstM) {
    return refuse(`“${text.slice(0, 20)}” reads as two lengths. Write one, such as 2 ft 6 in.`);
  }
  return within(metres + amount(second, secondTop, secondBottom) * secondM, mostM);
}

export interface Field {
  /** Short name of the unit a bare number is in, to stand in the field's label. */
  readonly unit: string;
  /** Metres in one of it. */
  readonly unitM: number;
}

/** The unit of a field for lengths along a limb (long) or across it and on shoots (short). */
export function lengthField(units: Units, size: 'long' | 'short'): Field {
  if (units === 'metric') return size === 'long' ? { unit: 'm', unitM: 1 } : { unit: 'cm', unitM: 0.01 };
  return size === 'long' ? { unit: 'ft', unitM: FOOT_M } : { unit: 'in', unitM: INCH_M };
}

/** A length as it stands in its field, without its unit: at most a tenth of a millimetre is lost. */
export function formatForField(metres: number | null, field: Field): string {
  if (metres === null) return '';
  const decimals = field.unitM >= 0.3 ? 4 : 3;
  return String(Number((metres / field.unitM).toFixed(decimals)));
}

/** A length to read: "1.8 m", "31 cm", "2 ft 6 in". Rounded to the centimetre or the half inch; under 10 cm finer. */
export function formatLength(metres: number, units: Units): string {
  if (units === 'metric') {
    if (metres < 0.1) return `${Number((metres * 100).toFixed(1))} cm`;
    return metres < 1 ? `${Math.round(metres * 100)} cm` : `${Number(metres.toFixed(2))} m`;
  }
  const inches = Math.round((metres / INCH_M) * 2) / 2;
  if (metres < 0.1) return `${Number((metres / INCH_M).toFixed(1))} in`;
  if (inches < 12) return `${inches} in`;
  const feet = Math.floor(inches / 12);
  const rest = inches - feet * 12;
  return rest === 0 ? `${feet} ft` : `${feet} ft ${rest} in`;
}

function amount(number: string, top: string | undefined, bottom: string | undefined): number {
  const whole = Number(number.replace(',', '.'));
  return top && bottom && Number(bottom) > 0 ? whole + Number(top) / Number(bottom) : whole;
}

function unitOf(name: string | undefined): number | null {
  return name === undefined ? null : (UNIT_M.get(name.toLowerCase()) ?? null);
}

/** "2 ft 6" goes on in inches, "1 m 20" in centimetres. */
function smallerUnit(name: string | undefined): number | null {
  const unit = unitOf(name);
  if (unit === FOOT_M) return INCH_M;
  return unit === 1 ? 0.01 : null;
}

function within(metres: number, mostM: number): ParsedLength {
  const rounded = Math.round(metres * 1e6) / 1e6;
  if (rounded > mostM) return refuse(`That is over ${mostM} m.`);
  return { ok: true, metres: rounded };
}

function refuse(message: string): ParsedLength {
  return { ok: false, message };
}
