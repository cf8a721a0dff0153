import type { IdentifierClass } from '@cairnstep/deidentification';

/** What the detectors look for, in words. */
export const findingWords: Readonly<Record<IdentifierClass, string>> = {
  person_name: 'names of people',
  geography: 'places',
  coordinates: 'coordinates of places',
  full_date: 'calendar dates',
  part_date: 'parts of dates',
  date_serial: 'day numbers of a spreadsheet',
  epoch_time: 'times of a computer clock',
  age_over_89: 'ages over 89',
  phone: 'telephone numbers',
  email: 'e-mail addresses',
  ssn: 'social security numbers',
  record_number: 'record numbers',
  account_or_plan: 'account or insurance numbers',
  licence_or_vehicle: 'licence or vehicle numbers',
  device_serial: 'serial numbers of devices',
  url: 'web addresses',
  ip: 'network addresses',
  image_or_biometric: 'images or recordings',
  national_id: 'national identity numbers',
  unkeyed_hash: 'codes computed from other numbers',
  unique_code: 'codes of their own for each row',
  staff_name: 'names of staff',
  free_text: 'free text',
};
