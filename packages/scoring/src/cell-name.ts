import type { Modality, Side } from './segments.ts';

const modalityNames: Readonly<Record<Modality, string>> = { lightTouch: 'light touch', pinPrick: 'pin prick', motor: 'key muscle' };

/** A row of cells in words, such as "right pin prick". */
export function rowName(side: Side, modality: Modality): string {
  return `${side} ${modalityNames[modality]}`;
}

/** A cell in words, such as "right pin prick S4-5". */
export function cellName(side: Side, modality: Modality, segment: string): string {
  return `${rowName(side, modality)} ${segment.replace('_', '-')}`;
}
