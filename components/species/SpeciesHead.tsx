import { commonName } from '@/lib/species/catalogue';
import type { Species } from '@/lib/species/schema';
import { sourceWords } from '@/lib/species/sources';
import { sproutingSentence, sproutingSources } from '@/lib/species/sprouting';
import { densityInWords, WOOD_WORDS } from '@/lib/species/wood';
import { plural } from '@/lib/words/words';
import { SourceNote } from './SourceNote';

const LANGUAGES: Record<string, string> = {
  en: 'English',
  es: 'Spanish',
  fr: 'French',
  pt: 'Portuguese',
  sw: 'Swahili',
  hi: 'Hindi',
  id: 'Indonesian',
  fil: 'Filipino',
  haw: 'Hawaiian',
  zh: 'Chinese',
  ha: 'Hausa',
  qu: 'Quechua',
};

/** What is known of a species without any record: its names, its wood, how it answers a hard cut. */
export function SpeciesHead({ species }: { species: Species }) {
  const { woodDensity, wood, season, synonyms } = species;
  return (
    <>
      <h1>{commonName(species)}</h1>
      <p className="mt-1 text-soft">
        <i>{species.scientific}</i>, {species.family}
      </p>
      <dl className="mt-6 max-w-measure space-y-2">
        <div>
          <dt className="inline font-bold">Sprouting. </dt>
          <dd className="inline">
            {sproutingSentence(species)}
            <SourceNote said={sproutingSources(species)} />
          </dd>
        </div>
        <div>
          <dt className="inline font-bold">Wood. </dt>
          <dd className="inline">
            {woodDensity && wood ? (
              <>
                {WOOD_WORDS[wood]}: {densityInWords(woodDensity.value)}, the mean of{' '}
                {woodDensity.level === 'species'
                  ? plural(woodDensity.records, 'record')
                  : `${plural(woodDensity.records, 'relative')} in its genus, for want of its own`}
                <SourceNote said={[sourceWords(woodDensity.source)]} />
              </>
            ) : (
              'density not known'
            )}
          </dd>
        </div>
        {season && (
          <div>
            <dt className="inline font-bold">When. </dt>
            <dd className="inline">
              {season.note}
              <SourceNote said={season.sources.map(sourceWords)} />
            </dd>
          </div>
        )}
        <div>
          <dt className="inline font-bold">Names. </dt>
          <dd className="inline">
            {Object.entries(species.names).map(([language, names], index) => (
              <span key={language}>
                {index > 0 && ' · '}
                <span className="text-soft">{LANGUAGES[language] ?? language}</span>{' '}
                <span lang={language}>{names.join(', ')}</span>
              </span>
            ))}
            {synonyms.length > 0 && (
              <>
                {' · '}
                <span className="text-soft">once called</span> <i>{synonyms.join(', ')}</i>
              </>
            )}
          </dd>
        </div>
      </dl>
    </>
  );
}
