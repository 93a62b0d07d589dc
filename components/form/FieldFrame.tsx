import type { ReactNode } from 'react';

/** Ids follow from the field's name, so that an error summary can lead to it. */
export const fieldId = (name: string): string => `field-${name}`;

export function describedBy(name: string, hint: ReactNode, error: string | undefined): string | undefined {
  const ids = [hint ? `${fieldId(name)}-hint` : '', error ? `${fieldId(name)}-error` : ''].filter(Boolean);
  return ids.length > 0 ? ids.join(' ') : undefined;
}

type Props = {
  name: string;
  label: ReactNode;
  hint?: ReactNode;
  error?: string | undefined;
  children: ReactNode;
};

/** What stands around any field: its label, a hint, and what is wrong. */
export function FieldFrame({ name, label, hint, error, children }: Props) {
  return (
    <div className="mt-5">
      <label htmlFor={fieldId(name)} className="mb-1 block font-bold">
        {label}
      </label>
      {hint && (
        <p id={`${fieldId(name)}-hint`} className="mb-1 text-note text-soft">
          {hint}
        </p>
      )}
      {children}
      {error && (
        <p id={`${fieldId(name)}-error`} className="mt-1 border-l-4 border-tape pl-2">
          {error}
        </p>
      )}
    </div>
  );
}
