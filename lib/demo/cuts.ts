import type { EntryContent } from '@/lib/entries/schema';
import {
  CLASS_MIDPOINT,
  roundSeverity,
  severityFromLengths,
  type SeverityClass,
  type Tip,
} from '@/lib/severity/severity';
import { monthOf } from './calendar';
import type { Random } from './random';
import type { RingSpecies } from './species';

export type CutContent = EntryContent['cut'];
type Kind = NonNullable<CutContent['kind']>;
type Stage = NonNullable<CutContent['stage']>;

const KINDS: readonly [Kind, number][] = [
  ['heading', 60],
  ['reduction', 23],
  ['none', 6],
  ['thinning', 5],
  ['pollarding', 3.5],
  ['coppicing', 2.5],
];
/** Softer, whippier trees are the ones that are pollarded and coppiced. */
const FOR_POLES = new Set([
  'Salix',
  'Corylus',
  'Castanea',
  'Alnus',
  'Tilia',
  'Sambucus',
  'Morus',
  'Gliricidia',
  'Moringa',
  'Erythrina',
  'Inga',
  'Coffea',
]);
const DEPTHS: readonly [Exclude<SeverityClass, 'uncut'>, number, [number, number]][] = [
  ['light', 23, [0.08, 0.25]],
  ['moderate', 27, [0.26, 0.33]],
  ['heavy', 32, [0.35, 0.5]],
  ['severe', 18, [0.53, 0.88]],
];
type Aim = NonNullable<CutContent['aim']>;
const AIMS: Record<Aim, number> = {
  size: 26,
  width: 14,
  fruit: 20,
  shade: 9,
  shape: 14,
  health: 6,
  rejuvenation: 9,
  other: 2,
};
/** What a cut that leaves the tip on cannot be for, and what alone one to the head or the stool is for. */
const NOT_WITH_TIP: ReadonlySet<Aim> = new Set(['size', 'rejuvenation', 'other']);
const FOR_POLES_ALONE: ReadonlySet<Aim> = new Set(['shade', 'other']);

/** A cut as one of the ring would make it on that day, every length to the centimetre. */
export function drawCut(random: Random, species: RingSpecies, date: string): CutContent {
  const kind = drawKind(random, species);
  const cut: CutContent = {
    date,
    dateApproximate: random.chance(0.03) ? 'month' : null,
    kind,
    severity: 0,
    severityEstimated: false,
    tip: 'kept',
    branches: random.weighted(
      [1, 2, 3, 4, 5, 6, 8, 10],
      (n) => [0, 6, 16, 26, 24, 14, 9, 0, 3.5, 0, 1.5][n] ?? 0,
    ),
    intensity: kind !== 'none' && random.chance(0.5) ? random.whole(1, 12) * 0.05 : null,
    removedLength: null,
    retainedLength: null,
    diameter: null,
    stage: stageOn(random, species, date),
    aim: null,
  };
  if (cut.intensity !== null) cut.intensity = roundSeverity(cut.intensity);
  const lengthM = Math.min(4.5, Math.max(0.4, Math.exp(random.normal(Math.log(1.9), 0.38))));
  if (random.chance(0.6))
    cut.diameter = Math.round((0.009 + lengthM * 0.0165) * Math.exp(random.normal(0, 0.2)) * 1000) / 1000;
  const made = { ...cut, ...depth(random, kind, lengthM) };
  return { ...made, aim: drawAim(random, species, kind, made.tip) };
}

/** How willing the ring is to cut this species in that month, against one another: 0 to 1. */
export function seasonOf(species: RingSpecies, date: string): number {
  const month = monthOf(date);
  if (species.genus === 'Prunus') return month >= 6 && month <= 8 ? 1 : 0.08;
  if (species.leaf === 'deciduous')
    return month === 12 || month <= 2 ? 1 : month >= 6 && month <= 8 ? 0.35 : 0.1;
  return month >= 7 && month <= 10 ? 1 : month <= 3 ? 0.5 : 0.25;
}

function depth(
  random: Random,
  kind: Kind,
  lengthM: number,
): Partial<CutContent> & { severity: number; tip: Tip } {
  if (kind === 'none') {
    return { severity: 0, tip: 'kept', retainedLength: random.chance(0.85) ? centimetres(lengthM) : null };
  }
  if (kind === 'pollarding' || kind === 'coppicing') {
    return byTape(
      lengthM * 1.4,
      kind === 'coppicing' ? random.whole(86, 96) / 100 : random.whole(70, 92) / 100,
    );
  }
  const [name, , [low, high]] = random.weighted(
    DEPTHS.slice(0, kind === 'thinning' ? 2 : undefined),
    ([, share]) => share,
  );
  const share = low + (high - low) * random.uniform();
  const removed = kind === 'heading' ? random.chance(0.9) : kind === 'reduction' && random.chance(0.25);
  if (random.chance(0.14)) {
    return {
      severity: roundSeverity(CLASS_MIDPOINT[name]),
      severityEstimated: true,
      tip: removed ? 'removed' : 'kept',
      retainedLength: random.chance(0.4) ? centimetres(lengthM * (1 - share)) : null,
    };
  }
  if (removed) return byTape(lengthM, share);
  // Side growth is judged by eye, to a twentieth; the branch's own length stays whole.
  const judged = Math.max(0.1, Math.round(share * 20) / 20);
  return {
    severity: roundSeverity(judged),
    tip: 'kept',
    retainedLength: random.chance(0.8) ? centimetres(lengthM) : null,
  };
}

function drawAim(random: Random, species: RingSpecies, kind: Kind, tip: Tip): Aim | null {
  if (kind === 'none' || random.chance(0.15)) return null;
  const aims = (Object.keys(AIMS) as Aim[]).filter((aim) => {
    if (aim === 'fruit' && !species.bears) return false;
    if (kind === 'pollarding' || kind === 'coppicing') return FOR_POLES_ALONE.has(aim);
    return tip === 'removed' || !NOT_WITH_TIP.has(aim);
  });
  return random.weighted(aims, (aim) => AIMS[aim]);
}

function byTape(lengthM: number, share: number): Partial<CutContent> & { severity: number; tip: Tip } {
  const removedLength = Math.max(0.02, centimetres(lengthM * share));
  const retainedLength = Math.max(0.05, centimetres(lengthM * (1 - share)));
  return {
    severity: severityFromLengths(removedLength, retainedLength),
    tip: 'removed',
    removedLength,
    retainedLength,
  };
}

function drawKind(random: Random, species: RingSpecies): Kind {
  const kind = weigh(random, KINDS);
  if ((kind === 'pollarding' || kind === 'coppicing') && !FOR_POLES.has(species.genus)) return 'heading';
  return kind;
}

function stageOn(random: Random, species: RingSpecies, date: string): Stage {
  const month = monthOf(date);
  const fruits = species.vigourM < 1.2;
  if (species.leaf === 'evergreen') {
    if (month >= 7 && month <= 10) return fruits && random.chance(0.7) ? 'after-harvest' : 'growing';
    if (month <= 2) return fruits && random.chance(0.4) ? 'flowering' : 'growing';
    return fruits && random.chance(0.3) ? 'fruiting' : 'growing';
  }
  if (month === 12 || month === 1) return 'dormant';
  if (month === 2) return random.chance(0.85) ? 'dormant' : 'bud-break';
  if (month === 3) return date.slice(8) <= '12' || random.chance(0.4) ? 'bud-break' : 'flowering';
  if (month >= 9 && fruits) return 'after-harvest';
  return fruits && month >= 7 && random.chance(0.4) ? 'fruiting' : 'growing';
}

function weigh<T>(random: Random, items: readonly [T, number][]): T {
  return random.weighted(items, ([, share]) => share)[0];
}

function centimetres(lengthM: number): number {
  return Math.round(lengthM * 100) / 100;
}
