/** Check digits of published numbering schemes. All expect plain digits or capitals, without separators. */

const digitsOf = (text: string): number[] => Array.from(text, Number);

/** ISO/IEC 7812-1, annex B: payment cards. */
export function passesLuhn(digits: string): boolean {
  const sum = digitsOf(digits)
    .reverse()
    .reduce((total, digit, place) => total + (place % 2 === 0 ? digit : digit * 2 - (digit > 4 ? 9 : 0)), 0);
  return sum % 10 === 0;
}

/** NHS Data Dictionary: weights 10 to 2, eleven minus the remainder by eleven; 11 is written 0 and 10 is never given out. */
export function passesNhsCheck(digits: string): boolean {
  const numbers = digitsOf(digits);
  const sum = numbers.slice(0, 9).reduce((total, digit, place) => total + digit * (10 - place), 0);
  return (11 - (sum % 11)) % 11 === numbers[9] && digits.length === 10;
}

/** ISO 13616: the remainder by 97 of the account number, moved and spelt in digits, is 1. */
export function passesIbanCheck(iban: string): boolean {
  let remainder = 0;
  for (const character of iban.slice(4) + iban.slice(0, 4)) {
    const value = Number.parseInt(character, 36);
    remainder = (remainder * (value > 9 ? 100 : 10) + value) % 97;
  }
  return remainder === 1;
}

const vehicleWeights = [8, 7, 6, 5, 4, 3, 2, 10, 0, 9, 8, 7, 6, 5, 4, 3, 2];
const vehicleLetters = 'ABCDEFGH..JKLMN.P.R..STUVWXYZ';

/** 49 CFR 565.15: letters count 1 to 9 in the table's rows; the ninth character is the weighted sum by eleven, X for ten. */
export function passesVehicleCheck(vin: string): boolean {
  const sum = vehicleWeights.reduce((total, weight, place) => {
    const character = vin.charAt(place);
    return total + weight * (/\d/.test(character) ? Number(character) : vehicleLetterValue(character));
  }, 0);
  return '0123456789X'.charAt(sum % 11) === vin.charAt(8);
}

/** A to H are 1 to 8, J to R 1 to 9, S to Z 2 to 9; I, O and Q are never used. */
function vehicleLetterValue(letter: string): number {
  return (vehicleLetters.indexOf(letter) % 10) + 1;
}
