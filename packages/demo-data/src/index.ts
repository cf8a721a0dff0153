/** The demonstration registry: invented from beginning to end, and the same for the same seed. */
export type {
  ClinicMonth,
  ClinicPerson,
  DemoCell,
  DemoFiles,
  DemoMonth,
  DemoOptions,
  DemoRegistry,
  DemoRow,
  DemoSite,
  PlantedMistake,
} from './types.ts';
export { demoRegistry, demoSeed } from './registry.ts';
export { demoCsv, typedRows } from './csv.ts';
export { dateHeaders as clinicDateHeaders } from './clinic-files.ts';
