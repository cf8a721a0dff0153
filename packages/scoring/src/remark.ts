import type { CellKey, Remark } from './exam.ts';

/** Whether a remark says something about a cell. */
export function hasRemark(remark: Remark | undefined, key: CellKey): boolean {
  const found = typeof remark === 'string' ? remark : remark?.[key];
  return found !== undefined && found.trim() !== '';
}
