'use client';

import { useState, type ReactNode } from 'react';
import { useMessage } from './editor-context';
import { fieldId } from './paths';

interface Labelled {
  /** Path of the value in an entry's body, a reading by its id. */
  readonly path: string;
  readonly label: ReactNode;
  readonly hint?: ReactNode;
  readonly className?: string;
}

/** What a field says of itself: its hint, and what is wrong with it, once somebody has stopped typing in it. */
export function useFieldState(path: string, hasHint: boolean) {
  const found = useMessage(path);
  const [isTyping, setTyping] = useState(false);
  const message = found && !(found.isProvisional && isTyping) ? found.message : null;
  const id = fieldId(path);
  const describedBy =
    [hasHint && `${id}-hint`, message && `${id}-error`].filter(Boolean).join(' ') || undefined;
  return {
    message,
    /** Call as something is typed: what is half typed is not complained of, unless it already was. */
    typed: () => setTyping(!(found?.isProvisional && message !== null)),
    control: {
      id,
      'aria-invalid': message ? true : undefined,
      'aria-describedby': describedBy,
      onBlur: () => setTyping(false),
    },
  };
}

export function FieldNotes({
  path,
  hint,
  message,
}: {
  path: string;
  hint?: ReactNode;
  message: string | null;
}) {
  const id = fieldId(path);
  return (
    <>
      {hint && (
        <span id={`${id}-hint`} className="text-note text-soft">
          {hint}
        </span>
      )}
      {message && (
        <span id={`${id}-error`} className="field-error">
          {message}
        </span>
      )}
    </>
  );
}

interface TextProps extends Labelled {
  readonly value: string;
  readonly onChange: (value: string) => void;
  readonly type?: 'text' | 'date';
  readonly inputMode?: 'text' | 'decimal' | 'numeric';
  readonly maxLength?: number;
  readonly placeholder?: string;
  readonly inputClassName?: string;
}

export function TextField({
  path,
  label,
  hint,
  className = '',
  inputClassName = '',
  onChange,
  ...input
}: TextProps) {
  const { message, typed, control } = useFieldState(path, Boolean(hint));
  return (
    <div className={`field-cell ${className}`}>
      <label htmlFor={control.id}>{label}</label>
      <input
        type="text"
        autoComplete="off"
        className={`field ${inputClassName}`}
        {...input}
        {...control}
        onChange={(event) => {
          typed();
          onChange(event.target.value);
        }}
      />
      <FieldNotes path={path} hint={hint} message={message} />
    </div>
  );
}

interface AreaProps extends Labelled {
  readonly value: string;
  readonly onChange: (value: string) => void;
  readonly maxLength: number;
}

export function AreaField({ path, label, hint, className = '', value, maxLength, onChange }: AreaProps) {
  const { message, typed, control } = useFieldState(path, Boolean(hint));
  return (
    <div className={`field-cell ${className}`}>
      <label htmlFor={control.id}>{label}</label>
      <textarea
        className="field w-full"
        rows={2}
        maxLength={maxLength}
        value={value}
        {...control}
        onChange={(event) => {
          typed();
          onChange(event.target.value);
        }}
      />
      <FieldNotes path={path} hint={hint} message={message} />
    </div>
  );
}

export type Options = readonly (readonly [value: string, text: string])[];

interface SelectProps extends Labelled {
  readonly value: string;
  readonly onChange: (value: string) => void;
  readonly options: Options;
  /** What stands there while nothing is chosen. */
  readonly none?: string;
}

export function SelectField({
  path,
  label,
  hint,
  className = '',
  value,
  onChange,
  options,
  none = '–',
}: SelectProps) {
  const { message, control } = useFieldState(path, Boolean(hint));
  return (
    <div className={`field-cell ${className}`}>
      <label htmlFor={control.id}>{label}</label>
      <select className="field" value={value} {...control} onChange={(event) => onChange(event.target.value)}>
        <option value="">{none}</option>
        {options.map(([option, text]) => (
          <option key={option} value={option}>
            {text}
          </option>
        ))}
      </select>
      <FieldNotes path={path} hint={hint} message={message} />
    </div>
  );
}

interface ChoiceProps extends Labelled {
  readonly value: string;
  readonly onChange: (value: string) => void;
  readonly options: Options;
  readonly disabled?: boolean;
}

/** A choice of two or three side by side: radio buttons, the chosen one filled and bold. */
export function ChoiceField({
  path,
  label,
  hint,
  className = '',
  value,
  onChange,
  options,
  disabled,
}: ChoiceProps) {
  const { message, control } = useFieldState(path, Boolean(hint));
  return (
    <fieldset
      className={`field-cell ${className}`}
      aria-describedby={control['aria-describedby']}
      disabled={disabled}
    >
      <legend>{label}</legend>
      <div className="choice" id={control.id} tabIndex={-1}>
        {options.map(([option, text]) => (
          <label key={option}>
            <input
              type="radio"
              name={control.id}
              className="sr-only"
              value={option}
              checked={value === option}
              onChange={() => onChange(option)}
            />
            <span>{text}</span>
          </label>
        ))}
      </div>
      <FieldNotes path={path} hint={hint} message={message} />
    </fieldset>
  );
}
