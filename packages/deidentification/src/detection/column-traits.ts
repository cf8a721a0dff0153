import type { ColumnRole } from './detection-context.ts';
import { headerTokens } from './header-tokens.ts';
import { aboutDateWords, ageWords, amountWords, dateWords, mobileWords, phoneWords, postalWords, vehicleWords } from './header-words.ts';
import { wordSet } from '../word-set.ts';

/** What the header and role of a column say about how its cells are to be read. */
export interface ColumnTraits {
  readonly role: ColumnRole;
  readonly isDate: boolean;
  readonly isTime: boolean;
  readonly isAge: boolean;
  readonly isPostal: boolean;
  readonly isPhone: boolean;
  readonly isSocialSecurity: boolean;
  readonly isVehicle: boolean;
  readonly isVersion: boolean;
  /** Repetitions of training sets, written like dates: 10/12/14. */
  readonly isSets: boolean;
}

const dates = wordSet(`${dateWords} admission admitted discharge discharged surgery birth`);
const notDates = wordSet(`${aboutDateWords} ${amountWords} no number id day days year years weeks place`);
const times = wordSet(`${dateWords} time timestamp created modified start started end ended recorded epoch logged updated at`);
const amounts = wordSet(`${amountWords} elapsed ticks counter`);
const ages = wordSet(ageWords);
const notYears = wordSet('month months week weeks day days group band');
const postal = wordSet(postalWords);
const phones = wordSet(`${phoneWords} ${mobileWords}`);
const vehicles = wordSet(vehicleWords);
const versions = wordSet('version firmware software release build');
const sets = wordSet('reps rep repetitions sets set');

export function columnTraits(header: string, role: ColumnRole): ColumnTraits {
  const words = headerTokens(header);
  const has = (list: ReadonlySet<string>) => words.some((word) => list.has(word));
  return {
    role,
    isDate: has(dates) && !has(notDates),
    isTime: has(times) && !has(amounts),
    isAge: has(ages) && !has(notYears),
    isPostal: has(postal) || (words.includes('post') && words.includes('code')),
    isPhone: has(phones),
    isSocialSecurity: words.includes('ssn') || (words.includes('social') && words.includes('security')),
    isVehicle: has(vehicles),
    isVersion: has(versions),
    isSets: has(sets),
  };
}
