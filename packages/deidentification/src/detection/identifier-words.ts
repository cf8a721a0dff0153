import type { IdentifierClass } from './identifier-class.ts';

/** What a class is, in a sentence: what was found is, or a column holds, the name of a person. */
export const identifierWords: Readonly<Record<IdentifierClass, string>> = {
  person_name: 'the name of a person',
  geography: 'an address or a place smaller than a state',
  coordinates: 'the coordinates of a place',
  full_date: 'a calendar date',
  part_date: 'part of a calendar date',
  date_serial: 'a calendar date as a spreadsheet counts it',
  epoch_time: 'a moment in time as computers count it',
  age_over_89: 'an age of 90 or more',
  phone: 'a telephone number',
  email: 'an e-mail address',
  ssn: 'a social security number',
  record_number: 'a record number',
  account_or_plan: 'the number of an account, card or insurance',
  licence_or_vehicle: 'the number of a licence or vehicle',
  device_serial: 'the serial number of a device',
  url: 'the address of a web page',
  ip: 'the address of a computer',
  image_or_biometric: 'a picture or a recording of a person',
  national_id: 'a national number of a person',
  unkeyed_hash: 'a hash, from which a number of a person can be guessed',
  unique_code: 'a code of its own in every row',
  staff_name: 'the name of somebody on the staff',
  free_text: 'running text',
};
