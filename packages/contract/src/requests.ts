/** Access requests, decisions and exports. */
import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { Grade } from './explore.ts';
import { CalendarDate, Id, Instant } from './vocabulary.ts';
import { Digest } from './vocabulary.ts';

export const RequestStatus = z.enum(['draft', 'submitted', 'in_review', 'approved', 'declined', 'withdrawn', 'ended']);

/** Purpose of use, matched against each participant's consent. */
export const Purpose = z.enum(['condition_research', 'biomedical_research', 'methods_development']);

export const Cohort = z.strictObject({
  outcome: z.string().max(40),
  inDevice: z.boolean(),
  /** Cells of the grid; an empty list means all of it. */
  cells: z.array(z.strictObject({ levelGroup: z.string().max(20), grade: Grade })).max(60),
});

export const exportTables = ['participants', 'outcomes', 'sessions'] as const;
export const ExportTable = z.enum(exportTables);

/** What the requester fills in. A draft may be incomplete; submitting asks for all of it. */
export const RequestForm = z.strictObject({
  title: z.string().trim().max(150),
  question: z.string().trim().max(2000),
  laySummary: z.string().trim().max(2500),
  purpose: Purpose.nullable(),
  ethicsCommittee: z.string().trim().max(200),
  ethicsReference: z.string().trim().max(100),
  ethicsExpiresOn: CalendarDate.nullable(),
  organisationType: z.enum(['not_for_profit', 'for_profit']).nullable(),
  /** Where the team and the files are: ISO 3166-1 two-letter code. */
  country: z
    .string()
    .regex(/^[A-Z]{2}$/, 'Choose a country')
    .nullable(),
  commercialInterest: z.enum(['yes', 'no']).nullable(),
  funding: z.string().trim().max(500),
  storage: z.string().trim().max(1000),
  tables: z.array(z.strictObject({ table: ExportTable, justification: z.string().trim().max(500) })).max(3),
  /** Other people of the team who would see rows: e-mail addresses of registered researchers. */
  team: z.array(z.email()).max(20),
  months: z.number().int().min(1).max(36).nullable(),
  /** Duties some consents ask for; unanswered ones send such consents to a person. */
  agreesToPublish: z.enum(['yes', 'no']).nullable(),
  agreesToCollaborate: z.enum(['yes', 'no']).nullable(),
  agreesToReturn: z.enum(['yes', 'no']).nullable(),
  termsAccepted: z.boolean(),
  cohort: Cohort,
});
export type RequestForm = z.output<typeof RequestForm>;

/** Answers of the form that a person's consent may turn on. */
export const consentQuestions = [
  'purpose',
  'commercialInterest',
  'ethicsExpiresOn',
  'organisationType',
  'country',
  'months',
  'agreesToPublish',
  'agreesToCollaborate',
  'agreesToReturn',
] as const satisfies readonly (keyof RequestForm)[];
export type ConsentQuestion = (typeof consentQuestions)[number];

export const Vote = z.strictObject({
  steward: z.string(),
  vote: z.enum(['approve', 'decline']),
  reason: z.string(),
  at: Instant,
});

export const AccessRequest = z.strictObject({
  id: Id,
  number: z.string(),
  status: RequestStatus,
  version: z.number().int(),
  /** Binds a decision to just this wording. */
  versionHash: Digest,
  lead: z.string(),
  institution: z.string().nullable(),
  form: RequestForm,
  createdAt: Instant,
  submittedAt: Instant.nullable(),
  decidedAt: Instant.nullable(),
  accessEndsOn: CalendarDate.nullable(),
  votesNeeded: z.number().int(),
  /** Why more than one steward must decide. */
  votesNeededBecause: z.array(z.string()),
  /** For the requester only once decided; for a steward the others' only after their own. */
  votes: z.array(Vote),
  /** What this signed-in person may do with it now. */
  actions: z.array(z.enum(['edit', 'submit', 'delete', 'withdraw', 'vote', 'build-export'])),
  mayNotVoteBecause: z.string().nullable(),
});
export type AccessRequest = z.output<typeof AccessRequest>;

const RequestParams = z.strictObject({ requestId: Id });

export const createRequest = endpoint({
  method: 'POST',
  path: '/api/access-requests',
  summary: 'Begin an access request as a draft',
  body: z.strictObject({ form: RequestForm }),
  response: AccessRequest,
  status: 201,
  problems: [],
});

export const saveRequest = endpoint({
  method: 'PUT',
  path: '/api/access-requests/:requestId',
  summary: 'Keep the draft as typed so far',
  params: RequestParams,
  body: z.strictObject({ form: RequestForm }),
  response: AccessRequest,
  problems: ['not-found', 'request-not-in-state'],
});

export const submitRequest = endpoint({
  method: 'POST',
  path: '/api/access-requests/:requestId/submit',
  summary: 'Hand a complete request to the stewards',
  params: RequestParams,
  body: z.strictObject({}),
  response: AccessRequest,
  problems: ['not-found', 'request-not-in-state', 'request-incomplete'],
});

export const withdrawRequest = endpoint({
  method: 'POST',
  path: '/api/access-requests/:requestId/withdraw',
  summary: 'Take a request back that waits for a decision',
  params: RequestParams,
  body: z.strictObject({}),
  response: AccessRequest,
  problems: ['not-found', 'request-not-in-state'],
});

export const deleteDraft = endpoint({
  method: 'DELETE',
  path: '/api/access-requests/:requestId',
  summary: 'Delete a draft; a request that was handed in stays',
  params: RequestParams,
  response: z.strictObject({}),
  problems: ['not-found', 'request-not-in-state'],
});

export const RequestSummary = z.strictObject({
  id: Id,
  number: z.string(),
  title: z.string(),
  status: RequestStatus,
  lead: z.string(),
  submittedAt: Instant.nullable(),
  updatedAt: Instant,
  /** True on a steward's desk when this steward can act on it. */
  waitsForYou: z.boolean(),
});

export const listRequests = endpoint({
  method: 'GET',
  path: '/api/access-requests',
  summary: "Own team's requests; for stewards every submitted one",
  response: z.strictObject({ requests: z.array(RequestSummary) }),
  problems: [],
});

export const getRequest = endpoint({
  method: 'GET',
  path: '/api/access-requests/:requestId',
  summary: 'One access request',
  params: RequestParams,
  response: AccessRequest,
  problems: ['not-found'],
});

/** How many people the request reaches. Researchers see counts of 1 to 10 as null; stewards see them exactly. */
export const getReach = endpoint({
  method: 'GET',
  path: '/api/access-requests/:requestId/reach',
  summary: 'How many participants the cohort holds and how many consent to this use',
  params: RequestParams,
  response: z.strictObject({
    inCohort: z.number().int().nullable(),
    /** Null also while questions are open. */
    consenting: z.number().int().nullable(),
    /** What has to be answered before it can be told who consents. */
    openQuestions: z.array(z.enum(consentQuestions)),
    /** For stewards: refused and open counts by reason. */
    reasons: z.array(
      z.strictObject({ reason: z.string(), verdict: z.enum(['not_permitted', 'manual_review']), participants: z.number().int() }),
    ),
  }),
  problems: ['not-found'],
});

export const decideRequest = endpoint({
  method: 'POST',
  path: '/api/access-requests/:requestId/votes',
  summary: 'Approve or decline just this version, with a reason',
  params: RequestParams,
  body: z.strictObject({
    versionHash: Digest,
    vote: z.enum(['approve', 'decline']),
    reason: z.string().trim().min(10, 'Give a reason the requester can understand').max(2000),
    noConflict: z.literal(true, 'State that you have no interest in this request'),
  }),
  response: AccessRequest,
  problems: ['not-found', 'request-not-in-state', 'conflict-of-interest', 'already-voted'],
});

export const DataExport = z.strictObject({
  id: Id,
  number: z.string(),
  requestId: Id,
  requestTitle: z.string(),
  status: z.enum(['building', 'ready', 'failed', 'stale']),
  builtAt: Instant.nullable(),
  participants: z.number().int().nullable(),
  bytes: z.number().int().nullable(),
  sha256: Digest.nullable(),
  accessEndsOn: CalendarDate,
});
export type DataExport = z.output<typeof DataExport>;

export const buildExport = endpoint({
  method: 'POST',
  path: '/api/access-requests/:requestId/exports',
  summary: 'Build the export of an approved request',
  params: RequestParams,
  body: z.strictObject({}),
  response: DataExport,
  status: 202,
  problems: ['not-found', 'request-not-in-state', 'access-ended'],
});

export const listExports = endpoint({
  method: 'GET',
  path: '/api/exports',
  summary: "Exports of the signed-in person's approved requests",
  response: z.strictObject({ exports: z.array(DataExport) }),
  problems: [],
});

export const downloadExport = endpoint({
  method: 'GET',
  path: '/api/exports/:exportId/file',
  summary: 'The export as one zip file',
  params: z.strictObject({ exportId: Id }),
  response: z.undefined(),
  download: { contentType: 'application/zip' },
  problems: ['not-found', 'access-ended', 'export-not-ready', 'export-stale'],
});
