export { defaultLimits } from './limits.ts';
export type { ReadLimits } from './limits.ts';
export type { Finding, RuleFindings, RuleText, Severity } from './finding.ts';
export { TypedColumn, TypedTable } from './table/typed-table.ts';
export type { Cell } from './table/typed-table.ts';
export type { RegistryContext, TypedTables } from './registry-context.ts';
