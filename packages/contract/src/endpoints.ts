/** Every endpoint by name. The authority table must have an entry for each: a missing one does not compile. */
import * as account from './account.ts';
import * as audit from './audit.ts';
import * as explore from './explore.ts';
import * as health from './health.ts';
import * as months from './months.ts';
import * as people from './people.ts';
import * as replacedCodes from './replaced-codes.ts';
import * as requests from './requests.ts';
import * as siteSystems from './site-systems.ts';
import * as submissions from './submissions.ts';

export const endpoints = {
  getLiveness: health.getLiveness,
  getReadiness: health.getReadiness,
  getAccount: account.getAccount,
  signOut: account.signOut,
  getInvitation: account.getInvitation,
  acceptInvitation: account.acceptInvitation,
  listPeople: people.listPeople,
  invitePerson: people.invitePerson,
  revokeInvitation: people.revokeInvitation,
  giveGrant: people.giveGrant,
  endGrant: people.endGrant,
  setPersonStatus: people.setPersonStatus,
  listSites: people.listSites,
  listSiteSystems: siteSystems.listSiteSystems,
  addSiteSystem: siteSystems.addSiteSystem,
  setSiteSystemStatus: siteSystems.setSiteSystemStatus,
  listMonths: months.listMonths,
  listCalendar: months.listCalendar,
  closeMonth: months.closeMonth,
  replaceCodes: replacedCodes.replaceCodes,
  openSubmission: submissions.openSubmission,
  listSubmissions: submissions.listSubmissions,
  getSubmission: submissions.getSubmission,
  putSubmissionFile: submissions.putSubmissionFile,
  removeSubmissionFile: submissions.removeSubmissionFile,
  putSubmissionWorkbook: submissions.putSubmissionWorkbook,
  removeSubmissionWorkbook: submissions.removeSubmissionWorkbook,
  mendCells: submissions.mendCells,
  checkSubmission: submissions.checkSubmission,
  listFindings: submissions.listFindings,
  downloadFindings: submissions.downloadFindings,
  downloadFindingsWorkbook: submissions.downloadFindingsWorkbook,
  acknowledgeFindings: submissions.acknowledgeFindings,
  listChanges: submissions.listChanges,
  commitSubmission: submissions.commitSubmission,
  getReceipt: submissions.getReceipt,
  discardSubmission: submissions.discardSubmission,
  getTemplate: submissions.getTemplate,
  listParticipantCodes: submissions.listParticipantCodes,
  listSafeHeaders: submissions.listSafeHeaders,
  markSafeHeader: submissions.markSafeHeader,
  unmarkSafeHeader: submissions.unmarkSafeHeader,
  getGrid: explore.getGrid,
  listOutcomes: explore.listOutcomes,
  makeRelease: explore.makeRelease,
  listReleases: explore.listReleases,
  getPublicFigures: explore.getPublicFigures,
  createRequest: requests.createRequest,
  saveRequest: requests.saveRequest,
  submitRequest: requests.submitRequest,
  withdrawRequest: requests.withdrawRequest,
  deleteDraft: requests.deleteDraft,
  listRequests: requests.listRequests,
  getRequest: requests.getRequest,
  getReach: requests.getReach,
  decideRequest: requests.decideRequest,
  buildExport: requests.buildExport,
  listExports: requests.listExports,
  downloadExport: requests.downloadExport,
  listAudit: audit.listAudit,
  verifyAudit: audit.verifyAudit,
} as const;

export type EndpointName = keyof typeof endpoints;
