const DAY_MS = 86_400_000;

/** The ISO date so many days later (earlier where negative). */
export function addDays(date: string, days: number): string {
  return new Date(Date.parse(`${date}T00:00:00Z`) + days * DAY_MS).toISOString().slice(0, 10);
}

/** Days from one ISO date to another. */
export function daysBetween(from: string, to: string): number {
  return Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / DAY_MS);
}

/** 1 for January to 12 for December. */
export function monthOf(date: string): number {
  return Number(date.slice(5, 7));
}

/** The latest date with this month and day ("02-11") that is not after `latest`. */
export function latestDay(monthAndDay: string, latest: string): string {
  const thisYear = Number(latest.slice(0, 4));
  const candidate = `${thisYear}-${monthAndDay}`;
  return candidate <= latest ? candidate : `${thisYear - 1}-${monthAndDay}`;
}

/** The moment an evening's notes were typed up, never after the start of `today`. */
export function evening(date: string, minutes: number, today: string): Date {
  const then = Date.parse(`${date}T17:00:00Z`) + minutes * 60_000;
  return new Date(Math.min(then, Date.parse(`${today}T00:00:00Z`)));
}
