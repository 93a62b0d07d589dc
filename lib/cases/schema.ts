import { z } from 'zod';
import { KINDS } from '@/lib/entries/schema';
import { SEVERITY_CLASSES, TIPS } from '@/lib/severity/severity';

/** What was seen in one case: shoots per pruned branch at the stated number of weeks, zeros included. */
export const Seen = z.object({
  entries: z.number().int(),
  growers: z.number().int(),
  orchards: z.number().int(),
  branches: z.number().int(),
  rate: z.number().nullable(),
  sd: z.number().nullable(),
  perMetre: z.number().nullable(),
  none: z.number().nullable(),
});

export const SpeciesResponse = z.object({
  species: z.string(),
  weeks: z.number(),
  cases: z.array(
    z.object({
      class: z.enum(SEVERITY_CLASSES),
      tip: z.enum(TIPS),
      seen: Seen,
      expected: z.null(),
    }),
  ),
  otherCuts: z.array(
    z.object({
      kind: z.enum(KINDS),
      entries: z.number().int(),
      branches: z.number().int(),
      rate: z.number().nullable(),
    }),
  ),
});
export type SpeciesResponse = z.output<typeof SpeciesResponse>;
export type SpeciesCase = SpeciesResponse['cases'][number];

export const MOST_WEEKS = 104;
export const Weeks = z.coerce
  .number(`must be a number of weeks from 1 to ${MOST_WEEKS}`)
  .min(1, 'must be 1 or more')
  .max(MOST_WEEKS, `must be ${MOST_WEEKS} or less`);
