/** Administrators register sites' systems; their secrets stay with the identity provider. */
import { randomUUID } from 'node:crypto';
import type { InputOf, ResponseOf } from '@cairnstep/contract';
import type { addSiteSystem, setSiteSystemStatus } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import { requireFound, requirePerson } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import { route, type Route } from '../../http/route.ts';
import { readSite } from '../people/sites.repository.ts';
import { systemAudience, systemScope } from './access-token.ts';
import { insertSystem, listSystems, readSystem, setSystemStatus } from './site-systems.repository.ts';

export function siteSystemRoutes({ config, database }: Context): Route[] {
  const issuer = config.OIDC_ISSUER;
  const tokens = { issuer, audience: systemAudience(config), scope: systemScope };

  const add = (actor: Actor, input: InputOf<typeof addSiteSystem>, requestId: string): Promise<ResponseOf<typeof addSiteSystem>> =>
    asActor(database, actor, async (tx) => {
      const { accountId } = requirePerson(actor);
      const { siteId, subject, label } = input;
      if ((await readSite(tx, siteId)) === null) {
        throw new Refusal('invalid-input', 'Nothing was kept.', [{ pointer: '/body/siteId', detail: 'Choose a site of the registry.' }]);
      }
      const id = randomUUID();
      if (!(await insertSystem(tx, { id, siteId, issuer, subject, label, addedBy: accountId }))) {
        throw new Refusal(
          'system-registered',
          'A client id belongs to one site. Enable the system it has, or use another client id. Nothing was changed.',
        );
      }
      await recordAudit(tx, actor, { act: 'site-system.add', object: id, site: siteId, requestId });
      return requireFound(await readSystem(tx, id));
    });

  const setStatus = (actor: Actor, { systemId, status }: InputOf<typeof setSiteSystemStatus>, requestId: string) =>
    asActor(database, actor, async (tx) => {
      const { site } = requireFound(await readSystem(tx, systemId));
      await setSystemStatus(tx, systemId, status);
      const act = status === 'disabled' ? 'site-system.disable' : 'site-system.enable';
      await recordAudit(tx, actor, { act, object: systemId, site: site.id, requestId });
      return requireFound(await readSystem(tx, systemId));
    });

  return [
    route('listSiteSystems', (actor) => asActor(database, actor, async (tx) => ({ systems: await listSystems(tx), tokens }))),
    route('addSiteSystem', (actor, input, { requestId }) => add(actor, input, requestId)),
    route('setSiteSystemStatus', (actor, input, { requestId }) => setStatus(actor, input, requestId)),
  ];
}
