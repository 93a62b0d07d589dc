'use client';

import { useEffect, useRef, type MouseEvent } from 'react';
import type { FieldError } from '@/lib/errors/errors';
import { fieldId, fieldName, fieldOf } from './paths';

interface Props {
  readonly title: string;
  readonly errors: readonly FieldError[];
  readonly readingIds: readonly string[];
}

/** What stands in the way, each line leading to its field. It takes the focus as it appears. */
export function ErrorSummary({ title, errors, readingIds }: Props) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => box.current?.focus(), []);
  return (
    <div ref={box} tabIndex={-1} role="alert" className="my-4 border-l-[3px] border-tape bg-wash px-4 py-3">
      <h2>{title}</h2>
      <ul className="mt-1 list-disc pl-5">
        {errors.map(({ path, message }) => (
          <li key={`${path} ${message}`}>
            <a
              href={`#${fieldId(fieldOf(path))}`}
              className="inline-block py-1"
              onClick={(event) => goTo(event, path)}
            >
              {fieldName(fieldOf(path), readingIds)}
            </a>{' '}
            {message}
          </li>
        ))}
      </ul>
    </div>
  );
}

/** Unfolds what hides the field, and puts the focus in it. */
function goTo(event: MouseEvent, path: string): void {
  const field = document.getElementById(fieldId(fieldOf(path)));
  if (!field) return;
  event.preventDefault();
  field.closest('details')?.setAttribute('open', '');
  const target = field.querySelector<HTMLElement>('input:checked, input') ?? field;
  target.focus();
  field.scrollIntoView({ block: 'center' });
}
