/** Counts as they are shouted down a ladder: one number a branch, a dash for a branch lost for other reasons. */

export const MOST_SHOOTS = 999;
export const MOST_BRANCHES = 500;

/** One number a branch, null for a lost one, or a total over branches that were counted together. */
export type Counted =
  { readonly counts: readonly (number | null)[] } | { readonly total: number; readonly branches: number };

export type ParsedCounts =
  { readonly ok: true; readonly value: Counted | null } | { readonly ok: false; readonly message: string };

const DASHES = '-\u2010\u2011\u2012\u2013\u2014\u2015\u2212\uFE58\uFE63\uFF0D';
const LOST = new RegExp(`^(?:[${DASHES}]+|x|lost|gone|broken)$`, 'i');
const TOTAL = /^(\S+?)\s*(?:\bon\b|\/)\s*(\S+?)(?:\s+branch(?:es)?)?$/i;

/**
 * Reads counts as typed: `7 9 - 11`, with spaces, commas, semicolons or `+` between, `x` or `lost` for a lost branch, or
 * a total with its branches, `31 on 4`. Nothing typed is null.
 * @param marked branches that were marked at the cut, where known: more counts than that cannot be.
 */
export function parseCounts(typed: string, marked: number | null = null): ParsedCounts {
  const text = typed.trim();
  if (text === '') return { ok: true, value: null };
  const together = TOTAL.exec(text);
  const parsed = together ? parseTotal(together[1] ?? '', together[2] ?? '') : parseEach(text);
  if (!parsed.ok || parsed.value === null) return parsed;
  const branches = 'counts' in parsed.value ? parsed.value.counts.length : parsed.value.branches;
  const most = marked ?? MOST_BRANCHES;
  if (branches > most) return refuse(tooMany(branches, marked));
  return parsed;
}

/** The same, as somebody would type it. `parseCounts` reads it back to the same counts. */
export function formatCounts(counted: Counted | null): string {
  if (counted === null) return '';
  if ('total' in counted) return `${counted.total} on ${counted.branches}`;
  return counted.counts.map((count) => count ?? '-').join(' ');
}

function parseEach(text: string): ParsedCounts {
  const counts: (number | null)[] = [];
  for (const word of text.split(/[\s,;+]+/).filter((part) => part !== '')) {
    if (LOST.test(word)) {
      counts.push(null);
      continue;
    }
    const count = wholeNumber(word);
    if (typeof count === 'string') return refuse(count);
    if (count > MOST_SHOOTS)
      return refuse(`${count} shoots on one branch cannot be: ${MOST_SHOOTS} at most.`);
    counts.push(count);
  }
  if (counts.length === 0) return refuse('Write a number for each branch, such as 7 9 - 11.');
  return { ok: true, value: { counts } };
}

function parseTotal(total: string, branches: string): ParsedCounts {
  const shoots = wholeNumber(total);
  if (typeof shoots === 'string') return refuse(shoots);
  const counted = wholeNumber(branches);
  if (typeof counted === 'string') return refuse(counted);
  if (counted === 0) return refuse('A total needs the number of branches it was counted on, 1 or more.');
  if (shoots > MOST_SHOOTS * counted) {
    return refuse(
      `${shoots} shoots on ${branchesInWords(counted)} cannot be: ${MOST_SHOOTS} a branch at most.`,
    );
  }
  return { ok: true, value: { total: shoots, branches: counted } };
}

/** The number, or why it cannot be one. */
function wholeNumber(word: string): number | string {
  if (/^\d{1,6}$/.test(word)) return Number(word);
  const negative = new RegExp(`^[${DASHES}]\\d`);
  if (negative.test(word))
    return `“${word}” is below nothing. For a lost branch, write the dash by itself: - ${word.slice(1)}`;
  if (/^\d+\.\d*$|^\d*\.\d+$/.test(word))
    return `“${word}” is a part of a shoot. Count whole shoots of 2 cm or more.`;
  if (/^\d+$/.test(word)) return `“${word}” is more shoots than a branch can bear: ${MOST_SHOOTS} at most.`;
  return `“${word.slice(0, 20)}” is not a count. Write a number, 0 for a bare branch, a dash for a lost one.`;
}

function tooMany(branches: number, marked: number | null): string {
  if (marked === null) return `${branches} branches are more than a record holds: ${MOST_BRANCHES} at most.`;
  return `These are counts for ${branchesInWords(branches)}, but ${marked === 1 ? 'only 1 was' : `${marked} were`} marked at the cut.`;
}

function branchesInWords(branches: number): string {
  return branches === 1 ? '1 branch' : `${branches} branches`;
}

function refuse(message: string): ParsedCounts {
  return { ok: false, message };
}
