import { parseLength, type Field, type ParsedLength } from '@/lib/units/units';

/** What one field holds: a value that may be stored, or why not. */
export type FieldReading<T> = { readonly value: T | null; readonly problem?: string };

const DAY_MS = 86_400_000;

export function readDate(typed: string, now: Date): FieldReading<string> {
  if (typed === '') return { value: null };
  if (!/^\d{4}-\d{2}-\d{2}$/.test(typed) || Number.isNaN(Date.parse(typed))) return no('is not a date');
  if (typed < '1900-01-01') return no('The year is missing, or lies before 1900.');
  const latest = new Date(now.getTime() + DAY_MS).toISOString().slice(0, 10);
  return typed > latest ? no('This day is still to come.') : { value: typed };
}

export function readWhole(typed: string, low: number, high: number): FieldReading<number> {
  const text = typed.trim();
  if (text === '') return { value: null };
  if (!/^\d{1,9}$/.test(text)) return no(`Write a whole number from ${low} to ${high}.`);
  const value = Number(text);
  return value < low || value > high ? no(`Write a whole number from ${low} to ${high}.`) : { value };
}

/** A share typed in percent. */
export function readPercent(typed: string): FieldReading<number> {
  const text = typed.trim().replace(/\s*%$/, '').replace(',', '.');
  if (text === '') return { value: null };
  const percent = /^\d{1,3}(\.\d+)?$/.test(text) ? Number(text) : Number.NaN;
  if (!(percent >= 0 && percent <= 100)) return no('Write a number from 0 to 100.');
  return { value: Math.round(percent * 1e4) / 1e6 };
}

export function readLength(typed: string, field: Field, mostM = 100): FieldReading<number> {
  return fromParsed(parseLength(typed, field.unitM, mostM));
}

export function fromParsed(parsed: ParsedLength): FieldReading<number> {
  return parsed.ok ? { value: parsed.metres } : no(parsed.message);
}

/** One of the words a list offers, or nothing. */
export function readChoice<T extends string>(typed: string): T | null {
  return typed === '' ? null : (typed as T);
}

export function readText(typed: string): string | null {
  const text = typed.trim();
  return text === '' ? null : text;
}

function no(problem: string): { value: null; problem: string } {
  return { value: null, problem };
}
