import { listCalendar } from '@cairnstep/contract';
import type { ResponseOf } from '@cairnstep/contract';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../lib/call.ts';

export type Calendar = ResponseOf<typeof listCalendar>;
export type SiteLine = Calendar['sites'][number];

export const calendarQuery = () =>
  queryOptions({
    queryKey: ['calendar'],
    queryFn: ({ signal }) => call(listCalendar, {}, { signal }),
  });
