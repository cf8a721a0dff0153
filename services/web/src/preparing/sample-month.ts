/** A month of an invented clinic as its coordinator has it, for tests. Never part of the built client. */

/** Words nobody has used for a key file of their own. */
export const passphrase = 'bafo rina tuke sobi malu pegi';

export const participantsCsv = [
  'MRN,Surname,DOB,Sex,Date of injury,Cause,Notes',
  '0048-2913,Okafor,13/06/1950,Female,17/05/2023,transport,lives near the park',
  '0048-2914,Lindqvist,25/12/1931,male,28/02/2022,sports and leisure,',
  '',
].join('\r\n');

/** With decimal commas, another spelling of the record numbers, and a word of the clinic's own on line 4. */
export const sessionsCsv = [
  'MRN;Session date;Session;course;Status;device;Total distance (km);Therapist',
  '00482913;26/03/2024;1;1;cancelled_before;manual_bwstt;;J. Marsh',
  '00482913;28/03/2024;1;1;completed;manual_bwstt;0,12;J. Marsh',
  '00482913;01/04/2024;1;1;all done;manual_bwstt;0,2;J. Marsh',
  '00482914;02/04/2024;1;1;shortened;manual_bwstt;0,05;J. Marsh',
  '',
].join('\r\n');

export const csvFile = (name: string, text: string): File => new File([text], name, { type: 'text/csv' });

export const sampleFiles = (): File[] => [
  csvFile('participants.csv', participantsCsv),
  csvFile('Training sessions November.csv', sessionsCsv),
];
