'use client';

import { useEffect, useRef, useState } from 'react';
import type { FormError } from './ErrorSummary';

type Sending = {
  sending: boolean;
  errors: readonly FormError[];
  /** Of the summary, which gets the focus when something is wrong. */
  summary: React.RefObject<HTMLDivElement | null>;
  setErrors: (errors: readonly FormError[]) => void;
  /** The answer's status and JSON, or null when it was refused or did not arrive; then `errors` say why. */
  send: (request: SendRequest) => Promise<{ status: number; data: unknown } | null>;
};

type SendRequest = {
  method: 'PUT' | 'POST' | 'DELETE';
  url: string;
  body?: unknown;
  ifMatch?: number | undefined;
};

const LOST = 'No connection just now. What you typed is still here; send it again.';

/** Sends a form's data to the API and turns a problem document into what the form shows. Nothing typed is touched. */
export function useSending(): Sending {
  const [sending, setSending] = useState(false);
  const [errors, setErrors] = useState<readonly FormError[]>([]);
  const summary = useRef<HTMLDivElement>(null);

  useEffect(() => {
    if (errors.length > 0) summary.current?.focus();
  }, [errors]);

  async function send({ method, url, body, ifMatch }: SendRequest) {
    setSending(true);
    setErrors([]);
    try {
      const answer = await fetch(url, {
        method,
        headers: {
          ...(body === undefined ? {} : { 'content-type': 'application/json' }),
          ...(ifMatch === undefined ? {} : { 'if-match': `"${ifMatch}"` }),
        },
        ...(body === undefined ? {} : { body: JSON.stringify(body) }),
      });
      const data: unknown = answer.status === 204 ? null : await answer.json();
      if (answer.ok) return { status: answer.status, data };
      setErrors(errorsOf(data));
    } catch {
      setErrors([{ path: '', message: LOST }]);
    } finally {
      setSending(false);
    }
    return null;
  }

  return { sending, errors, summary, setErrors, send };
}

function errorsOf(data: unknown): FormError[] {
  const { detail, errors } = (data ?? {}) as { detail?: string; errors?: FormError[] };
  if (errors && errors.length > 0) return errors;
  return [{ path: '', message: detail ?? LOST }];
}
