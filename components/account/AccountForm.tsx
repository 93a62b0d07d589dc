'use client';

import { useState, type FormEvent } from 'react';
import { errorOf, ErrorSummary } from '@/components/form/ErrorSummary';
import { Field } from '@/components/form/Field';
import { Select } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSending } from '@/components/form/use-sending';

const LABELS = { name: 'Name', units: 'Units' };
const UNITS = [
  { value: 'metric', text: 'metres and centimetres' },
  { value: 'imperial', text: 'feet and inches' },
];

/** How somebody is called in public and which units they read. */
export function AccountForm({ account }: { account: { name: string; units: string; revision: number } }) {
  const [revision, setRevision] = useState(account.revision);
  const [saved, setSaved] = useState(false);
  const { sending, errors, summary, send } = useSending();

  async function save(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    setSaved(false);
    const body = Object.fromEntries(new FormData(event.currentTarget));
    const answer = await send({ method: 'PUT', url: '/api/account', body, ifMatch: revision });
    if (!answer) return;
    setRevision((answer.data as { revision: number }).revision);
    setSaved(true);
  }

  const field = (name: keyof typeof LABELS) => ({ name, label: LABELS[name], error: errorOf(errors, name) });
  return (
    <form onSubmit={(event) => void save(event)} noValidate className="max-w-measure">
      <ErrorSummary ref={summary} errors={errors} labels={LABELS} />
      <Field
        {...field('name')}
        hint="Stands in public beside what you publish."
        autoComplete="name"
        defaultValue={account.name}
        maxLength={80}
      />
      <Select
        {...field('units')}
        hint="How lengths are shown to you."
        options={UNITS}
        defaultValue={account.units}
      />
      <SubmitButton sending={sending} progress="Saving">
        Save
      </SubmitButton>
      <p role="status" className="mt-3">
        {saved ? 'Saved. It counts from the next page on.' : ''}
      </p>
    </form>
  );
}
