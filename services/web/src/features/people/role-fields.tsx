/** Role, site where the role is one of a site, and last day: the same for an invitation and for a grant. */
import { roles } from '@cairnstep/contract';
import type { Role } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import type { PlacedProblem } from '../../lib/field-problems.ts';
import { roleNames } from '../../lib/role-names.ts';
import { sitesQuery } from '../../lib/sites.ts';
import { Answer } from '../../ui/answer.tsx';
import { RadioGroup } from '../../ui/radio-group.tsx';
import { Select } from '../../ui/select.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { isSiteRole } from './role-draft.ts';
import type { RoleDraft, RoleFieldIds } from './role-draft.ts';

const whatFor: Readonly<Record<Role, string>> = {
  therapist: 'reads the participants of one site',
  coordinator: 'submits the months of one site',
  researcher: 'explores group figures, asks for rows',
  steward: 'decides requests, makes releases, reads the audit log',
  administrator: 'brings people and sites in and out',
};
const options = roles.map((role) => ({ value: role, label: roleNames[role], hint: whatFor[role] }));

export interface RoleFieldsProps {
  readonly ids: RoleFieldIds;
  readonly draft: RoleDraft;
  readonly problems: readonly PlacedProblem[];
  readonly onChange: (draft: RoleDraft) => void;
}

export function RoleFields({ ids, draft, problems, onChange }: RoleFieldsProps) {
  const sites = useQuery(sitesQuery());
  const errorOf = (id: string) => problems.find(({ fieldId }) => fieldId === id)?.message;
  return (
    <>
      <RadioGroup
        id={ids.role}
        label="Role"
        isRequired
        value={draft.role}
        options={options}
        onChange={(role) => onChange({ ...draft, role: role as Role })}
        error={errorOf(ids.role)}
      />
      {isSiteRole(draft.role) && (
        <Answer query={sites} waiting="Looking up the sites.">
          {(known) => (
            <Select
              id={ids.site}
              label="Site"
              isRequired
              value={draft.siteId}
              options={known.sites.map(({ id, code, name }) => ({ value: id, label: `${name} (${code})` }))}
              onChange={(siteId) => onChange({ ...draft, siteId })}
              error={errorOf(ids.site)}
            />
          )}
        </Answer>
      )}
      <TextField
        id={ids.endsOn}
        label="Last day"
        hint="Year, month and day, such as 2027-06-30. Empty: until it is ended by hand."
        value={draft.endsOn}
        onChange={(endsOn) => onChange({ ...draft, endsOn })}
        error={errorOf(ids.endsOn)}
      />
    </>
  );
}
