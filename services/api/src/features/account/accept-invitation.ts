/** Binds an invitation to the signed-in identity, once. Whoever has the role for all that time has nothing to gain from it and gets no second one. */
import { randomUUID } from 'node:crypto';
import type { Account } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import { registry, type Actor } from '../../authority/actor.ts';
import { requirePerson } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { readAccount } from '../sign-in/accounts.repository.ts';
import { presentAccount } from './account.routes.ts';
import { useInvitation } from './invitations.repository.ts';

export async function acceptInvitation(context: Context, actor: Actor, token: string, requestId: string): Promise<Account> {
  const person = requirePerson(actor);
  return asActor(context.database, registry, async (tx) => {
    const invitation = await useInvitation(tx, token, person.accountId);
    await tx.query(
      `insert into grants (id, account_id, role, site_id, starts_on, ends_on, given_by)
       select $1, $2, role, site_id, (now() at time zone 'UTC')::date, grant_ends_on, invited_by from invitations i where id = $3
          and not exists (select from grants g where g.account_id = $2 and g.role = i.role and g.site_id is not distinct from i.site_id
            and g.starts_on <= (now() at time zone 'UTC')::date
            and coalesce(g.ends_on, 'infinity') >= greatest((now() at time zone 'UTC')::date, coalesce(i.grant_ends_on, 'infinity')))`,
      [randomUUID(), person.accountId, invitation.id],
    );
    await recordAudit(tx, person, { act: 'invitation.accept', object: invitation.id, requestId, detail: { role: invitation.role } });
    const account = await readAccount(tx, person.accountId);
    return presentAccount(context, tx, { ...person, grants: account?.grants ?? [] });
  });
}
