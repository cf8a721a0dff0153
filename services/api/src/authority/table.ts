/**
 * Who may do what: one typed table. Deny by default.
 * An action without a line, or an endpoint without an entry, does not compile.
 */
import type { EndpointName, Role } from '@cairnstep/contract';

/** `own-site`: only rows of a site the grant names. `own`: only what the person made or belongs to. `all`: the whole registry. */
export type Reach = 'no' | 'own-site' | 'own' | 'all';

/** The columns of the table: the roles of people, and a site's system, which acts without a person. */
export type Column = Role | 'site-system';

type Line = Readonly<Record<Column, Reach>>;

const line = (
  therapist: Reach,
  coordinator: Reach,
  researcher: Reach,
  steward: Reach,
  administrator: Reach,
  siteSystem: Reach = 'no',
): Line => ({
  therapist,
  coordinator,
  researcher,
  steward,
  administrator,
  'site-system': siteSystem,
});

export const authority = {
  //                       therapist    coordinator  researcher  steward  administrator  site's system
  'see-site-rows':    line('own-site', 'own-site', 'no',  'all', 'no'),
  'see-submissions':  line('own-site', 'own-site', 'no',  'all', 'no',  'own-site'),
  'submit':           line('no',       'own-site', 'no',  'no',  'no',  'own-site'),
  'mark-safe-header': line('no',       'no',       'no',  'all', 'no'),
  'see-aggregates':   line('all',      'all',      'all', 'all', 'no'),
  'see-site-figures': line('own-site', 'own-site', 'no',  'all', 'no'),
  'write-request':    line('no',       'no',       'own', 'no',  'no'),
  'see-request':      line('no',       'no',       'own', 'all', 'no'),
  'decide-request':   line('no',       'no',       'no',  'all', 'no'),
  'build-export':     line('no',       'no',       'own', 'no',  'no'),
  'see-export':       line('no',       'no',       'own', 'no',  'no'),
  'make-release':     line('no',       'no',       'no',  'all', 'no'),
  'see-releases':     line('all',      'all',      'all', 'all', 'no'),
  'see-people':       line('no',       'no',       'no',  'all', 'all'),
  'manage-people':    line('no',       'no',       'no',  'no',  'all'),
  'see-sites':        line('own-site', 'own-site', 'no',  'all', 'all', 'own-site'),
  'read-audit':       line('no',       'own',      'own', 'all', 'own'),
  'verify-audit':     line('no',       'no',       'no',  'all', 'no'),
} as const satisfies Readonly<Record<string, Line>>; // prettier-ignore

export type Action = keyof typeof authority;

/** `anyone`: also without signing in. `signed-in`: a known identity, with or without grants. */
export const entries = {
  getLiveness: 'anyone',
  getReadiness: 'anyone',
  getPublicFigures: 'anyone',
  getAccount: 'anyone',
  signOut: 'anyone',
  getInvitation: 'anyone',
  acceptInvitation: 'signed-in',
  listPeople: 'see-people',
  invitePerson: 'manage-people',
  revokeInvitation: 'manage-people',
  giveGrant: 'manage-people',
  endGrant: 'manage-people',
  setPersonStatus: 'manage-people',
  listSites: 'see-sites',
  listSiteSystems: 'see-people',
  addSiteSystem: 'manage-people',
  setSiteSystemStatus: 'manage-people',
  listMonths: 'see-submissions',
  listCalendar: 'see-submissions',
  closeMonth: 'submit',
  replaceCodes: 'submit',
  openSubmission: 'submit',
  listSubmissions: 'see-submissions',
  getSubmission: 'see-submissions',
  putSubmissionFile: 'submit',
  removeSubmissionFile: 'submit',
  putSubmissionWorkbook: 'submit',
  removeSubmissionWorkbook: 'submit',
  mendCells: 'submit',
  checkSubmission: 'submit',
  listFindings: 'see-submissions',
  downloadFindings: 'see-submissions',
  downloadFindingsWorkbook: 'see-submissions',
  acknowledgeFindings: 'submit',
  listChanges: 'see-submissions',
  commitSubmission: 'submit',
  getReceipt: 'see-submissions',
  discardSubmission: 'submit',
  getTemplate: 'see-site-rows',
  listParticipantCodes: 'see-site-rows',
  listSafeHeaders: 'see-site-rows',
  markSafeHeader: 'mark-safe-header',
  unmarkSafeHeader: 'mark-safe-header',
  getGrid: 'see-aggregates',
  listOutcomes: 'see-aggregates',
  makeRelease: 'make-release',
  listReleases: 'see-releases',
  createRequest: 'write-request',
  saveRequest: 'write-request',
  submitRequest: 'write-request',
  withdrawRequest: 'write-request',
  deleteDraft: 'write-request',
  listRequests: 'see-request',
  getRequest: 'see-request',
  getReach: 'see-request',
  decideRequest: 'decide-request',
  buildExport: 'build-export',
  listExports: 'see-export',
  downloadExport: 'see-export',
  listAudit: 'read-audit',
  verifyAudit: 'verify-audit',
} as const satisfies Readonly<Record<EndpointName, Action | 'anyone' | 'signed-in'>>;
