/** Numbers of devices, and record numbers behind a hash. */
import { boundedPattern } from '../bounded-pattern.ts';
import type { CellScan } from './cell-scan.ts';

const hash = boundedPattern('(?<![\\p{L}\\p{N}])(?:[0-9a-f]{64}|[0-9a-f]{40}|[0-9a-f]{32})(?![\\p{L}\\p{N}])', 'i');
const hardwareAddress = boundedPattern(
  '(?<![\\p{L}\\p{N}:-])(?:[0-9a-f]{2}([:-])(?:[0-9a-f]{2}\\1){4}[0-9a-f]{2}|[0-9a-f]{4}\\.[0-9a-f]{4}\\.[0-9a-f]{4})(?![\\p{L}\\p{N}:-])',
  'i',
);
/** Unique device identifier: GS1 application identifier 01, the item number, and the rest of the label. */
const deviceLabel = boundedPattern('\\(01\\) ?\\d{14}(?:\\(\\d{2,4}\\)[\\w/-]{1,30}){0,6}');
const serialNumber = boundedPattern(
  '(?<![\\p{L}\\p{N}])(?:S/N|SN ?[:#]|serial ?(?:no\\.?|number|nr\\.?|#))[ .:#]{0,4}(?=[\\p{L}\\-/]{0,12}\\d)[\\p{L}\\p{N}/-]{3,40}',
  'i',
);

const hasLetter = (text: string): boolean => /[a-f]/i.test(text);

export function detectDevicesAndHashes(scan: CellScan): void {
  scan.take('unkeyed_hash', hash, (match) => (hasLetter(match) && /\d/.test(match) ? 'warn' : 'not-it'));
  scan.take('device_serial', deviceLabel);
  scan.take('device_serial', hardwareAddress, (match) => (hasLetter(match) ? 'block' : 'not-it'));
  scan.take('device_serial', serialNumber);
}
