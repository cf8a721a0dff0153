import type { Variable } from '@cairnstep/dictionary';

/** Whether the cells of a column are words or codes, even if those look like numbers or dates. */
export const isTextColumn = ({ type }: Variable): boolean => type === 'pseudonym' || type === 'code' || type === 'flag';
