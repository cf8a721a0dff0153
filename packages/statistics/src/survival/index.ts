export type { EventTime, FollowUp } from './follow-up.ts';
export * from './kaplan-meier.ts';
export * from './log-rank-test.ts';
export * from './cox-regression.ts';
