/** Numbers given to people by authorities, insurers, banks and hospitals, and the numbers of vehicles. */
import { boundedPattern } from '../bounded-pattern.ts';
import { passesIbanCheck, passesLuhn, passesNhsCheck, passesVehicleCheck } from '../check-digits.ts';
import type { ColumnTraits } from '../column-traits.ts';
import type { CellScan } from './cell-scan.ts';

const socialSecurity = boundedPattern('(?<![\\p{L}\\d.,-])(\\d{3})([ -])(\\d{2})\\2(\\d{4})(?![\\p{L}\\d]|[.,-]\\d)');
const nineDigits = boundedPattern('(?<![\\p{L}\\d])(\\d{3})()(\\d{2})(\\d{4})(?![\\p{L}\\d])');

/** SSA RM 10201.035: areas 000, 666 and 900 to 999, group 00 and serial 0000 are never given out. */
const isGiven = ([area = '', , group, serial]: readonly (string | undefined)[]): boolean =>
  area !== '000' && area !== '666' && area < '900' && group !== '00' && serial !== '0000';

const tenDigits = boundedPattern('(?<![\\p{L}\\d.,-])\\d{3}([ -]?)\\d{3}\\1\\d{4}(?![\\p{L}\\d]|[.,-]\\d)');

/** Lengths by country: ISO 13616 register of the account number formats. */
const accountLengths: Readonly<Record<string, number>> = {
  ...{ AD: 24, AE: 23, AL: 28, AT: 20, AZ: 28, BA: 20, BE: 16, BG: 22, BH: 22, BR: 29, BY: 28, CH: 21, CR: 22, CY: 28, CZ: 24, DE: 22 },
  ...{ DK: 18, DO: 28, EE: 20, EG: 29, ES: 24, FI: 18, FO: 18, FR: 27, GB: 22, GE: 22, GI: 23, GL: 18, GR: 27, GT: 28, HR: 21, HU: 28 },
  ...{ IE: 22, IL: 23, IQ: 23, IS: 26, IT: 27, JO: 30, KW: 30, KZ: 20, LB: 28, LC: 32, LI: 21, LT: 20, LU: 20, LV: 21, MC: 27, MD: 24 },
  ...{ ME: 22, MK: 19, MR: 27, MT: 31, MU: 30, NL: 18, NO: 15, PK: 24, PL: 28, PS: 29, PT: 25, QA: 29, RO: 24, RS: 22, SA: 24, SC: 31 },
  ...{ SE: 24, SI: 19, SK: 24, SM: 27, ST: 25, SV: 28, TL: 23, TN: 24, TR: 26, UA: 29, VA: 22, VG: 24, XK: 20 },
};
const accountNumber = boundedPattern('(?<![\\p{L}\\d])[A-Z]{2}\\d{2}(?: ?[A-Z0-9]){11,28}', 'i');

/** What follows the number in the text may look like more of it: the country says where it ends. */
function isAccount(match: string): boolean {
  const compact = match.replaceAll(' ', '').toUpperCase();
  const length = accountLengths[compact.slice(0, 2)];
  return length !== undefined && compact.length >= length && passesIbanCheck(compact.slice(0, length));
}

const cardNumber = boundedPattern(
  '(?<![\\p{L}\\d.,-])(?:[3-6]\\d{12,18}|[3-6]\\d{3}([ -])\\d{4}\\1\\d{4}\\1\\d{1,4}(?:\\1\\d{1,3})?|[3-6]\\d{3}([ -])\\d{6}\\2\\d{4,5})(?![\\p{L}\\d]|[.,]\\d)',
);

const vehicleNumber = boundedPattern('(?<![\\p{L}\\p{N}])(?=[A-Z]{0,16}\\d)(?=\\d{0,16}[A-Z])[A-HJ-NPR-Z\\d]{17}(?![\\p{L}\\p{N}])', 'i');

const recordNumber = boundedPattern(
  '(?<![\\p{L}\\p{N}])(?:MRN|(?:hospital|hosp|chart|patient|pt|pat|record|case|file|unit|clinic|admission|encounter|episode|study|trial)\\.?[ -]?(?:no|number|nr|id|#)|chart|ID(?=[ .:#]))\\.?(?: is)?[ .:#-]{0,4}[A-Z]{0,4}[-/ ]?\\d[\\d-]{2,14}\\d(?![\\p{L}\\d])',
  'i',
);

const international = boundedPattern('(?<![\\p{L}\\d])(?:\\+|00 ?)[1-9](?:[ ().-]{0,2}\\d){7,14}(?!\\d)');
const northAmerican = boundedPattern(
  '(?<![\\p{L}\\d.-])(?:1[ -])?(?:\\(\\d{3}\\) ?\\d{3}[ .-]\\d{4}|\\d{3}([.-])\\d{3}\\1\\d{4})(?![\\p{L}\\d]|[.-]\\d)',
);
const national = boundedPattern('(?<![\\p{L}\\d.,:-])\\(?0[1-9]\\d{0,4}\\)?(?:[ /.-]{1,3}\\d{2,8}){1,5}(?![\\p{L}\\d]|[.,:-]\\d)');
const afterCue = boundedPattern(
  '(?<![\\p{L}\\p{N}])(?:tel|telephone|phone|mobile|mob|cell|fax|call|ring|pager)\\.?(?: (?:no|number|on|at|me|him|her|back))?[ .:#]{0,4}\\(?\\d(?:[ ().-]{0,2}\\d){6,14}(?!\\d)',
  'i',
);
const inPhoneColumn = boundedPattern('\\+?\\(?\\d(?:[ ()./-]{0,2}\\d){6,14}');

const decimals = /^[+]?\d{1,2}\.\d{1,3}(?:[ -]\d{1,2}\.\d{1,3}){1,8}$/;

/** Groups of a national number: none of a single digit, nine to twelve digits in all. Speeds and times have shorter ones. */
function isNationalPhone(match: string): boolean {
  const groups = match.split(/[^\d]+/).filter((group) => group !== '');
  const digits = groups.join('').length;
  return digits >= 9 && digits <= 12 && groups.length > 1 && (groups.length < 5 || groups.every((group) => group.length === 2));
}

export function detectAccountsAndVehicles(scan: CellScan, { isVehicle }: ColumnTraits): void {
  scan.take('account_or_plan', accountNumber, (match) => (isAccount(match) ? 'block' : 'not-it'));
  scan.take('account_or_plan', cardNumber, (match) => {
    const digits = match.replace(/\D/g, '');
    return digits.length >= 13 && passesLuhn(digits) ? 'block' : 'not-it';
  });
  scan.take('licence_or_vehicle', vehicleNumber, (match) => {
    if (passesVehicleCheck(match.toUpperCase())) return 'block';
    return isVehicle ? 'warn' : 'not-it';
  });
}

export function detectSocialSecurity(scan: CellScan, { isSocialSecurity }: ColumnTraits): void {
  scan.take('ssn', socialSecurity, (_, groups) => (isGiven(groups) ? 'block' : 'not-it'));
  if (isSocialSecurity) scan.take('ssn', nineDigits, (_, groups) => (isGiven(groups) ? 'block' : 'not-it'));
}

/** Ten digits with a right check digit. One number in eleven has one by chance, so a column of numbers is judged as a whole. */
export const isNationalNumber = (cell: string): boolean => /^\d{10}$/.test(cell) && passesNhsCheck(cell);

export function detectNationalNumbers(scan: CellScan): void {
  scan.take('national_id', tenDigits, (match) => (passesNhsCheck(match.replace(/\D/g, '')) ? 'block' : 'not-it'));
}

export function detectRecordNumbers(scan: CellScan): void {
  scan.take('record_number', recordNumber);
}

export function detectPhones(scan: CellScan, { isPhone }: ColumnTraits): void {
  scan.take('phone', international, (match) => (decimals.test(match) ? 'not-it' : 'block'));
  scan.take('phone', northAmerican);
  scan.take('phone', afterCue);
  scan.take('phone', national, (match) => (isNationalPhone(match) ? 'block' : 'not-it'));
  if (isPhone) scan.take('phone', inPhoneColumn);
}
