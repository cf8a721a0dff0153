/** Sites' own systems, which submit without a person by OAuth 2.0 client credentials. */
import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { Id, Instant, Site } from './vocabulary.ts';

export const SiteSystem = z.strictObject({
  id: Id,
  site: Site,
  /** Whose tokens count, and whom they name: the system's client id at that provider. */
  issuer: z.string(),
  subject: z.string(),
  /** What the system is called in submissions, receipts and the log. */
  label: z.string(),
  status: z.enum(['active', 'disabled']),
  addedAt: Instant,
  addedBy: z.string(),
  lastUsedAt: Instant.nullable(),
});

export const listSiteSystems = endpoint({
  method: 'GET',
  path: '/api/site-systems',
  summary: "The systems that may submit for their sites, and what the identity provider has to put into such a system's tokens",
  response: z.strictObject({
    systems: z.array(SiteSystem),
    tokens: z.strictObject({ issuer: z.string(), audience: z.string(), scope: z.string() }),
  }),
  problems: [],
});

export const addSiteSystem = endpoint({
  method: 'POST',
  path: '/api/site-systems',
  summary: "Let a site's system submit for that site",
  body: z.strictObject({
    siteId: Id,
    subject: z
      .string()
      .trim()
      .min(1, 'Write the client id that the identity provider gave to the system')
      .max(200)
      .regex(/^[\x21-\x7e]+$/, 'A client id has no spaces and no letters beyond ASCII'),
    label: z.string().trim().min(3, 'Say in a few words what the system is').max(120),
  }),
  response: SiteSystem,
  status: 201,
  problems: ['system-registered'],
});

export const setSiteSystemStatus = endpoint({
  method: 'PUT',
  path: '/api/site-systems/:systemId/status',
  summary: "Disable a site's system, or enable it again. Systems are never deleted",
  params: z.strictObject({ systemId: Id }),
  body: z.strictObject({ status: z.enum(['active', 'disabled']) }),
  response: SiteSystem,
  problems: ['not-found'],
});
