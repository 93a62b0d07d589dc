import { severityClass } from '@/lib/severity/severity';
import { monthOf } from './calendar';
import type { CutContent } from './cuts';
import type { Random } from './random';
import type { RingSpecies } from './species';

const DONE = {
  heading: 'headed',
  reduction: 'reduced to side branches',
  thinning: 'side branches thinned',
  pollarding: 'cut to the heads',
  coppicing: 'cut to the stool',
  none: 'left uncut',
} as const;
const HOW_DEEP = {
  uncut: '',
  light: ' lightly',
  moderate: ' moderately',
  heavy: ' hard',
  severe: ' very hard',
} as const;
const WANTED = {
  size: 'down to picking height',
  width: 'made to spread',
  fruit: 'new bearing wood',
  shade: 'light for what grows below',
  shape: 'put in order',
  health: 'cut back to sound wood',
  rejuvenation: 'an old crown, begun again',
  other: 'for the poles',
} as const;
const MONTHS = 'January February March April May June July August September October November December'.split(
  ' ',
);

/** A title in a grower's few words. It never repeats the tree's own label, which is nobody else's to know. */
export function titleOf(random: Random, species: RingSpecies, cut: CutContent): string {
  const name = capital(species.name);
  const kind = cut.kind ?? 'none';
  const done = DONE[kind];
  const deep = kind === 'heading' && cut.severity !== null ? HOW_DEEP[severityClass(cut.severity)] : '';
  const month = MONTHS[monthOf(cut.date ?? '2000-01-01') - 1] ?? '';
  const choices = [
    `${name}, ${done}${deep}`,
    `${name}, ${done} in ${month}`,
    cut.aim && kind !== 'none'
      ? `${name}: ${cut.aim === 'size' && !species.bears ? 'brought down' : WANTED[cut.aim]}`
      : `${name}, ${month}`,
    cut.tip === 'kept' && kind !== 'none' ? `${name}, tips left on` : `${name}, ${done}`,
    `${month}, ${species.name}`,
  ];
  return random.pick(choices);
}

export function notebookTitle(species: RingSpecies): string {
  return `${capital(species.name)}, from the notebook`;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
