export * from './seeded-generator.ts';
export * from './bootstrap-percentile.ts';
