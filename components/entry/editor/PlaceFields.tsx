'use client';

import { elevationForField } from '@/lib/units/elevation';
import { capital, SUN_WORDS, WATER_WORDS, WIND_WORDS } from '@/lib/words/words';
import type { EntryForm } from './form';
import { useEditorParts, useForm } from './editor-context';
import { SelectField, TextField } from './fields';
import { SpeciesBox, type SpeciesChoice } from './SpeciesBox';

export interface OrchardChoice {
  readonly id: string;
  readonly name: string;
  readonly place: {
    readonly sun: string | null;
    readonly wind: string | null;
    readonly water: string | null;
  };
  readonly elevation: number | null;
  readonly trees: readonly TreeChoice[];
}

export interface TreeChoice {
  readonly id: string;
  readonly label: string;
  readonly species: string | null;
  readonly cultivar: string | null;
}

const choices = (words: Record<string, string>) =>
  Object.entries(words).map(([value, text]) => [value, capital(text)] as const);
const SUN = choices(SUN_WORDS);
const WIND = choices(WIND_WORDS);
const WATER = choices(WATER_WORDS);

interface Props {
  readonly species: readonly SpeciesChoice[];
  readonly orchards: readonly OrchardChoice[];
}

/** Which tree this is, and what the place is like. An orchard brings its own place, a tree its species. */
export function PlaceFields({ species, orchards }: Props) {
  const { store, units } = useEditorParts();
  const form = useForm((whole) => whole);
  const orchard = orchards.find(({ id }) => id === form.orchard);
  const trees = orchard?.trees ?? [];
  const placeOf = (choice: OrchardChoice) => ({
    sun: choice.place.sun ?? '',
    wind: choice.place.wind ?? '',
    water: choice.place.water ?? '',
    elevation: elevationForField(choice.elevation, units),
  });
  const moveTo = (id: string) => {
    const next = orchards.find((choice) => choice.id === id);
    const own = next && isUntouched(form, orchard ? placeOf(orchard) : null) ? placeOf(next) : {};
    store.set({ orchard: id, tree: '', ...own });
  };
  const take = (id: string) => {
    const tree = trees.find((choice) => choice.id === id);
    store.set({
      tree: id,
      ...(form.species === '' && tree?.species ? { species: tree.species, speciesTyped: '' } : {}),
      ...(form.cultivar === '' && tree?.cultivar ? { cultivar: tree.cultivar } : {}),
    });
  };
  return (
    <fieldset className="my-5">
      <legend className="sr-only">Tree and place</legend>
      <div className="field-row">
        <SpeciesBox species={species} />
        <TextField
          path="cultivar"
          label="Cultivar"
          maxLength={120}
          inputClassName="w-44"
          value={form.cultivar}
          onChange={(cultivar) => store.set({ cultivar })}
        />
        <SelectField
          path="orchard"
          label="Orchard"
          value={form.orchard}
          options={orchards.map(({ id, name }) => [id, name])}
          hint={orchards.length === 0 ? <a href="/orchards/new">Make an orchard first</a> : undefined}
          onChange={moveTo}
        />
        {trees.length > 0 && (
          <SelectField
            path="tree"
            label="Tree"
            value={form.tree}
            options={trees.map(({ id, label }) => [id, label])}
            onChange={take}
          />
        )}
        <SelectField
          path="place.sun"
          label="Sun"
          value={form.sun}
          options={SUN}
          onChange={(sun) => store.set({ sun })}
        />
        <SelectField
          path="place.wind"
          label="Wind"
          value={form.wind}
          options={WIND}
          onChange={(wind) => store.set({ wind })}
        />
        <SelectField
          path="place.water"
          label="Water"
          value={form.water}
          options={WATER}
          onChange={(water) => store.set({ water })}
        />
        <TextField
          path="place.elevation"
          label={`Above the sea, ${units === 'imperial' ? 'ft' : 'm'}`}
          inputMode="text"
          inputClassName="w-24"
          value={form.elevation}
          onChange={(elevation) => store.set({ elevation })}
        />
      </div>
    </fieldset>
  );
}

/** The place is as the orchard before brought it, or empty: then the next orchard may bring its own. */
function isUntouched(
  form: EntryForm,
  brought: Pick<EntryForm, 'sun' | 'wind' | 'water' | 'elevation'> | null,
): boolean {
  return (['sun', 'wind', 'water', 'elevation'] as const).every(
    (name) => form[name] === '' || form[name] === brought?.[name],
  );
}
