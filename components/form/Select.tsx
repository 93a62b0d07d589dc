import type { ReactNode, SelectHTMLAttributes } from 'react';
import { FieldFrame, describedBy, fieldId } from './FieldFrame';

export type Option = { value: string; text: string };

type Props = Omit<SelectHTMLAttributes<HTMLSelectElement>, 'id' | 'name' | 'children'> & {
  name: string;
  label: ReactNode;
  hint?: ReactNode;
  error?: string | undefined;
  options: readonly Option[];
  /** What stands there until something is chosen; without it the first option is chosen. */
  empty?: string;
};

/** One of a list, in the browser's own control. */
export function Select({ name, label, hint, error, options, empty, className = '', ...select }: Props) {
  return (
    <FieldFrame name={name} label={label} hint={hint} error={error}>
      <select
        {...select}
        id={fieldId(name)}
        name={name}
        className={`field ${className || 'w-full'}`}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy(name, hint, error)}
      >
        {empty !== undefined && <option value="">{empty}</option>}
        {options.map(({ value, text }) => (
          <option key={value} value={value}>
            {text}
          </option>
        ))}
      </select>
    </FieldFrame>
  );
}
