/** Limits and requirements of a variable in words, the same on screens, in the template and in the codebook. */
import type { AcceptedUnit, Condition, Range, Variable } from './types.ts';

/** `0.05 to 2.5 m/s`, `6 or 10 m`, `0 to 10 points in steps of 0.5`. */
export function describeRange({ min, max, step }: Range, unit?: string): string {
  const suffix = unit === undefined ? '' : ` ${unit}`;
  if (step !== undefined && min + step === max) return `${min} or ${max}${suffix}`;
  const steps = step === undefined || step === 1 ? '' : ` in steps of ${step}`;
  return `${min} to ${max}${suffix}${steps}`;
}

/** Digits in threes, divided by narrow spaces. */
const grouped = (whole: number): string => String(whole).replace(/\B(?=(\d{3})+$)/g, '\u202F');

/** How a written value becomes the stored one, exactly: `value in km/h × 5 ÷ 18 = value in m/s`. */
export function describeConversion({ unit, times, dividedBy }: AcceptedUnit, stored: string): string {
  const factors = `${times === 1 ? '' : ` × ${grouped(times)}`}${dividedBy === 1 ? '' : ` ÷ ${grouped(dividedBy)}`}`;
  return `value in ${unit}${factors} = value in ${stored}`;
}

function describeCondition({ column, isOneOf }: Condition): string {
  const last = isOneOf.at(-1) ?? '';
  return isOneOf.length === 1 ? `${column} is ${last}` : `${column} is ${isOneOf.slice(0, -1).join(', ')} or ${last}`;
}

/** When the cell must be filled and when it must be empty: `always`, `no`, `when permission is DS; else empty`. */
export function describeRequirement({ required, emptyUnless }: Variable): string {
  switch (required.when) {
    case 'always':
      return 'always';
    case 'optional':
      return emptyUnless ? `no; empty unless ${describeCondition(emptyUnless)}` : 'no';
    case 'with':
      return `when ${required.column} is filled${emptyUnless ? `; empty unless ${describeCondition(emptyUnless)}` : ''}`;
    case 'if': {
      const first = describeCondition(required);
      const condition = required.and ? `${first} and ${describeCondition(required.and)}` : first;
      if (!emptyUnless) return `when ${condition}`;
      const other = describeCondition(emptyUnless);
      return other === condition ? `when ${condition}; else empty` : `when ${condition}; empty unless ${other}`;
    }
  }
}
