import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { parse } from 'yaml';
import { z } from 'zod';
import { CAUTION_CODES, type Species } from './schema';

const Words = z.strictObject({ title: z.string().min(1), text: z.string().min(1) });
const CautionsFile = z.strictObject({
  codes: z.record(z.enum(CAUTION_CODES), Words),
  general: z.array(Words.extend({ source: z.string() })),
});

export type Caution = { code: string; title: string; text: string; source: string };

let file: z.output<typeof CautionsFile> | undefined;
function words() {
  return (file ??= CautionsFile.parse(
    parse(readFileSync(join(process.cwd(), 'content', 'cautions.yaml'), 'utf8')),
  ));
}

/** What must be said before any figure: that it may not sprout, then what is particular to the plant, then what holds for all. */
export function cautionsFor(species: Species): Caution[] {
  const { codes, general } = words();
  const sprouting = fromOldWoodCaution(species);
  return [
    ...(sprouting ? [sprouting] : []),
    ...species.cautions.map(({ code, source }) => ({ code, ...codes[code], source })),
    ...general.map((one) => ({ code: 'general', ...one })),
  ];
}

function fromOldWoodCaution({ resprouts, plant }: Species): Caution | null {
  const source = resprouts.sources.join(', ');
  if (plant === 'palm') {
    return {
      code: 'no-resprout',
      title: 'A palm does not grow back.',
      text: 'Cut below its one growing point, the stem is dead; take off dry leaves alone.',
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

/** How it answers a hard cut, in one sentence. */
export function sproutingSentence({ resprouts, plant }: Species): string {
  if (plant === 'palm') return 'It does not resprout: a palm has one growing point.';
  const degree = {
    freely: 'It resprouts freely after a hard cut',
    moderately: 'It resprouts moderately after a hard cut',
    weakly: 'It resprouts weakly after a hard cut',
    no: 'It does not resprout after a hard cut',
  }[resprouts.degree];
  if (resprouts.degree === 'no') return `${degree}.`;
  const oldWood = {
    yes: 'old wood too',
    weak: 'old wood only weakly',
    no: 'green wood alone, not from old bare wood',
  };
  return `${degree}, from ${oldWood[resprouts.fromOldWood]}.`;
}
