import type { InputHTMLAttributes, ReactNode, Ref } from 'react';
import { FieldFrame, describedBy, fieldId } from './FieldFrame';

type Props = Omit<InputHTMLAttributes<HTMLInputElement>, 'id' | 'name' | 'children'> & {
  name: string;
  label: ReactNode;
  hint?: ReactNode;
  error?: string | undefined;
  ref?: Ref<HTMLInputElement>;
};

/** One line to type into, with its label above and what is wrong with it below. */
export function Field({ name, label, hint, error, className = '', ...input }: Props) {
  return (
    <FieldFrame name={name} label={label} hint={hint} error={error}>
      <input
        {...input}
        id={fieldId(name)}
        name={name}
        className={`field ${className || 'w-full'}`}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy(name, hint, error)}
      />
    </FieldFrame>
  );
}
