import { exampleRow, tableOf } from '@cairnstep/dictionary';
import type { Row } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { usualUse } from '../reference/matching-cases.ts';
import { modifierColumns } from './consent-from-row.ts';
import { conditionTree, consentFromRow, countriesOf, decideUse, termCodeOf } from './index.ts';

const flags = Object.fromEntries(Object.values(modifierColumns).map((column) => [column, 'no']));
const row: Row = { participant: 'x', consent_no: 1, status: 'active', signed_day: -3, form_version: 2, permission: 'GRU', ...flags };

describe('consentFromRow', () => {
  it('reads a plain consent', () => {
    expect(consentFromRow(row)).toEqual({ status: 'active', permissions: [{ code: 'GRU' }], modifiers: [] });
  });

  it('reads the values beside the terms', () => {
    const full: Row = {
      ...row,
      permission: 'DS',
      condition: 'traumatic_sci',
      duo_rs: 'yes',
      duo_rs_kind: 'walking_recovery',
      duo_gs: 'yes',
      duo_gs_area: 'own_country',
      duo_ts: 'yes',
      duo_ts_months: 24,
      duo_mor: 'yes',
      duo_mor_months: 6,
      no_controls: 'yes',
    };
    expect(consentFromRow(full, { siteCountry: 'SE' })).toEqual({
      status: 'active',
      permissions: [{ code: 'DS', conditions: ['traumatic_sci'] }],
      modifiers: [
        { code: 'RS', researchType: { value: 'walking_recovery', coded: true } },
        { code: 'GS', countries: ['SE'] },
        { code: 'MOR', months: 6 },
        { code: 'TS', months: 24 },
        { code: 'NCTRL' },
      ],
    });
  });

  it('leaves out what the form does not state, so that a person decides', () => {
    const vague: Row = { ...row, permission: 'DS', condition: 'not_stated', duo_gs: 'yes', duo_gs_area: 'not_stated', duo_us: 'yes' };
    const use = { ...usualUse, purpose: 'condition_research', conditions: ['thoracic_sci'] } as const;
    expect(decideUse(consentFromRow(vague), use).reasons).toEqual(['approved_list_missing', 'area_value_missing', 'ds_without_condition']);
    const ownCountry: Row = { ...row, duo_gs: 'yes', duo_gs_area: 'own_country' };
    expect(decideUse(consentFromRow(ownCountry), use).reasons).toEqual(['area_value_missing']);
    expect(decideUse(consentFromRow(ownCountry, { siteCountry: 'DE' }), use).verdict).toBe('permitted');
  });

  it('places the end of a consent between the days the registry can tell', () => {
    const ending: Row = { ...row, valid_until_day: 365 };
    expect(consentFromRow(ending).lastDay).toBe('unknown');
    expect(consentFromRow(ending, { dayZero: { earliest: '2025-03-01', latest: '2025-03-28' } }).lastDay).toEqual({
      earliest: '2026-03-01',
      latest: '2026-03-28',
    });
  });

  it('reads a withdrawal with its reach', () => {
    expect(consentFromRow({ ...row, status: 'withdrawn', withdrawal_scope: 'no_new_data' })).toMatchObject({
      status: 'withdrawn',
      withdrawalScope: 'no_new_data',
    });
  });

  it('stops rather than widen a consent it cannot read', () => {
    expect(() => consentFromRow({ ...row, duo_npu: undefined })).toThrow(RangeError);
    expect(() => consentFromRow({ ...row, duo_npu: 'perhaps' })).toThrow(RangeError);
    expect(() => consentFromRow({ ...row, status: 'paused' })).toThrow(RangeError);
    expect(() => consentFromRow({ ...row, permission: undefined })).toThrow(RangeError);
  });

  it('knows every column and code of the dictionary', () => {
    const table = tableOf('consents');
    const codesOf = (key: string) => table.variables.find((variable) => variable.key === key)?.codes?.map(({ code }) => code) ?? [];
    const termColumns = table.variables.filter(({ key, type }) => type === 'flag' && key !== 'participant').map(({ key }) => key);
    expect([...termColumns].sort()).toEqual(Object.values(modifierColumns).sort());
    expect(codesOf('permission').map(termCodeOf)).not.toContain(undefined);
    expect(codesOf('condition').every((code) => Object.hasOwn(conditionTree, code))).toBe(true);
    for (const area of codesOf('duo_gs_area')) expect(countriesOf(area, 'SE')).not.toEqual([]);
    for (const status of codesOf('status')) expect(consentFromRow({ ...row, status }).status).toBe(status);
    for (const scope of codesOf('withdrawal_scope')) {
      expect(consentFromRow({ ...row, status: 'withdrawn', withdrawal_scope: scope }).withdrawalScope).toBe(scope);
    }
    expect(() => consentFromRow(exampleRow('consents'))).not.toThrow();
  });
});
