/** Disclosure control: what may be shown of people in statistics and exports, and what must be hidden with it. */
export type { CountTable, HiddenPattern, PerPlace, Place } from './count-table.ts';
export type { AuditOptions, HiddenInterval, Knowledge } from './interval-audit.ts';
export { intervalAudit } from './interval-audit.ts';
export type { ProtectedTable, ProtectionAudit, ProtectionOptions, PublishedCount, PublishedTable } from './protect-table.ts';
export { HIDDEN, protectTable, SMALLEST_SHOWN } from './protect-table.ts';
export type { GroupsForMeans } from './groups-for-means.ts';
export { groupsForMeans } from './groups-for-means.ts';
export type { LinearSolver, LinkedAuditOptions, LinkedFigure, LinkedInterval, LinkedTables } from './linked-audit.ts';
export { linkedIntervalAudit, loadLinearSolver } from './linked-audit.ts';
export type { Slice, SlicePlace } from './linked-slices.ts';
export { linkSlices } from './linked-slices.ts';
