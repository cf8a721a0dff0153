/** Kinds of identifiers the detectors know, each with the paragraph of 45 CFR 164.514(b)(2)(i) it falls under. */
export const identifierClasses = {
  person_name: 'A',
  geography: 'B',
  coordinates: 'B',
  full_date: 'C',
  part_date: 'C',
  date_serial: 'C',
  epoch_time: 'C',
  age_over_89: 'C',
  phone: 'D/E',
  email: 'F',
  ssn: 'G',
  record_number: 'H',
  account_or_plan: 'I/J',
  licence_or_vehicle: 'K/L',
  device_serial: 'M',
  url: 'N',
  ip: 'O',
  image_or_biometric: 'P/Q',
  national_id: 'R',
  unkeyed_hash: 'R',
  unique_code: 'R',
  /** Not the participant, and personal data all the same. */
  staff_name: null,
  /** May hold any of the others. */
  free_text: null,
} as const;

export type IdentifierClass = keyof typeof identifierClasses;

/** `block`: the data must change before they go anywhere. `warn`: a person must look and say why it may stay. */
export type Strength = 'block' | 'warn';
