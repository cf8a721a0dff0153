/** Disclosure control: what may be shown of people in statistics and exports, and what must be hidden with it. */
export type { CountTable, HiddenPattern, PerPlace, Place } from './count-table.ts';
export type { AuditOptions, HiddenInterval, Knowledge } from './interval-audit.ts';
export { intervalAudit } from './interval-audit.ts';
export type { ProtectedTable, ProtectionAudit, ProtectionOptions, PublishedCount, PublishedTable } from './protect-table.ts';
export { HIDDEN, protectTable } from './protect-table.ts';
export { SMALLEST_SHOWN } from './smallest-shown.ts';
export type { GroupsForMeans } from './groups-for-means.ts';
export { groupsForMeans } from './groups-for-means.ts';
export type { LinearSolver, LinkedAuditOptions, LinkedFigure, LinkedInterval, LinkedTables } from './linked-audit.ts';
export { linkedIntervalAudit, loadLinearSolver } from './linked-audit.ts';
export type { Slice, SlicePlace } from './linked-slices.ts';
export { linkSlices } from './linked-slices.ts';
export type { PeopleSet } from './people-set.ts';
export { peopleSet } from './people-set.ts';
export type { AnsweredSet, Judgement, Question, RefusalReason } from './query-guard.ts';
export { judgeQuestion, refusalText } from './query-guard.ts';
export { sitesHoldingTheCut } from './data-cut.ts';
