/** Asks someone by e-mail to take a role. */
import { invitePerson } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { problemsOf } from '../../lib/field-problems.ts';
import { formatInstant } from '../../lib/format.ts';
import { roleWithin } from '../../lib/role-names.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Form } from '../../ui/form.tsx';
import { Notice } from '../../ui/notice.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { peopleQuery, useInvite } from './people.queries.ts';
import type { Person } from './people.queries.ts';
import { emptyRole, fieldIdsOf, problemsOfRole, roleOf } from './role-draft.ts';
import { RoleFields } from './role-fields.tsx';

const ids = fieldIdsOf('invite');
const emailId = 'invite-email';
const refusable = { '/body/email': emailId, '/body/role': ids.role, '/body/siteId': ids.site, '/body/grantEndsOn': ids.endsOn };

export function InviteForm() {
  const invite = useInvite();
  const people = useQuery(peopleQuery()).data?.people ?? [];
  const [email, setEmail] = useState('');
  const address = email.trim().toLowerCase();
  const known = address === '' ? [] : people.filter((person) => person.email?.toLowerCase() === address);
  const [draft, setDraft] = useState(emptyRole);
  const [attempt, setAttempt] = useState(0);
  const found = attempt === 0 ? [] : problemsIn();
  const problems = found.length > 0 ? found : problemsOf(invite.error, refusable);
  const emailError = problems.find(({ fieldId }) => fieldId === emailId)?.message;

  function problemsIn() {
    const message = emailProblem(email);
    const today = new Date().toISOString().slice(0, 10);
    return [...(message === undefined ? [] : [{ fieldId: emailId, message }]), ...problemsOfRole(draft, ids, today)];
  }

  function send(): void {
    setAttempt(attempt + 1);
    if (problemsIn().length > 0) return;
    const { role, siteId, endsOn } = roleOf(draft);
    invite.mutate(
      { email: email.trim(), role, siteId, grantEndsOn: endsOn },
      {
        onSuccess: (sent) => {
          announce(`An invitation is on its way to ${sent.email}.`);
          setEmail('');
          setDraft(emptyRole);
          setAttempt(0);
        },
      },
    );
  }

  return (
    <div className="grid gap-6">
      {invite.data !== undefined && (
        <Notice kind="success" title={`An invitation is on its way to ${invite.data.email}.`}>
          <p>
            As {roleWithin(invite.data.role, invite.data.site)}. It can be used once, until {formatInstant(invite.data.expiresAt)}.
          </p>
          <KnownAccounts accounts={invite.data.accountsWithAddress} />
        </Notice>
      )}
      <Form onSubmit={send} attempt={attempt} problems={problems}>
        <TextField
          id={emailId}
          label="E-mail"
          hint="Where the invitation is sent."
          type="email"
          inputMode="email"
          autoComplete="off"
          spellCheck="false"
          isRequired
          value={email}
          onChange={setEmail}
          error={emailError}
        />
        {known.length > 0 && (
          <Notice kind="information" title="No invitation is needed.">
            <KnownAccounts accounts={known} />
          </Notice>
        )}
        <RoleFields ids={ids} draft={draft} problems={problems} onChange={setDraft} />
        {invite.isError && problems.length === 0 && <ErrorNotice error={invite.error} />}
        <div>
          <Button type="submit" variant="primary" isPending={invite.isPending}>
            Send the invitation
          </Button>
        </div>
      </Form>
    </div>
  );
}

/** Somebody with an account needs no invitation. */
function KnownAccounts({ accounts }: { readonly accounts: readonly Pick<Person, 'id' | 'name'>[] }) {
  return accounts.map(({ id, name }) => (
    <p key={id} className="mt-1">
      <TextLink to={`/people/${id}`}>{name}</TextLink> has an account with this address. On that page the role can be given at once, without
      an invitation.
    </p>
  ));
}

const emailProblem = (email: string): string | undefined =>
  invitePerson.body?.shape.email.safeParse(email.trim()).error?.issues[0]?.message;
