/** Calendar dates and parts of dates, as clinics write them. A year alone is no identifier. */
import { isCalendarDate } from '../../dates/is-calendar-date.ts';
import { boundedPattern } from '../bounded-pattern.ts';
import type { ColumnTraits } from '../column-traits.ts';
import type { CellScan, Judgement } from './cell-scan.ts';

/** Names of months in the languages of the clinics, January first; accents may be missing. */
const monthNames = [
  'january|jan|januar|janvier|janv|enero|ene|gennaio|januari',
  'february|feb|febr|februar|f[ée]vrier|f[ée]vr|febrero|febbraio|februari',
  'march|mar|m[äa]rz|mrz|mars|marzo|maart',
  'april|apr|avril|avr|abril|abr|aprile',
  'may|mai|mayo|maggio|mei',
  'june|jun|juni|juin|junio|giugno',
  'july|jul|juli|juillet|juil|julio|luglio',
  'august|aug|ao[ûu]t|agosto|augustus',
  'september|sept|sep|septembre|septiembre|settembre',
  'october|oct|oktober|okt|octobre|octubre|ottobre',
  'november|nov|novembre|noviembre',
  'december|dec|dezember|dez|d[ée]cembre|d[ée]c|diciembre|dic|dicembre',
];
const month = `(?:${monthNames.join('|')})`;
const monthPatterns = monthNames.map((names) => new RegExp(`^(?:${names})$`, 'iu'));
const monthOf = (name: string): number => monthPatterns.findIndex((pattern) => pattern.test(name)) + 1;

const fullYear = '(?:19|20)\\d\\d';
const anyYear = `(?:${fullYear}|['’]?\\d\\d)`;
const ordinal = '(?:st|nd|rd|th|er|\\.)?';
const before = '(?<![\\p{L}\\d.,/-])';
const after = '(?![\\p{L}\\d]|[/-]\\d)';

const yearFirst = boundedPattern(`${before}(${fullYear})([-/.])(\\d{1,2})\\2(\\d{1,2})(?!\\d)(?:T\\d{2}:?\\d{2}[\\d:.,Z+-]{0,20})?`, 'i');
const yearLast = boundedPattern(`${before}(\\d{1,2})([-/.] ?)(\\d{1,2})\\2(${fullYear})(?!\\d)`);
const shortYear = boundedPattern(
  `${before}(\\d{1,2})([-/.])(\\d{1,2})\\2(\\d{2})${after}(?! ?(?:reps?|sets?|x|kg|lbs?|min|m|s)(?!\\p{L}))`,
  'i',
);
const dayThenName = boundedPattern(
  `${before}(\\d{1,2}) ?${ordinal}(?:[ ./-]{1,2}|(?: of | de ))?(${month})\\.?[ ,./-]{0,2}(?:de )?(${anyYear})(?!\\d)`,
  'i',
);
const nameThenDay = boundedPattern(`(?<!\\p{L})(${month})\\.?[ -]{0,2}(\\d{1,2})${ordinal}(?:,? |-|, ?)(${anyYear})(?!\\d)`, 'i');
const yearThenName = boundedPattern(`${before}(${fullYear})[ ./-]{1,2}(${month})\\.?[ ./-]{1,2}(\\d{1,2})(?!\\d)`, 'i');
const weekDate = boundedPattern(`${before}${fullYear}-?W[0-5]\\d-?[1-7](?!\\d)`, 'i');
const eightDigits = boundedPattern('(?<!\\d)(\\d{2})(\\d{2})(\\d{2})(\\d{2})(?!\\d)');
const dayOfYear = boundedPattern(`(?<!\\d)${fullYear}-[0-3]\\d\\d(?!\\d)`);

const when = (holds: boolean): Judgement => (holds ? 'block' : 'not-it');
/** Day and month, in whichever order. */
const isDay = (year: number, one: number, other: number): boolean => isCalendarDate(year, one, other) || isCalendarDate(year, other, one);
/** A leap year, so that 29 February of an unknown century counts. */
const leapYear = 2000;

export function detectFullDates(scan: CellScan, { isDate, isSets }: ColumnTraits): void {
  scan.take('full_date', yearFirst, (_, [year, , one, other]) => when(isDay(Number(year), Number(one), Number(other))));
  scan.take('full_date', yearLast, (_, [one, , other, year]) => when(isDay(Number(year), Number(one), Number(other))));
  scan.take('full_date', dayThenName, (_, [day, name = '']) => when(isCalendarDate(leapYear, monthOf(name), Number(day))));
  scan.take('full_date', nameThenDay, (_, [name = '', day]) => when(isCalendarDate(leapYear, monthOf(name), Number(day))));
  scan.take('full_date', yearThenName, (_, [, name = '', day]) => when(isCalendarDate(leapYear, monthOf(name), Number(day))));
  scan.take('full_date', weekDate);
  if (!isSets) {
    scan.take('full_date', shortYear, (_, [first, , second, third]) => {
      const [one, two, three] = [Number(first), Number(second), Number(third)];
      if (!isDay(leapYear, one, two) && !isDay(leapYear, two, three)) return 'not-it';
      return isDate ? 'block' : 'warn';
    });
  }
  if (!isDate) return;
  scan.take('full_date', dayOfYear);
  scan.take('full_date', eightDigits, (digits) => {
    const [yearsFirst, yearsLast] = [Number(digits.slice(0, 4)), Number(digits.slice(4))];
    const inRange = (year: number) => year >= 1900 && year <= 2099;
    return when(
      (inRange(yearsFirst) && isCalendarDate(yearsFirst, Number(digits.slice(4, 6)), Number(digits.slice(6)))) ||
        (inRange(yearsLast) && isDay(yearsLast, Number(digits.slice(0, 2)), Number(digits.slice(2, 4)))),
    );
  });
}

const nameAndYear = boundedPattern(`(?<!\\p{L})(${month})\\.?[ ,./-]{0,2}(?:of |de )?(?:${fullYear}|['’]\\d\\d)(?!\\d)`, 'i');
const nameAndShortYear = boundedPattern(`(?<!\\p{L})${month}-\\d\\d(?!\\d)`, 'i');
const yearAndName = boundedPattern(`${before}${fullYear}[ ./-]{1,2}${month}(?!\\p{L})`, 'i');
const yearAndMonth = boundedPattern(`${before}${fullYear}[-/](?:0[1-9]|1[0-2])${after}`);
const monthAndYear = boundedPattern(`${before}(?:0?[1-9]|1[0-2])[-/.]${fullYear}(?!\\d)`);
const week = boundedPattern(
  `${before}${fullYear}[ -]?W ?[0-5]?\\d(?!\\d)|(?<!\\p{L})(?:W|KW|week|wk)\\.? ?[0-5]?\\d,?[ /-](?:of |in )?${fullYear}(?!\\d)`,
  'i',
);
const quarter = boundedPattern(
  `(?<!\\p{L})Q ?[1-4][ /-](?:of )?(?:${fullYear}|['’]\\d\\d)(?!\\d)|${before}${fullYear}[ /-]?Q ?[1-4](?!\\d)|(?<!\\p{L})(?:first|second|third|fourth|[1-4](?:st|nd|rd|th)) quarter (?:of )?${fullYear}(?!\\d)`,
  'i',
);
const season = boundedPattern(`(?<!\\p{L})(?:spring|summer|autumn|winter)(?: of)? ${fullYear}(?!\\d)`, 'i');
const cue = '(?<!\\p{L})(?:on|since|until|till|from|by|before|after)(?: the)? ';
const dayAndName = boundedPattern(
  `${cue}\\d{1,2} ?${ordinal} ?(?:of )?${month}(?!\\p{L})|${cue}${month}\\.? \\d{1,2}${ordinal}(?![\\d%])`,
  'i',
);
const shortInDateColumn = boundedPattern(`${before}\\d{1,2}[-/.]\\d{1,2}${after}`);

export function detectPartDates(scan: CellScan, { isDate }: ColumnTraits): void {
  for (const pattern of [nameAndYear, yearAndName, yearAndMonth, monthAndYear, week, quarter, season, dayAndName])
    scan.take('part_date', pattern);
  scan.take('part_date', nameAndShortYear, (match) => when(isDate || /^[\p{Lu}]/u.test(match)));
  if (isDate) scan.take('part_date', shortInDateColumn);
}

/** Seconds or thousandths since 1970, from 2001 to the end of 2099. */
const epoch = boundedPattern('(?<![\\d.-])(?:[1-3]\\d{9}|40\\d{8}|[1-3]\\d{12}|40\\d{11})(?![\\d]|\\.\\d{4})');

export function detectEpochTimes(scan: CellScan, { isTime }: ColumnTraits): void {
  if (isTime) scan.take('epoch_time', epoch);
}
