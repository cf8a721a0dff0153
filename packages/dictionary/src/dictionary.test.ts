import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { dictionary, tableOf, variableOf } from './dictionary.ts';
import { history } from './history.ts';
import { findMeasure, measures } from './measures.ts';
import { dermatomes, keyMuscles, segmentKey } from './neurological-levels.ts';
import { tableKeys } from './types.ts';
import type { Condition, Table, Variable } from './types.ts';

const variables = dictionary.tables.flatMap((table) => table.variables);
const label = (variable: Variable): string => `${variable.table}.${variable.key}`;
const labels = (chosen: readonly Variable[]): string[] => chosen.map(label);
const codesOf = (variable: Variable): string[] => [...(variable.codes ?? []), ...(variable.missingCodes ?? [])].map(({ code }) => code);

/** As a header is compared: case, spaces, underscores, hyphens and full stops do not count. */
const folded = (header: string): string => header.toLowerCase().replace(/[\s_.-]+/g, '');

function conditionsOf({ required, emptyUnless }: Variable): Condition[] {
  const demanded = required.when === 'if' ? [required, ...(required.and ? [required.and] : [])] : [];
  return [...demanded, ...(emptyUnless ? [emptyUnless] : [])];
}

const repeated = (texts: readonly string[]): string[] => texts.filter((text, index) => texts.indexOf(text) !== index);

describe('dictionary', () => {
  it('has the seven tables in their order, in a version that the history knows last', () => {
    expect(dictionary.tables.map((table) => table.key)).toEqual(tableKeys);
    expect(dictionary.version).toBe(history.at(-1)?.version);
  });

  it('gives every variable a name, a definition in whole sentences, a source and a known first version', () => {
    const versions = history.map((revision) => revision.version);
    const poor = variables.filter(
      ({ name, definition, source, since }) =>
        name.length < 3 || !/^[A-Z].{8,}\.$/s.test(definition) || source.length < 3 || !versions.includes(since),
    );
    expect(labels(poor)).toEqual([]);
  });

  it('writes every key in lower case, once in its table', () => {
    expect(labels(variables.filter(({ key }) => !/^[a-z][a-z0-9_]{1,40}$/.test(key)))).toEqual([]);
    expect(repeated(labels(variables))).toEqual([]);
  });

  it.each(dictionary.tables)('gives no two columns of $key the same header, however it is written', (table: Table) => {
    const headers = table.variables.flatMap(({ key, name, aliases = [] }) => [...new Set([key, name, ...aliases].map(folded))]);
    expect(repeated(headers)).toEqual([]);
  });

  it('gives codes just where the type asks for them, each once in any case, safe for a spreadsheet', () => {
    const wrong = variables.filter((variable) => {
      const codes = codesOf(variable);
      const needed = variable.type === 'code' || variable.type === 'flag';
      return (
        needed !== codes.length > 0 ||
        repeated(codes.map((code) => code.toLowerCase())).length > 0 ||
        codes.some((code) => !/^[A-Za-z0-9]/.test(code))
      );
    });
    expect(labels(wrong)).toEqual([]);
    expect(labels(variables.filter(({ type, missingCodes }) => missingCodes !== undefined && type !== 'code'))).toEqual([]);
  });

  it('gives every number hard limits, and plausible ones within them', () => {
    const wrong = variables.filter(({ type, hard, plausible }) => {
      const isNumber = type === 'integer' || type === 'decimal';
      if (!isNumber) return hard !== undefined || plausible !== undefined;
      return (
        !hard ||
        !plausible ||
        hard.min >= hard.max ||
        plausible.min >= plausible.max ||
        plausible.min < hard.min ||
        plausible.max > hard.max
      );
    });
    expect(labels(wrong)).toEqual([]);
  });

  it('says for every decimal how many digits are shown, except where the measure says it', () => {
    const silent = variables.filter(({ type, decimals }) => type === 'decimal' && decimals === undefined);
    expect(labels(silent)).toEqual(['assessments.value']);
    expect(labels(variables.filter(({ type, decimals }) => type !== 'decimal' && decimals !== undefined))).toEqual([]);
  });

  it('names in every condition a column of the same table and codes of that column', () => {
    const wrong = variables.filter((variable) =>
      conditionsOf(variable).some(({ column, isOneOf }) => {
        const codes = codesOf(variableOf(variable.table, column));
        return column === variable.key || isOneOf.length === 0 || isOneOf.some((code) => !codes.includes(code));
      }),
    );
    expect(labels(wrong)).toEqual([]);
  });

  it('never demands a cell that must be empty', () => {
    const wrong = variables.filter((variable) => {
      const { required, emptyUnless } = variable;
      if (emptyUnless === undefined) return false;
      if (required.when === 'with') {
        return JSON.stringify(variableOf(variable.table, required.column).emptyUnless) !== JSON.stringify(emptyUnless);
      }
      if (required.when !== 'if') return required.when === 'always';
      const demanded = [required, ...(required.and ? [required.and] : [])];
      return !demanded.some(
        ({ column, isOneOf }) => column === emptyUnless.column && isOneOf.every((code) => emptyUnless.isOneOf.includes(code)),
      );
    });
    expect(labels(wrong)).toEqual([]);
  });

  it.each(dictionary.tables)('identifies a row of $key by columns that are always filled', (table: Table) => {
    expect(table.rowKey[0]).toBe('participant');
    for (const key of [...table.rowKey, ...(table.studyDay ? [table.studyDay] : [])]) {
      expect(variableOf(table.key, key).required).toEqual({ when: 'always' });
    }
  });

  it('marks participant codes, and only them, as identifiers, and every day and hour as time', () => {
    expect(labels(variables.filter(({ type, exposure }) => (type === 'pseudonym') !== (exposure === 'identifier')))).toEqual([]);
    expect(labels(variables.filter(({ key, exposure }) => /_day$|_hour$|^days_/.test(key) !== (exposure === 'time')))).toEqual([]);
  });

  it('has no column for a calendar date, a name, a remark, or the maker or model of a device', () => {
    const forbidden = /(^|_)(date|month|name|initials|remark|comment|note|notes|maker|model|manufacturer|brand|vendor|serial)(_|$)/;
    expect(labels(variables.filter(({ key, aliases = [] }) => [key, ...aliases].some((header) => forbidden.test(header))))).toEqual([]);
    expect(labels(variables.filter((variable) => /[®™©]/.test(JSON.stringify(variable))))).toEqual([]);
  });

  it('has no column for what is derived from other columns', () => {
    expect(labels(variables.filter(({ key }) => ['walking_min', 'mean_speed_mps', 'mean_speed'].includes(key)))).toEqual([]);
  });

  it('states units that convert with whole positive numbers and a source', () => {
    const units = [...variables, ...measures].flatMap(({ unit, acceptedUnits = [] }) =>
      acceptedUnits.map((accepted) => ({ stored: unit, ...accepted })),
    );
    expect(units.length).toBeGreaterThan(10);
    for (const { stored, unit, times, dividedBy, source } of units) {
      expect(unit).not.toBe(stored);
      expect([times, dividedBy].every((factor) => Number.isSafeInteger(factor) && factor > 0)).toBe(true);
      expect(source).toMatch(/NIST SP 811|SI Brochure/);
    }
  });

  it('offers just the measures as codes of an assessment, within limits that hold them all', () => {
    expect(codesOf(variableOf('assessments', 'measure'))).toEqual(measures.map((measure) => measure.key));
    const { hard, plausible } = variableOf('assessments', 'value');
    expect(hard).toEqual({ min: Math.min(...measures.map((m) => m.hard.min)), max: Math.max(...measures.map((m) => m.hard.max)) });
    expect(plausible).toEqual({
      min: Math.min(...measures.map((m) => m.plausible.min)),
      max: Math.max(...measures.map((m) => m.plausible.max)),
    });
  });

  it('finds a measure for every code that names one', () => {
    const measured = variables.flatMap((variable) => (variable.measuredBy ? [{ variable, ...variable.measuredBy }] : []));
    expect(measured.map(({ variable }) => label(variable))).toEqual([
      'assessments.value',
      'assessments.rpe_end',
      'sessions.rpe',
      'bouts.rpe_end',
    ]);
    for (const { variable, column, prefix } of measured) {
      for (const code of codesOf(variableOf(variable.table, column))) expect(findMeasure(`${prefix}${code}`)).toBeDefined();
    }
  });

  it('has the 132 scored cells of the neurological exam, and with the two yes-or-no answers its 134 items', () => {
    const cells = tableOf('exams').variables.filter(({ key }) => /^(lt|pp|m)_[rl]_/.test(key));
    expect(dermatomes.map(segmentKey).join(' ')).toBe(
      'c2 c3 c4 c5 c6 c7 c8 t1 t2 t3 t4 t5 t6 t7 t8 t9 t10 t11 t12 l1 l2 l3 l4 l5 s1 s2 s3 s4_5',
    );
    expect(cells).toHaveLength(2 * 2 * 28 + 2 * keyMuscles.length);
    expect(codesOf(variableOf('exams', 'pp_l_s4_5'))).toEqual(['0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**']);
    expect(codesOf(variableOf('exams', 'm_r_c5')).join(' ')).toBe('0 1 2 3 4 5 0* 1* 2* 3* 4* 0** 1** 2** 3** 4** NT NT* NT**');
    expect(codesOf(variableOf('exams', 'vac'))).toEqual(['yes', 'no', 'NT']);
  });

  it('refuses to look up a column that does not exist', () => {
    expect(variableOf('bouts', 'steps').unit).toBe('steps');
    expect(() => variableOf('bouts', 'unheard_of')).toThrow(RangeError);
  });

  it('reaches no schema library from its main entrance', () => {
    const seen = new Set<string>();
    const outside: string[] = [];
    const follow = (file: URL): void => {
      if (seen.has(file.href)) return;
      seen.add(file.href);
      for (const [, target = ''] of readFileSync(file, 'utf8').matchAll(/from '([^']+)'/g)) {
        if (target.startsWith('.')) follow(new URL(target, file));
        else outside.push(target);
      }
    };
    follow(new URL('index.ts', import.meta.url));
    expect(seen.size).toBeGreaterThan(20);
    expect(outside).toEqual([]);
  });
});
