const DAY_MS = 86_400_000;
const RETURN_DAYS = 56;

export function isDate(typed: string): boolean {
  return /^(19|20)\d\d-\d\d-\d\d$/.test(typed) && !Number.isNaN(Date.parse(typed));
}

/** Eight weeks after: when the flush is counted first. */
export function returnDate(cutDate: string): string {
  return new Date(Date.parse(cutDate) + RETURN_DAYS * DAY_MS).toISOString().slice(0, 10);
}

/** Weeks from the cut to a visit, or null where either is not a date yet, or the visit comes first. */
export function weeksAfter(cutDate: string, date: string): number | null {
  if (!isDate(cutDate) || !isDate(date) || date < cutDate) return null;
  return (Date.parse(date) - Date.parse(cutDate)) / DAY_MS / 7;
}

/** Today where the person stands, not in UTC. */
export function today(now = new Date()): string {
  return new Date(now.getTime() - now.getTimezoneOffset() * 60_000).toISOString().slice(0, 10);
}
