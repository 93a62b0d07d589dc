'use client';

import { useState } from 'react';
import { ErrorSummary } from '@/components/form/ErrorSummary';
import { useSending } from '@/components/form/use-sending';

type Props = { id: string; name: string; role: string; roles: readonly string[] };

/** Gives a person another role: chosen first, then given. */
export function RoleSelect({ id, name, role, roles }: Props) {
  const [given, setGiven] = useState(role);
  const [chosen, setChosen] = useState(role);
  const { sending, errors, summary, send } = useSending();

  async function give() {
    const answer = await send({ method: 'PUT', url: `/api/admin/people/${id}/role`, body: { role: chosen } });
    if (answer) setGiven(chosen);
  }

  return (
    <div>
      <div className="flex flex-wrap gap-2">
        <select
          aria-label={`Role of ${name}`}
          className="field"
          value={chosen}
          onChange={(event) => setChosen(event.target.value)}
        >
          {roles.map((one) => (
            <option key={one}>{one}</option>
          ))}
        </select>
        {chosen !== given && (
          <button type="button" className="action" disabled={sending} onClick={() => void give()}>
            Make {name} {chosen}
          </button>
        )}
      </div>
      <p role="status">
        {given !== role && chosen === given ? `${name} is ${given} from their next page on.` : ''}
      </p>
      <ErrorSummary ref={summary} errors={errors} labels={{}} />
    </div>
  );
}
