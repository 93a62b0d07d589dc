import { ConfirmButton } from '@/components/form/ConfirmButton';
import { ROLES } from '@/lib/people/actor';
import type { Person } from '@/lib/people/schema';
import { RoleSelect } from './RoleSelect';

/** People, their roles, and whether their accounts are open. */
export function PeopleTable({ people }: { people: readonly Person[] }) {
  return (
    <table className="mt-6 table-fixed">
      <thead>
        <tr>
          <th scope="col" className="w-2/5">
            person
          </th>
          <th scope="col">role and account</th>
        </tr>
      </thead>
      <tbody>
        {people.map((person) => (
          <tr key={person.id}>
            <th scope="row" className="align-top [overflow-wrap:anywhere]">
              {person.name}
              <span className="block font-normal text-soft">{person.email}</span>
              {person.disabled && <span className="block text-tape">disabled</span>}
            </th>
            <td>
              <div className="flex flex-wrap gap-3">
                <RoleSelect id={person.id} name={person.name} role={person.role} roles={ROLES} />
                <AccountSwitch person={person} />
              </div>
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function AccountSwitch({ person: { id, name, email, disabled } }: { person: Person }) {
  if (disabled) {
    return (
      <ConfirmButton
        label={`Enable ${name}`}
        question={`${name} (${email}) can sign in again.`}
        yes="Enable"
        no="Leave disabled"
        method="POST"
        url={`/api/admin/people/${id}/enable`}
      />
    );
  }
  return (
    <ConfirmButton
      label={`Disable ${name}`}
      question={`${name} (${email}) is signed out everywhere and cannot sign in until enabled again. What they published stays.`}
      yes="Disable"
      no="Leave as it is"
      method="POST"
      url={`/api/admin/people/${id}/disable`}
    />
  );
}
