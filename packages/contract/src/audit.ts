/** The append-only log. Stewards read all of it, others their own acts. */
import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { Instant, Page, pageOf } from './vocabulary.ts';

export const AuditEntry = z.strictObject({
  seq: z.number().int(),
  at: Instant,
  actor: z.string(),
  role: z.string().nullable(),
  act: z.string(),
  object: z.string().nullable(),
  result: z.enum(['ok', 'refused', 'failed']),
});

export const listAudit = endpoint({
  method: 'GET',
  path: '/api/audit',
  summary: 'Entries of the audit log, newest first',
  query: z.strictObject({ page: Page }),
  response: pageOf(AuditEntry),
  problems: [],
});

export const verifyAudit = endpoint({
  method: 'POST',
  path: '/api/audit/verification',
  summary: 'Recompute the chain and say whether it holds',
  body: z.strictObject({}),
  response: z.strictObject({
    entries: z.number().int(),
    holds: z.boolean(),
    firstBrokenSeq: z.number().int().nullable(),
    head: z.string().nullable(),
  }),
  problems: [],
});
