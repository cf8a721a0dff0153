/** Sums of the Spinal Cord Independence Measure III. Scores only. */

export interface ScimParts {
  /** 0 to 20. */
  readonly selfCare: number;
  /** 0 to 40. */
  readonly respirationSphincter: number;
  /** 0 to 10. */
  readonly mobilityRoom: number;
  /** 0 to 30. */
  readonly mobilityInOut: number;
}

const limits: Readonly<Record<keyof ScimParts, number>> = { selfCare: 20, respirationSphincter: 40, mobilityRoom: 10, mobilityInOut: 30 };

function checked(parts: Partial<ScimParts>, part: keyof ScimParts): number {
  const points = parts[part];
  if (points === undefined || !Number.isInteger(points) || points < 0 || points > limits[part]) {
    throw new RangeError(`SCIM III ${part} must be a whole number from 0 to ${limits[part]}.`);
  }
  return points;
}

/**
 * SCIM III total, 0 to 100 points.
 * @throws RangeError when a part is not a whole number within its range.
 */
export function scimTotal(parts: ScimParts): number {
  return checked(parts, 'selfCare') + checked(parts, 'respirationSphincter') + scimMobility(parts);
}

/**
 * Both mobility parts together, 0 to 40 points. Trials print it as "SCIM" without saying so.
 * @throws RangeError when a part is not a whole number within its range.
 */
export function scimMobility(parts: Pick<ScimParts, 'mobilityRoom' | 'mobilityInOut'>): number {
  return checked(parts, 'mobilityRoom') + checked(parts, 'mobilityInOut');
}
