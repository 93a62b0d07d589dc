import type { Species } from './schema';
import { allSources, sourceWords } from './sources';

type Sprouting = Pick<Species, 'resprouts' | 'plant'>;

const DEGREE = {
  freely: 'It resprouts freely after a hard cut',
  moderately: 'It resprouts moderately after a hard cut',
  weakly: 'It resprouts weakly after a hard cut',
  no: 'It does not resprout after a hard cut',
} as const;

const FROM_OLD_WOOD = {
  yes: 'from old wood too',
  weak: 'from old wood only weakly',
  no: 'from green wood alone, not from old bare wood',
} as const;

/** How it answers a hard cut, in one sentence. A palm sprouts at its foot if at all: a stem has one growing point. */
export function sproutingSentence({ resprouts: { degree, fromOldWood }, plant }: Sprouting): string {
  if (plant === 'palm') {
    const never = 'a cut stem does not resprout, for it has one growing point.';
    return degree === 'no'
      ? `${never.charAt(0).toUpperCase()}${never.slice(1)}`
      : `It sends up new stems from its foot ${degree}; ${never}`;
  }
  return degree === 'no' ? `${DEGREE.no}.` : `${DEGREE[degree]}, ${FROM_OLD_WOOD[fromOldWood]}.`;
}

/**
 * What stands behind that sentence, part by part: a source that only says whether a species resprouts does not vouch
 * for how freely, nor for old wood.
 */
export function sproutingSources({ resprouts }: Sprouting): string[] {
  const { degree, sources, oldWoodSources } = resprouts;
  const named = sources.filter((key) => key !== 'memory');
  const said = named.map((key) => {
    const alone = allSources().get(key)?.sproutingAlone;
    return alone ? `${sourceWords(key)}, ${alone}` : sourceWords(key);
  });
  if (degree === 'no') return named.length > 0 ? said : ['from memory'];
  const remembered = [
    ...(named.every((key) => allSources().get(key)?.sproutingAlone) ? ['how freely'] : []),
    ...(oldWoodSources.every((key) => key === 'memory') ? ['old wood'] : []),
  ];
  if (named.length === 0 && remembered.length === 2) return ['from memory'];
  const others = oldWoodSources.filter((key) => key !== 'memory' && !named.includes(key)).map(sourceWords);
  return [...said, ...others, ...(remembered.length > 0 ? [`${remembered.join(' and ')} from memory`] : [])];
}
