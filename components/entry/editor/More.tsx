'use client';

import { useState, type ReactNode } from 'react';

/** Fields that most records leave empty, folded away unless they are filled in; typing never folds them again. */
export function More({
  summary,
  isOpen,
  children,
}: {
  summary: string;
  isOpen: boolean;
  children: ReactNode;
}) {
  const [openAtFirst] = useState(isOpen);
  return (
    <details className="more" open={openAtFirst}>
      <summary>{summary}</summary>
      {children}
    </details>
  );
}
