/**
 * The registry's rows and their staging twins. Their columns come from the dictionary, one database column per variable,
 * so that a variable is written down once.
 */
import { createHash } from 'node:crypto';
import { dictionary, sqlCheck, sqlType, type Table, type Variable } from '@cairnstep/dictionary';
import { EntitySchema, type EntitySchemaColumnOptions, type EntitySchemaIndexOptions } from 'typeorm';

const requiredAlways = (variable: Variable): boolean => variable.required.when === 'always';

function columnsOf(table: Table, staged: boolean): Record<string, EntitySchemaColumnOptions> {
  const columns: Record<string, EntitySchemaColumnOptions> = {};
  if (staged) columns['submission_id'] = { type: 'uuid', primary: true };
  columns['site_id'] = staged ? { type: 'uuid' } : { type: 'uuid', primary: true };
  for (const variable of table.variables) {
    const isKey = table.rowKey.includes(variable.key);
    columns[variable.key] =
      isKey && !staged
        ? { type: sqlType(variable), primary: true }
        : { type: sqlType(variable), nullable: !isKey && (staged || !requiredAlways(variable)) };
  }
  // Rows arrive in the order of their lines, which fills this index at its end; that keys do not repeat is what the check has found.
  if (staged) columns['line'] = { type: 'integer', primary: true };
  else {
    columns['month'] = { type: 'text' };
    columns['submission_id'] = { type: 'uuid' };
  }
  if (table.key === 'exams') {
    columns['class_nli'] = { type: 'text', array: true };
    columns['class_ais'] = { type: 'text', array: true };
    columns['class_level_group'] = { type: 'text' };
    columns['class_uems'] = { type: 'integer', nullable: true };
    columns['class_lems'] = { type: 'integer', nullable: true };
  }
  return columns;
}

/** Codes and hard limits of the dictionary. The name carries a digest of the condition, so that a change of the dictionary asks for a migration. */
function valuesCheck(table: Table): { name: string; expression: string } {
  const expression = sqlCheck(table.key);
  return { name: `${table.key}_values_${createHash('sha256').update(expression).digest('hex').slice(0, 8)}`, expression };
}

/**
 * The bouts of a month come all at once and lie together, so blocks can be told apart by the months in them at next to no cost: their index is a
 * BRIN, which the migration makes and a schema of this form cannot name.
 */
const monthIndex = ({ key }: Table): EntitySchemaIndexOptions => ({
  name: `${key}_month_idx`,
  columns: ['site_id', 'month'],
  ...(key === 'bouts' ? { synchronize: false } : {}),
});

const schemaOf = (table: Table, staged: boolean) =>
  new EntitySchema({
    name: `${staged ? 'staged_' : ''}${table.key}`,
    tableName: `${staged ? 'staged_' : ''}${table.key}`,
    columns: columnsOf(table, staged),
    checks: staged ? [] : [valuesCheck(table)],
    indices: staged ? [] : [monthIndex(table)],
  });

/** Computed from an exam's cells when it is checked; stored beside them. `class_nli` and `class_ais` list every possible value. */
export const classColumns = ['class_nli', 'class_ais', 'class_level_group', 'class_uems', 'class_lems'] as const;

export const registrySchemas = dictionary.tables.map((table) => schemaOf(table, false));
export const stagedSchemas = dictionary.tables.map((table) => schemaOf(table, true));
