export type { EventCount } from './counts.ts';
export * from './wilson-proportion.ts';
export * from './clopper-pearson-proportion.ts';
export * from './newcombe-difference.ts';
export * from './responder-bounds.ts';
