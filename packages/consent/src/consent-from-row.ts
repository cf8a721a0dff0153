/** Reads a consent from a row of the data dictionary's table `consents`: one column per term, values beside it, ends in study days. */
import type { Row } from '@cairnstep/dictionary';
import { countriesOf } from './areas.ts';
import type { ConsentModifier, ConsentRecord, ConsentStatus, LastDay, WithdrawalScope } from './consent-record.ts';
import { addDays } from './iso-date.ts';
import type { LocalFlag, ModifierCode } from './terms.ts';

/** What the row does not hold. */
export interface RowContext {
  /** Country of the participant's clinic, ISO 3166-1 two-letter code. */
  readonly siteCountry?: string;
  /** Limits within which the participant's study day 0 lies, as far as the registry can tell. */
  readonly dayZero?: LastDay;
}

/** Column of each modifier and local flag. */
export const modifierColumns: Readonly<Record<ModifierCode | LocalFlag, string>> = {
  RS: 'duo_rs',
  NMDS: 'duo_nmds',
  GSO: 'duo_gso',
  NPUNCU: 'duo_npuncu',
  PUB: 'duo_pub',
  COL: 'duo_col',
  IRB: 'duo_irb',
  GS: 'duo_gs',
  MOR: 'duo_mor',
  TS: 'duo_ts',
  US: 'duo_us',
  PS: 'duo_ps',
  IS: 'duo_is',
  RTN: 'duo_rtn',
  CC: 'duo_cc',
  NPOA: 'duo_npoa',
  NPU: 'duo_npu',
  NCU: 'duo_ncu',
  NCTRL: 'no_controls',
  NAGR: 'no_aggregates',
};

const statuses: readonly ConsentStatus[] = ['active', 'withdrawn', 'superseded', 'expired'];
const scopes: readonly WithdrawalScope[] = ['no_new_data', 'no_further_use', 'delete'];

/**
 * A value that the form does not state is left out, so that the matching sends the consent to a person. A flag that is neither yes nor
 * no stops the reading: taking it for no would widen the consent.
 *
 * @throws RangeError when the status, the permission or a flag is missing or no code of the dictionary
 */
export function consentFromRow(row: Row, context: RowContext = {}): ConsentRecord {
  const permission = text(row, 'permission');
  if (permission === undefined) throw new RangeError('The consent has no permission.');
  const condition = stated(row, 'condition');
  const lastDay = lastDayOf(row, context);
  const withdrawalScope = scopes.find((scope) => scope === row.withdrawal_scope);
  return {
    status: statusOf(row),
    ...(withdrawalScope === undefined ? {} : { withdrawalScope }),
    permissions: [condition === undefined ? { code: permission } : { code: permission, conditions: [condition] }],
    modifiers: (Object.keys(modifierColumns) as (keyof typeof modifierColumns)[])
      .filter((code) => isSet(row, modifierColumns[code]))
      .map((code) => ({ code, ...valueOf(code, row, context) })),
    ...(lastDay === undefined ? {} : { lastDay }),
  };
}

function statusOf(row: Row): ConsentStatus {
  const status = statuses.find((known) => known === row.status);
  if (status === undefined) throw new RangeError('The status of the consent is no code of the dictionary.');
  return status;
}

function isSet(row: Row, column: string): boolean {
  const flag = row[column];
  if (flag !== 'yes' && flag !== 'no') throw new RangeError(`The consent says neither yes nor no in ${column}.`);
  return flag === 'yes';
}

function valueOf(code: ModifierCode | LocalFlag, row: Row, { siteCountry }: RowContext): Omit<ConsentModifier, 'code'> {
  if (code === 'RS') {
    const value = stated(row, 'duo_rs_kind');
    return value === undefined ? {} : { researchType: { value, coded: true } };
  }
  if (code === 'GS') {
    const area = stated(row, 'duo_gs_area');
    return area === undefined ? {} : { countries: countriesOf(area, siteCountry) };
  }
  if (code === 'TS') return months(row, 'duo_ts_months');
  if (code === 'MOR') return months(row, 'duo_mor_months');
  return {};
}

function months(row: Row, column: string): { months?: number } {
  const value = row[column];
  return typeof value === 'number' ? { months: value } : {};
}

function lastDayOf(row: Row, { dayZero }: RowContext): LastDay | 'unknown' | undefined {
  const day = row.valid_until_day;
  if (day === undefined) return undefined;
  if (typeof day !== 'number' || dayZero === undefined) return 'unknown';
  return { earliest: addDays(dayZero.earliest, day), latest: addDays(dayZero.latest, day) };
}

function text(row: Row, column: string): string | undefined {
  const value = row[column];
  return typeof value === 'string' && value !== '' ? value : undefined;
}

function stated(row: Row, column: string): string | undefined {
  const value = text(row, column);
  return value === 'not_stated' ? undefined : value;
}
