'use client';

import { useEffect, useRef, useState, type FormEvent } from 'react';
import { v7 as newId } from 'uuid';
import { errorOf, ErrorSummary } from '@/components/form/ErrorSummary';
import { Field } from '@/components/form/Field';
import { Select } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSending } from '@/components/form/use-sending';
import { elevationForField } from '@/lib/units/elevation';
import type { Units } from '@/lib/units/units';
import { orchardFromForm, ORCHARD_LABELS } from './orchard-from-form';
import { SUN_OPTIONS, WATER_OPTIONS, WIND_OPTIONS } from './place-words';
import { WhereIStand } from './WhereIStand';

export type OrchardToChange = {
  id: string;
  revision: number;
  name: string;
  latitude: number | null;
  longitude: number | null;
  elevation: number | null;
  timeZone: string;
  place: { sun: string | null; wind: string | null; water: string | null };
};

/** Makes an orchard, or changes one. Its inputs keep their own text, so that nothing typed is ever cleared. */
export function OrchardForm({ orchard, units }: { orchard?: OrchardToChange; units: Units }) {
  const [id] = useState(() => orchard?.id ?? newId());
  const { sending, errors, summary, setErrors, send } = useSending();
  const form = useRef<HTMLFormElement>(null);
  const zone = useRef<HTMLInputElement>(null);

  useEffect(() => {
    if (zone.current?.value === '') {
      zone.current.value = Intl.DateTimeFormat().resolvedOptions().timeZone || 'Etc/UTC';
    }
  }, []);

  async function save(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const { body, faults } = orchardFromForm(new FormData(event.currentTarget), units);
    if (faults.length > 0) return setErrors(faults);
    const url = `/api/orchards/${id}`;
    if (await send({ method: 'PUT', url, body, ifMatch: orchard?.revision }))
      location.assign(`/orchards/${id}`);
  }

  function fill(latitude: string, longitude: string) {
    for (const [name, value] of Object.entries({ latitude, longitude })) {
      const input = form.current?.elements.namedItem(name);
      if (input instanceof HTMLInputElement) input.value = value;
    }
  }

  const field = (name: string) => ({ name, label: ORCHARD_LABELS[name], error: errorOf(errors, name) });
  return (
    <form ref={form} onSubmit={(event) => void save(event)} noValidate className="max-w-measure">
      <ErrorSummary ref={summary} errors={errors} labels={ORCHARD_LABELS} />
      <Field {...field('name')} defaultValue={orchard?.name} maxLength={120} autoComplete="off" />
      <fieldset className="mt-8">
        <legend className="text-[1.25rem] font-bold">Where it lies</legend>
        <p className="mt-1 text-soft">
          The exact point stays with the members of this orchard. Everyone else sees a cell of 0.1 degree,
          about 11 km from north to south, and the elevation to 100 m.
        </p>
        <WhereIStand onPoint={fill} />
        <div className="grid gap-x-5 sm:grid-cols-2">
          <Field
            {...field('latitude')}
            hint="Degrees, north above 0: 12.3456"
            inputMode="text"
            autoComplete="off"
            defaultValue={orchard?.latitude ?? undefined}
          />
          <Field
            {...field('longitude')}
            hint="Degrees, east above 0: -45.6789"
            inputMode="text"
            autoComplete="off"
            defaultValue={orchard?.longitude ?? undefined}
          />
          <Field
            {...field('elevation')}
            hint={`Above the sea, in ${units === 'imperial' ? 'feet' : 'metres'}. May stay empty.`}
            inputMode="text"
            autoComplete="off"
            defaultValue={elevationForField(orchard?.elevation ?? null, units)}
          />
          <Field
            {...field('timeZone')}
            ref={zone}
            hint="So that return visits fall on the orchard’s own day."
            autoComplete="off"
            defaultValue={orchard?.timeZone ?? ''}
          />
        </div>
      </fieldset>
      <fieldset className="mt-8">
        <legend className="text-[1.25rem] font-bold">How it stands</legend>
        <div className="grid gap-x-5 sm:grid-cols-3">
          <Select
            {...field('place.sun')}
            options={SUN_OPTIONS}
            empty="Choose"
            defaultValue={orchard?.place.sun ?? ''}
          />
          <Select
            {...field('place.wind')}
            options={WIND_OPTIONS}
            empty="Choose"
            defaultValue={orchard?.place.wind ?? ''}
          />
          <Select
            {...field('place.water')}
            options={WATER_OPTIONS}
            empty="Choose"
            defaultValue={orchard?.place.water ?? ''}
          />
        </div>
      </fieldset>
      <SubmitButton sending={sending} progress="Saving">
        {orchard ? 'Save the changes' : 'Add this orchard'}
      </SubmitButton>
    </form>
  );
}
