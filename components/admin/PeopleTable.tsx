import { ConfirmButton } from '@/components/form/ConfirmButton';
import { ROLES } from '@/lib/people/actor';
import type { Person } from '@/lib/people/schema';
import { RoleSelect } from './RoleSelect';

/** People, their roles, and whether their accounts are open. */
export function PeopleTable({ people }: { people: readonly Person[] }) {
  return (
    <div className="mt-6 overflow-x-auto" role="region" aria-label="People and roles" tabIndex={0}>
      <table>
        <thead>
          <tr>
            <th scope="col">person</th>
            <th scope="col">role</th>
            <th scope="col">account</th>
          </tr>
        </thead>
        <tbody>
          {people.map((person) => (
            <tr key={person.id} className="align-top">
              <th scope="row">
                {person.name}
                <span className="block font-normal text-soft">{person.email}</span>
                {person.disabled && <span className="block">disabled</span>}
              </th>
              <td>
                <RoleSelect id={person.id} name={person.name} role={person.role} roles={ROLES} />
              </td>
              <td>
                <AccountSwitch person={person} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
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
