'use client';

import { useState, type KeyboardEvent } from 'react';
import { useEditorParts, useForm } from './editor-context';
import { FieldNotes, useFieldState } from './fields';

export interface SpeciesChoice {
  readonly slug: string;
  readonly name: string;
  readonly scientific: string;
  /** Its other names, in any language, and its synonyms. */
  readonly also?: readonly string[];
}

const MOST_SHOWN = 8;

/** Species by their common or scientific name: a text field with a list that narrows as one types. */
export function SpeciesBox({ species }: { species: readonly SpeciesChoice[] }) {
  const { store } = useEditorParts();
  const chosen = useForm((form) => form.species);
  const typed = useForm((form) => form.speciesTyped);
  const [isOpen, setOpen] = useState(false);
  const [at, setAt] = useState(-1);
  const { message, typed: onTyped, control } = useFieldState('species', false);

  const current = species.find(({ slug }) => slug === chosen);
  const text = current ? label(current) : typed;
  const found = isOpen ? matching(species, current ? '' : typed) : [];
  const choose = (choice: SpeciesChoice) => {
    store.set({ species: choice.slug, speciesTyped: '' });
    setOpen(false);
    setAt(-1);
  };
  const key = (event: KeyboardEvent) => {
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      event.preventDefault();
      setOpen(true);
      const step = event.key === 'ArrowDown' ? 1 : -1;
      const count = found.length + 1;
      setAt(((at + 1 + step + count) % count) - 1);
    } else if (event.key === 'Enter' && isOpen) {
      event.preventDefault();
      const choice = found[Math.max(at, 0)];
      if (choice) choose(choice);
    } else if (event.key === 'Escape' && isOpen) {
      event.preventDefault();
      setOpen(false);
    }
  };
  /** Leaving the field takes a name that was typed out in full; anything else stays, and is asked about. */
  const leave = () => {
    control.onBlur();
    setOpen(false);
    const exact = matching(species, typed).find((choice) => names(choice).includes(folded(typed)));
    if (!current && exact) choose(exact);
  };
  const active = found[at];
  return (
    <div className="field-cell">
      <label htmlFor={control.id}>Species</label>
      <div className="relative">
        <input
          {...control}
          type="text"
          role="combobox"
          autoComplete="off"
          spellCheck={false}
          className="field w-72"
          aria-expanded={isOpen && found.length > 0}
          aria-controls="species-list"
          aria-autocomplete="list"
          aria-activedescendant={active ? `species-${active.slug}` : undefined}
          value={text}
          onChange={(event) => {
            onTyped();
            store.set({ species: '', speciesTyped: event.target.value });
            setOpen(true);
            setAt(-1);
          }}
          onFocus={(event) => event.target.select()}
          onClick={() => setOpen(true)}
          onBlur={leave}
          onKeyDown={key}
        />
        <ul
          id="species-list"
          role="listbox"
          aria-label="Species"
          className="choices"
          hidden={found.length === 0}
        >
          {found.map((choice, index) => (
            <li
              key={choice.slug}
              id={`species-${choice.slug}`}
              role="option"
              aria-selected={index === at}
              onMouseDown={(event) => event.preventDefault()}
              onClick={() => choose(choice)}
            >
              {choice.name} <i className="text-soft">{choice.scientific}</i>
            </li>
          ))}
        </ul>
      </div>
      <span className="sr-only" role="status">
        {isOpen && typed !== '' && `${found.length} found`}
      </span>
      <FieldNotes path="species" message={message} />
    </div>
  );
}

function label({ name, scientific }: SpeciesChoice): string {
  return name === scientific ? name : `${name} (${scientific})`;
}

function names(choice: SpeciesChoice): string[] {
  return [choice.name, choice.scientific, label(choice), ...(choice.also ?? [])].map(folded);
}

/** Those whose names hold what was typed, the ones that begin with it first. */
function matching(species: readonly SpeciesChoice[], typed: string): SpeciesChoice[] {
  const wanted = folded(typed);
  if (wanted === '') return species.slice(0, MOST_SHOWN);
  const rank = (choice: SpeciesChoice) => {
    const best = names(choice)
      .map((name) => name.indexOf(wanted))
      .filter((index) => index >= 0);
    return best.length > 0 ? Math.min(...best) : Number.POSITIVE_INFINITY;
  };
  return species
    .map((choice) => ({ choice, rank: rank(choice) }))
    .filter(({ rank: found }) => Number.isFinite(found))
    .sort((a, b) => a.rank - b.rank || a.choice.name.localeCompare(b.choice.name))
    .slice(0, MOST_SHOWN)
    .map(({ choice }) => choice);
}

/** Without accents and capitals. */
function folded(text: string): string {
  return text.normalize('NFD').replace(/\p{M}/gu, '').trim().toLowerCase();
}
