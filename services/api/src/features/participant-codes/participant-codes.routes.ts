import type { Context } from '../../context.ts';
import { route, type Route } from '../../http/route.ts';
import { replaceCodes } from './replace-codes.ts';

export const participantCodeRoutes = (context: Context): Route[] => [
  route('replaceCodes', (actor, input, { requestId }) => replaceCodes(context, actor, input, requestId)),
];
