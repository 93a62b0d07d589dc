import { z } from 'zod';
import { severityClass, TIPS, type SeverityClass, type Tip } from '@/lib/severity/severity';
import { MOST_WEEKS } from './schema';

/** How deep, as the question offers it. */
export const DEPTHS: readonly { severity: number; words: string }[] = [
  { severity: 0, words: 'nothing' },
  { severity: 0.1, words: 'a tenth' },
  { severity: 0.25, words: 'a quarter' },
  { severity: 0.333333, words: 'a third' },
  { severity: 0.4, words: 'two fifths' },
  { severity: 0.5, words: 'half' },
  { severity: 0.666667, words: 'two thirds' },
  { severity: 0.75, words: 'three quarters' },
];

const DEFAULT = { species: 'ficus-carica', severity: 0.4, tip: 'removed', weeks: 8 } as const;

const Params = z.object({
  species: z.string().max(80).catch(DEFAULT.species),
  severity: z.coerce.number().min(0).max(1).catch(DEFAULT.severity),
  tip: z.enum(TIPS).catch(DEFAULT.tip),
  weeks: z.coerce.number().int().min(1).max(MOST_WEEKS).catch(DEFAULT.weeks),
});

export type Question = { species: string; severity: number; tip: Tip; weeks: number; class: SeverityClass };

/** Reads the question from the address; what cannot be read takes its usual value. An uncut branch keeps its tip. */
export function readQuestion(params: Record<string, string | string[] | undefined>): Question {
  const { species, severity, tip, weeks } = Params.parse(params);
  const name = severityClass(severity);
  return { species, severity, weeks, class: name, tip: name === 'uncut' ? 'kept' : tip };
}

/** The address that asks this. */
export function questionHref({ species, severity, tip, weeks }: Omit<Question, 'class'>): string {
  return `/?${new URLSearchParams({ species, severity: String(severity), tip, weeks: String(weeks) })}`;
}
