import type { ColumnTraits } from '../column-traits.ts';
import type { Hit } from '../hit.ts';
import { isBareNumber } from '../is-bare-number.ts';
import { detectNetworkAddresses } from './addresses-on-networks.ts';
import { detectAges } from './ages.ts';
import { CellScan } from './cell-scan.ts';
import { detectEpochTimes, detectFullDates, detectPartDates } from './dates.ts';
import { detectDevicesAndHashes } from './devices-and-hashes.ts';
import {
  detectAccountsAndVehicles,
  detectNationalNumbers,
  detectPhones,
  detectRecordNumbers,
  detectSocialSecurity,
} from './numbers-of-people.ts';
import { detectPeople, detectStaff } from './people.ts';
import { detectCoordinates, detectPlaces } from './places.ts';

interface Detector {
  readonly detect: (scan: CellScan, traits: ColumnTraits) => void;
  /** Without this in the text there is nothing to find. */
  readonly needs: RegExp;
}

const withDigit = (detect: Detector['detect']): Detector => ({ detect, needs: /\d/ });
const betweenWords = (detect: Detector['detect']): Detector => ({ detect, needs: /[ ,]/ });

/** The most telling patterns first: what they take, the vaguer ones after them no longer see. */
const ofAnyText: readonly Detector[] = [
  { detect: detectNetworkAddresses, needs: /[.:]/ },
  withDigit(detectDevicesAndHashes),
  withDigit(detectAccountsAndVehicles),
  withDigit(detectSocialSecurity),
  withDigit(detectEpochTimes),
  withDigit(detectFullDates),
  withDigit(detectPartDates),
  withDigit(detectCoordinates),
  withDigit(detectNationalNumbers),
  withDigit(detectRecordNumbers),
  withDigit(detectPhones),
  withDigit(detectPlaces),
  withDigit(detectAges),
  betweenWords(detectStaff),
  betweenWords(detectPeople),
];

/** What numbers alone can be. Ten digits are judged over the whole column, because one in eleven passes the check by chance. */
const ofNumbers: readonly Detector[] = [
  detectAccountsAndVehicles,
  detectSocialSecurity,
  detectEpochTimes,
  detectFullDates,
  detectPartDates,
  detectPlaces,
  detectAges,
].map(withDigit);

/** A number as it stands in most cells of a month: too short for anything but an age, a part of a date or of a postal code. */
const shortNumber = /^-?\d{1,4}(?:[.,]\d{1,3})?$/;

/** The identifiers in one cell. */
export function detectCell(cell: string, traits: ColumnTraits): Hit[] {
  if (shortNumber.test(cell) && !traits.isAge && !traits.isPostal && !traits.isDate) return [];
  const scan = new CellScan(cell);
  if (scan.text === '') return [];
  const detectors = traits.role === 'number' && isBareNumber(scan.text) ? ofNumbers : ofAnyText;
  for (const { detect, needs } of detectors) if (needs.test(scan.text)) detect(scan, traits);
  return scan.hits();
}
