import type { TableKey } from '@cairnstep/dictionary';
import type { DateFormat } from '../dates/date-format.ts';

/** What becomes of one column of a clinic's file. A column of dates may serve several purposes, one match each. */
export type ColumnMatch =
  | { readonly header: string; readonly as: 'participant' }
  | {
      readonly header: string;
      readonly as: 'value';
      /** Key of the variable in the dictionary. */
      readonly variable: string;
      /** Unit of the numbers, where it is not the stored one. */
      readonly unit?: string;
      /** The clinic's words → codes of the dictionary, for words the dictionary does not know. Case does not count. */
      readonly codes?: Readonly<Record<string, string>>;
    }
  | {
      readonly header: string;
      /**
       * `study-day`: days from the first training day, into `variable`. `birth-date`: into the age on the first training day.
       * `injury-date`: into the year of injury and the days from injury. `index-date`: the first training day itself; it goes nowhere.
       */
      readonly as: 'birth-date' | 'injury-date' | 'index-date';
      /** Without it the format must follow from the cells. */
      readonly dateFormat?: DateFormat;
    }
  | { readonly header: string; readonly as: 'study-day'; readonly variable: string; readonly dateFormat?: DateFormat }
  | { readonly header: string; readonly as: 'left-out' };

/** Matches by table, as kept from month to month. */
export type StoredMatches = ReadonlyMap<TableKey, readonly ColumnMatch[]>;
