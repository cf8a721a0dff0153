/** Schemas of typed rows. Apart from the dictionary itself, so that who needs only its constants does not load a schema library. */
import { z } from 'zod';
import { tableOf } from './dictionary.ts';
import { fitsRange } from './fits-range.ts';
import { pseudonymPattern } from './pseudonym.ts';
import { rowProblems } from './row-problems.ts';
import type { Row, TableKey, Variable } from './types.ts';

function cellSchema(variable: Variable): z.ZodType<string | number> {
  const { type, hard, codes = [], missingCodes = [] } = variable;
  switch (type) {
    case 'pseudonym':
      return z.string().regex(pseudonymPattern);
    case 'code':
    case 'flag':
      return z.enum([...codes, ...missingCodes].map(({ code }) => code));
    case 'integer':
    case 'decimal': {
      const number = type === 'integer' ? z.int() : z.number();
      if (!hard) return number;
      const limited = number.min(hard.min).max(hard.max);
      return hard.step === undefined ? limited : limited.refine((value) => fitsRange(value, hard), 'off the steps of the scale');
    }
  }
}

const always = (variable: Variable): boolean => variable.required.when === 'always';

const isRow = (value: unknown): value is Row => typeof value === 'object' && value !== null;

function makeRowSchema(key: TableKey): z.ZodType<Row> {
  const table = tableOf(key);
  const cells = table.variables.map((variable) => {
    const schema = cellSchema(variable);
    return [variable.key, always(variable) ? schema : schema.optional()] as const;
  });
  const required = new Set(table.variables.filter(always).map((variable) => variable.key));
  return z.strictObject(Object.fromEntries(cells)).superRefine(
    (row, context) => {
      for (const { column, kind, message } of rowProblems(table, row)) {
        if (kind === 'missing' && required.has(column)) continue;
        context.addIssue({ code: 'custom', path: [column], message, params: { kind } });
      }
    },
    // Contradictions are told together with wrong cells, not only once every cell is right.
    { when: ({ value }) => isRow(value) },
  );
}

const schemas = new Map<TableKey, z.ZodType<Row>>();

/**
 * The schema of one typed row of a table: every cell, and what the cells of the row demand of each other.
 * Empty cells are absent; columns that the dictionary does not know are refused.
 */
export function rowSchema(table: TableKey): z.ZodType<Row> {
  const known = schemas.get(table);
  if (known) return known;
  const made = makeRowSchema(table);
  schemas.set(table, made);
  return made;
}
