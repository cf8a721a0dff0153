import { z } from 'zod';
import { endpoint } from './endpoint.ts';

export const getLiveness = endpoint({
  method: 'GET',
  path: '/api/health/live',
  summary: 'The process answers',
  response: z.strictObject({ status: z.literal('ok') }),
  problems: [],
});

export const getReadiness = endpoint({
  method: 'GET',
  path: '/api/health/ready',
  summary: 'The process and its database answer',
  response: z.strictObject({ status: z.literal('ok') }),
  problems: [],
});
