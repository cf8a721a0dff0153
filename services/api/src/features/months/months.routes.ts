import type { Context } from '../../context.ts';
import { route, type Route } from '../../http/route.ts';
import { closeMonth } from './close-month.ts';
import { listCalendar, listMonths } from './list-months.ts';

export const monthRoutes = (context: Context): Route[] => [
  route('listMonths', (actor, input) => listMonths(context, actor, input)),
  route('listCalendar', (actor) => listCalendar(context, actor)),
  route('closeMonth', (actor, input, { requestId }) => closeMonth(context, actor, input, requestId)),
];
