export * from './random-effects-pooling.ts';
export * from './intraclass-correlation.ts';
export * from './rater-agreement.ts';
export * from './funnel-limits.ts';
export * from './funnel-plot.ts';
