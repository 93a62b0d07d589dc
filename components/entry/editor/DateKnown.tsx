'use client';

import { SelectField } from './fields';

const KNOWN = [
  ['month', 'to the month only'],
  ['season', 'to the season only'],
] as const;

/** How well a date is known, where the day is a guess. */
export function DateKnown(props: { path: string; value: string; onChange: (value: string) => void }) {
  return <SelectField {...props} label="The date is known" none="to the day" options={KNOWN} />;
}
