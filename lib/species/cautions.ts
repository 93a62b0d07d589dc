import { z } from 'zod';
import { readContent } from './read-yaml';
import { CAUTION_CODES, type Species } from './schema';

const text = z.string('must be text').min(1, 'must not be empty');
const Words = z.strictObject({ title: text, text });
const CautionsFile = z.strictObject({
  codes: z.record(z.enum(CAUTION_CODES), Words),
  general: z.array(z.strictObject({ code: text, title: text, text, source: text }), 'must be a list'),
});

export type Caution = { code: string; title: string; text: string; source: string };

let file: z.output<typeof CautionsFile> | undefined;
const words = () => (file ??= readContent('content/cautions.yaml', CautionsFile));

/** What is particular to a species: first that it may not sprout, then the cautions of its file. */
export function ownCautions(species: Species): Caution[] {
  const sprouting = fromOldWoodCaution(species);
  return [
    ...(sprouting ? [sprouting] : []),
    ...species.cautions.map(({ code, source }) => ({ code, ...words().codes[code], source })),
  ];
}

/** What holds for every cut. */
export const generalCautions = (): readonly Caution[] => words().general;

/** All that must be said before any figure, in the order in which to say it. */
export const cautionsFor = (species: Species): Caution[] => [...ownCautions(species), ...generalCautions()];

function fromOldWoodCaution({ resprouts, plant }: Species): Caution | null {
  const source = resprouts.oldWoodSources.join(', ');
  if (plant === 'palm') {
    return {
      code: 'no-resprout',
      title: 'A cut palm stem does not grow back.',
      text: 'It has one growing point, and cut below that it is dead. On a stem you want to keep, take off dry leaves alone.',
      source,
    };
  }
  if (resprouts.fromOldWood === 'no') {
    return {
      code: 'no-resprout',
      title: 'Does not resprout from old bare wood.',
      text: 'A limb cut back behind its last green side shoot stays bare or dies. Cut only where there is leaf to carry on.',
      source,
    };
  }
  if (resprouts.fromOldWood === 'weak') {
    return {
      code: 'weak-resprout',
      title: 'Resprouts weakly from old wood.',
      text: 'Leave some leaf on every limb, and take a large limb back over more than one season.',
      source,
    };
  }
  return null;
}
