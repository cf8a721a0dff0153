import type { Context } from '../../context.ts';
import { statistics } from '../../authority/actor.ts';
import { asActor } from '../../database/as-actor.ts';
import { route, type Route } from '../../http/route.ts';

export const healthRoutes = ({ database }: Context): Route[] => [
  route('getLiveness', () => ({ status: 'ok' as const })),
  route('getReadiness', async () => {
    await asActor(database, statistics, (tx) => tx.query('select 1'));
    return { status: 'ok' as const };
  }),
];
