/** Places smaller than a state or country. */
import { boundedPattern } from '../bounded-pattern.ts';
import type { ColumnTraits } from '../column-traits.ts';
import { wordSet } from '../../word-set.ts';
import type { CellScan } from './cell-scan.ts';

/** Areas of British postcodes. */
const areas = wordSet(`
  AB AL B BA BB BD BH BL BN BR BS BT CA CB CF CH CM CO CR CT CV CW DA DD DE DG DH DL DN DT DY E EC EH EN EX FK FY G GL GU GY HA HD HG HP HR
  HS HU HX IG IM IP IV JE KA KT KW KY L LA LD LE LL LN LS LU M ME MK ML N NE NG NN NP NR NW OL OX PA PE PH PL PO PR RG RH RM S SA SE SG SK SL
  SM SN SO SP SR SS ST SW SY TA TD TF TN TQ TR TS TW UB W WA WC WD WF WN WR WS WV YO ZE
`);
/** The inward half never ends in C, I, K, M, O or V. */
const postcode = boundedPattern('(?<![\\p{L}\\d])([A-Z]{1,2})(\\d[A-Z\\d]?)( ?)\\d[ABD-HJLNP-UW-Z]{2}(?![\\p{L}\\d])');
const postcodeAnyCase = boundedPattern('(?<![\\p{L}\\d])([A-Z]{1,2})(\\d[A-Z\\d]?)( ?)\\d[ABD-HJLNP-UW-Z]{2}(?![\\p{L}\\d])', 'i');
const canadian = boundedPattern('(?<![\\p{L}\\d])[ABCEGHJ-NPRSTVXY]\\d[ABCEGHJ-NPRSTV-Z][ -]\\d[ABCEGHJ-NPRSTV-Z]\\d(?![\\p{L}\\d])');
const stateAndZip = boundedPattern(
  ', ?(?:A[KLRZ]|C[AOT]|D[CE]|FL|GA|HI|I[ADLN]|K[SY]|LA|M[ADEINOST]|N[CDEHJMVY]|O[HKR]|PA|RI|S[CD]|T[NX]|UT|V[AT]|W[AIVY]) \\d{5}(?:-\\d{4})?(?!\\d)',
);
/**
 * Three-digit ZIP areas of 20,000 people or fewer in the census of 2000. Newer figures differ, which is one more reason to collect none:
 * the list only keeps a column from passing as safe.
 */
const smallAreas = wordSet('036 059 063 102 203 556 692 790 821 823 830 831 878 879 884 890 893');
const zip = boundedPattern('(?<![\\p{L}\\d.])\\d{5}(?:[- ]?\\d{4})?(?![\\p{L}\\d]|\\.\\d)');
const threeDigits = boundedPattern('(?<![\\p{L}\\d.])\\d{3}(?![\\p{L}\\d]|\\.\\d)');

/** L1 to L5 and S1 to S5 are levels of the spine as well as postcodes: a person decides. */
const isSpinalLevel = (area: string, district: string): boolean => /^[LS]$/i.test(area) && /^[1-5]$/.test(district);

const streets = [
  "(?<![\\p{L}\\d])\\d{1,5}[a-z]?,? (?:\\p{Lu}[\\p{Ll}'-]{1,24} ){1,3}(?:Street|St|Road|Rd|Avenue|Ave|Lane|Ln|Drive|Close|Court|Ct|Crescent|Terrace|Gardens|Boulevard|Blvd|Square|Mews|Highway|Place|Row|Way)(?!\\p{L})",
  '(?<!\\p{L})\\p{Lu}[\\p{L}-]{1,30}(?:straße|strasse|str\\.|gasse|allee|platz|straat|laan|gatan|vej) ?\\d{1,4}(?!\\d)',
  "(?<![\\p{L}\\d])\\d{1,4},? (?:bis |ter )?(?:rue|avenue|boulevard|chemin|impasse|allée|quai) (?:d[eu'] ?|des |de la )?\\p{Lu}",
  '(?<!\\p{L})(?:Calle|Avenida|Via|Viale|Piazza) (?:\\p{Lu}[\\p{L}-]{1,24} ?){1,3},? ?\\d{1,4}(?!\\d)',
].map((source) => boundedPattern(source));

export function detectPlaces(scan: CellScan, { isPostal }: ColumnTraits): void {
  scan.take('geography', isPostal ? postcodeAnyCase : postcode, (_, [area = '', district = '', gap]) => {
    if (!areas.has(area.toUpperCase())) return 'not-it';
    if (gap === '' && area.length === 1 && !isPostal) return 'not-it';
    return isSpinalLevel(area, district) && !isPostal ? 'warn' : 'block';
  });
  scan.take('geography', canadian);
  scan.take('geography', stateAndZip);
  for (const street of streets) scan.take('geography', street);
  if (!isPostal) return;
  scan.take('geography', zip);
  scan.take('geography', threeDigits, (match) => (smallAreas.has(match) ? 'block' : 'not-it'));
}

const degrees = '(-?\\d{1,3}\\.\\d{4,12})';
const pair = boundedPattern(`(?<![\\d.])${degrees}°? ?[NS]?[ ,;/]{1,3}${degrees}(?![\\d.])`);
const minutesAndSeconds = boundedPattern(
  "\\d{1,3}° ?\\d{1,2}(?:\\.\\d{1,4})?[′'’] ?(?:\\d{1,2}(?:\\.\\d{1,4})?[″\"”′']{1,2} ?)?[NSEW](?!\\p{L})",
);

/** Two numbers of four decimals or more, one of them beyond 10: two walking speeds are never as large. */
export function detectCoordinates(scan: CellScan): void {
  scan.take('coordinates', pair, (_, [one, other]) => {
    const [latitude, longitude] = [Math.abs(Number(one)), Math.abs(Number(other))];
    return latitude <= 90 && longitude <= 180 && Math.max(latitude, longitude) > 10 ? 'block' : 'not-it';
  });
  scan.take('coordinates', minutesAndSeconds);
}
