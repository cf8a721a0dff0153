/** Addresses and names of files: mail, web, network, pictures and recordings. */
import { boundedPattern } from '../bounded-pattern.ts';
import type { ColumnTraits } from '../column-traits.ts';
import type { CellScan } from './cell-scan.ts';

const address = boundedPattern('(?:(?:https?|s?ftp|file)://|\\bwww\\.)\\S{1,300}', 'i');
const mail = boundedPattern("[\\p{L}\\p{N}._%+'-]{1,64} ?(?:@|[\\[(]at[\\])]) ?(?:[\\p{L}\\p{N}-]{1,63}\\.){1,4}\\p{L}{2,24}", 'i');
const bareDomain = boundedPattern(
  '(?<![@\\w.-])(?:[a-z0-9-]{1,63}\\.){1,4}(?:com|org|net|edu|gov|info|io|eu|uk|de|fr|nl|at|ch|it|es|se|no|dk|fi|ca|au|us|example)/\\S{1,200}',
  'i',
);
const picture = boundedPattern(
  '[\\p{L}\\p{N}_)-]\\.(?:jpe?g|png|gif|bmp|tiff?|heic|webp|mp4|m4v|mov|avi|mkv|wmv|webm|mpe?g|3gp|dcm|dicom|nii|wav|mp3|m4a|aac|ogg|flac|c3d)(?![\\p{L}\\p{N}])',
  'i',
);
const inlinePicture = boundedPattern('data:(?:image|video|audio)/', 'i');

const fourOctets = boundedPattern(
  '(?<![\\d.])(?:version|firmware|software|release|build|v|ver\\.) ?\\d{1,3}(?:\\.\\d{1,3}){3}|(?<![\\p{L}\\d.])\\d{1,3}(?:\\.\\d{1,3}){3}(?!\\.?\\d)',
  'i',
);
const colonGroups = boundedPattern('(?<![\\p{L}\\d:])[0-9a-f]{0,4}(?::[0-9a-f]{0,4}){2,8}(?![\\p{L}\\d:])', 'i');

function isFourthVersion(octets: string): boolean {
  return octets.split('.').every((octet) => Number(octet) <= 255 && (octet === '0' || !octet.startsWith('0')));
}

/** RFC 4291: eight groups, or fewer with one `::`. Without a letter or a long group it may be a time. */
function isSixthVersion(text: string): boolean {
  const groups = text.split(':');
  const filled = groups.filter((group) => group !== '');
  if (!filled.some((group) => /[a-f]/i.test(group) || group.length > 2)) return false;
  const gaps = text.split('::').length - 1;
  return gaps === 0 ? groups.length === 8 && filled.length === 8 : gaps === 1 && filled.length >= 2 && filled.length <= 7;
}

export function detectNetworkAddresses(scan: CellScan, { isVersion }: ColumnTraits): void {
  scan.take('url', address);
  scan.take('email', mail);
  scan.take('url', bareDomain, () => 'warn');
  scan.take('image_or_biometric', inlinePicture);
  scan.take('image_or_biometric', picture);
  if (!isVersion) scan.take('ip', fourOctets, (match) => (isFourthVersion(match) ? 'block' : 'not-it'));
  scan.take('ip', colonGroups, (match) => (isSixthVersion(match) ? 'block' : 'not-it'));
}
