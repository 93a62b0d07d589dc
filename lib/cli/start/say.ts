/** What the commands say goes to standard output, a line a thing. */
export function say(line: string): void {
  console.log(line);
}

/** One line for what a person can mend; the stack only where it is our fault. */
export function plainReason(error: unknown): string {
  if (!(error instanceof Error)) return String(error);
  const isOurs = error.name !== 'Error' || !error.message;
  return isOurs ? (error.stack ?? error.message) : error.message;
}
