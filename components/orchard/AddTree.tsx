'use client';

import { useRef, useState, type FormEvent } from 'react';
import { v7 as newId } from 'uuid';
import { errorOf, ErrorSummary, type FormError } from '@/components/form/ErrorSummary';
import { Field } from '@/components/form/Field';
import { Select, type Option } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSending } from '@/components/form/use-sending';

const LABELS = { label: 'Label', species: 'Species', cultivar: 'Cultivar', yearPlanted: 'Year planted' };

/** Plants a tree; what was typed is let go of only once the tree stands. */
export function AddTree({ orchardId, species }: { orchardId: string; species: readonly Option[] }) {
  const [id] = useState(() => newId());
  const form = useRef<HTMLFormElement>(null);
  const { sending, errors, summary, setErrors, send } = useSending();

  async function add(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const { body, faults } = treeFromForm(new FormData(event.currentTarget));
    if (faults.length > 0) return setErrors(faults);
    if (await send({ method: 'PUT', url: `/api/orchards/${orchardId}/trees/${id}`, body })) location.reload();
  }

  const field = (name: keyof typeof LABELS) => ({ name, label: LABELS[name], error: errorOf(errors, name) });
  return (
    <form ref={form} onSubmit={(event) => void add(event)} noValidate className="max-w-measure">
      <ErrorSummary ref={summary} errors={errors} labels={LABELS} />
      <div className="grid gap-x-5 sm:grid-cols-2">
        <Field {...field('label')} hint="As you call it: row 2, third" maxLength={80} autoComplete="off" />
        <Select {...field('species')} hint="From the catalogue" options={species} empty="not said" />
        <Field {...field('cultivar')} hint="May stay empty" maxLength={120} autoComplete="off" />
        <Field
          {...field('yearPlanted')}
          hint="May stay empty"
          inputMode="numeric"
          maxLength={4}
          autoComplete="off"
        />
      </div>
      <SubmitButton sending={sending} progress="Saving">
        Add this tree
      </SubmitButton>
    </form>
  );
}

function treeFromForm(form: FormData): { body: unknown; faults: FormError[] } {
  const text = (name: string) => String(form.get(name) ?? '').trim();
  const faults: FormError[] = [];
  if (text('label') === '') faults.push({ path: 'label', message: 'how do you call this tree?' });
  const year = text('yearPlanted');
  if (year !== '' && !/^\d{4}$/.test(year)) {
    faults.push({ path: 'yearPlanted', message: 'write a year of four digits, or leave it empty' });
  }
  const body = {
    label: text('label'),
    species: text('species') || null,
    cultivar: text('cultivar') || null,
    yearPlanted: year === '' ? null : Number(year),
  };
  return { body, faults };
}
