import type { AcceptedUnit } from './types.ts';

const speedSource = 'NIST SP 811 (2008), B.8: 1 mi/h = 0.447 04 m/s exactly; 1 km/h = 1000 m / 3600 s';
const footSource = 'NIST SP 811 (2008), B.8: 1 ft = 0.3048 m exactly';
const poundSource = 'NIST SP 811 (2008), B.8: 1 lb = 0.453 592 37 kg exactly';
const siSource = 'SI Brochure, 9th edition: prefixes, minute and hour';

/** Speeds, stored in m/s. */
export const speedUnits: readonly AcceptedUnit[] = [
  { unit: 'km/h', times: 5, dividedBy: 18, source: speedSource },
  { unit: 'mph', times: 44_704, dividedBy: 100_000, source: speedSource },
];

/** Distances, stored in m. */
export const distanceUnits: readonly AcceptedUnit[] = [
  { unit: 'ft', times: 3_048, dividedBy: 10_000, source: footSource },
  { unit: 'km', times: 1_000, dividedBy: 1, source: siSource },
];

/** Masses, stored in kg. */
export const massUnits: readonly AcceptedUnit[] = [{ unit: 'lb', times: 45_359_237, dividedBy: 100_000_000, source: poundSource }];

/** Durations stored in seconds. */
export const secondUnits: readonly AcceptedUnit[] = [{ unit: 'min', times: 60, dividedBy: 1, source: siSource }];

/** Durations stored in minutes. */
export const minuteUnits: readonly AcceptedUnit[] = [
  { unit: 's', times: 1, dividedBy: 60, source: siSource },
  { unit: 'h', times: 60, dividedBy: 1, source: siSource },
];
