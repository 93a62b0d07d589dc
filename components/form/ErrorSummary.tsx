import type { Ref } from 'react';
import { fieldId } from './FieldFrame';

export type FormError = {
  /** The field's name; empty where it is about the whole form. */
  path: string;
  message: string;
};

type Props = { errors: readonly FormError[]; labels: Record<string, string>; ref?: Ref<HTMLDivElement> };

/** All that is wrong, at the top of its form, each leading to its field. Read out as soon as it stands there. */
export function ErrorSummary({ errors, labels, ref }: Props) {
  if (errors.length === 0) return null;
  return (
    <div ref={ref} role="alert" tabIndex={-1} className="mt-6 max-w-measure border-l-4 border-tape pl-4">
      <h2>{errors.length === 1 ? 'One thing needs another look' : 'Some things need another look'}</h2>
      <ul className="mt-2">
        {errors.map(({ path, message }) => {
          const label = labels[path];
          if (!label) return <li key={`${path} ${message}`}>{message}</li>;
          return (
            <li key={path}>
              <a href={`#${fieldId(path)}`} className="inline-flex min-h-finger items-center">
                {label}: {message}
              </a>
            </li>
          );
        })}
      </ul>
    </div>
  );
}

/** What is wrong with one field, if anything. */
export function errorOf(errors: readonly FormError[], path: string): string | undefined {
  return errors.find((error) => error.path === path)?.message;
}
