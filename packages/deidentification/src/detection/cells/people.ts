/** Names of people, by what stands beside them. A net, not a proof: see the lists. */
import { boundedPattern } from '../bounded-pattern.ts';
import type { CellScan, Judgement } from './cell-scan.ts';
import { doubtfulGivenNames, doubtfulSurnames, eponymNouns, givenNames, noNames, surnames } from './name-lists.ts';

const fold = (word: string): string =>
  word
    .normalize('NFD')
    .replace(/[\p{M}'’]/gu, '')
    .toLowerCase();

const isGiven = (word: string): boolean => givenNames.has(fold(word)) || word.split('-').some((part) => givenNames.has(fold(part)));
const isDoubtfulGiven = (word: string): boolean => doubtfulGivenNames.has(fold(word));
const isSurname = (word: string): boolean => surnames.has(fold(word)) || word.split('-').some((part) => surnames.has(fold(part)));
const isAnySurname = (word: string): boolean => isSurname(word) || doubtfulSurnames.has(fold(word));
const isCapitalised = (word: string): boolean => /^\p{Lu}/u.test(word);
/** Could be a surname although no list has it. */
const mayBeName = (word: string): boolean => isCapitalised(word) && word.length > 1 && (isAnySurname(word) || !noNames.has(fold(word)));
const isEponym = (next: string): boolean => eponymNouns.has(fold(next));

const word = "\\p{L}[\\p{L}'’-]{0,30}";
const capital = "\\p{Lu}[\\p{L}'’-]{1,30}";
const start = "(?<![\\p{L}\\p{N}'’-])";
const end = '(?![\\p{L}\\p{N}])';

const when = (holds: boolean): Judgement => (holds ? 'block' : 'not-it');

/** Titles of staff; "PT" and "OT" are also a patient and a therapy, and count only before a listed name. */
const titledStaff = boundedPattern(
  `${start}(?:Dr|Prof|Professor|Doctor|Nurse|Physio|Physiotherapist|Therapist|Surgeon)\\.? (?:\\p{Lu}\\.? )?(${capital})(?: ${capital})?${end}`,
);
const shortTitledStaff = boundedPattern(`${start}(?:PT|OT|RN|DPT)\\.?:? (\\p{Lu}\\.? ?)?(${capital})${end}(?! \\p{Lu}\\p{Ll})`);
const initialAndSurname = boundedPattern(`${start}(?:by|with|w/|per|from) (?:\\p{Lu}\\. ?){1,2}(${capital})${end}`);
const bareInitialAndSurname = boundedPattern(`${start}(?:by|with|w/|per) \\p{Lu} (${capital})${end}`);
const nameAndCredential = boundedPattern(`${start}(?:\\p{Lu}\\.? )?(${capital}),? (?:PT|OT|RN|MD|DPT|OTR)${end}`);

const warnWhen = (holds: boolean): Judgement => (holds ? 'warn' : 'not-it');

export function detectStaff(scan: CellScan): void {
  scan.take('staff_name', titledStaff, (_, [name = '']) => warnWhen(mayBeName(name)));
  scan.take('staff_name', shortTitledStaff, (_, [initial = '', name = '']) =>
    warnWhen(isSurname(name) || isGiven(name) || (initial.includes('.') && mayBeName(name))),
  );
  scan.take('staff_name', initialAndSurname, (_, [name = '']) => warnWhen(mayBeName(name)));
  scan.take('staff_name', bareInitialAndSurname, (_, [name = '']) => warnWhen(isSurname(name)));
  scan.take('staff_name', nameAndCredential, (_, [name = '']) => warnWhen(isSurname(name)));
}

const titled = boundedPattern(
  `${start}(?:Mr|Mrs|Ms|Miss|Mx|Mister|Herr|Frau|Mme|Mlle|Madame|Monsieur|Señora?|Sra)\\.? (?:\\p{Lu}\\.? )?(${capital})`,
);
const titledInCapitals = boundedPattern(`${start}(?:MR|MRS|MS|MISS)\\.? (?:\\p{Lu}\\.? )?(${capital})`);
const afterCue = boundedPattern(
  `${start}(?:pt|patient|client|participant|wife|husband|spouse|mother|father|mum|mom|dad|son|daughter|brother|sister|partner|carer|caregiver|friend|aunt|uncle|niece|nephew|cousin|grandson|granddaughter|named|called|name is|name),?:? (${word})(?: (${word}))?`,
  'i',
);
/** Every word with the two after it, so that no pair is missed. */
const wordAndNext = boundedPattern(`${start}(${word})(?= (?:\\p{Lu}\\.? )?(${word})(?: (${word}))?)`);
const commaAndNext = boundedPattern(`${start}(${word}),(?= ?(${word}))`);
const wholeCell = /^\p{Lu}{3,31}, \p{Lu}\p{Ll}{1,30}(?: \p{Lu}\.?)?$/u;

function isFullName(first: string, second: string, third: string): boolean {
  if (isEponym(third)) return false;
  if (isGiven(first)) return isSurname(second) || (isCapitalised(first) && mayBeName(second));
  return isDoubtfulGiven(first) && isCapitalised(first) && isCapitalised(second) && isSurname(second);
}

function isNameAfterCue(first: string, second: string): boolean {
  if (isGiven(first)) return true;
  return isDoubtfulGiven(first) && isCapitalised(first) && mayBeName(second);
}

function isSurnameFirst(surname: string, given: string): boolean {
  if (!isCapitalised(surname) || !isCapitalised(given)) return false;
  return isGiven(given) ? mayBeName(surname) : isDoubtfulGiven(given) && isSurname(surname);
}

export function detectPeople(scan: CellScan): void {
  scan.take('person_name', titled, (_, [name = '']) => when(mayBeName(name)));
  scan.take('person_name', titledInCapitals, (_, [name = '']) => when(isSurname(name)));
  scan.take('person_name', afterCue, (_, [first = '', second = '']) => when(isNameAfterCue(first, second)));
  scan.take('person_name', commaAndNext, (_, [surname = '', given = '']) => when(isSurnameFirst(surname, given)));
  scan.take('person_name', wordAndNext, (_, [first = '', second = '', third = '']) => when(isFullName(first, second, third)));
  if (wholeCell.test(scan.text)) {
    const [surname = '', given = ''] = scan.text.split(/, | /);
    if (isSurname(surname)) scan.add('person_name', 'block');
    else if (mayBeName(surname) && mayBeName(given)) scan.add('person_name', 'warn');
  }
}
