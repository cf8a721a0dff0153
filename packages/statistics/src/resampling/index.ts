export * from './seeded-generator.ts';
