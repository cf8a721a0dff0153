/** Which tables are asked for, and why each is needed. */
import type { RequestForm } from '@cairnstep/contract';
import type { PlacedProblem } from '../../lib/field-problems.ts';
import { Checkbox } from '../../ui/checkbox.tsx';
import { TextArea } from '../../ui/text-field.tsx';
import { justificationId } from './draft-fields.ts';
import { tables } from './request-words.ts';

type Chosen = RequestForm['tables'];

export interface TableChoiceProps {
  readonly value: Chosen;
  readonly problems: readonly PlacedProblem[];
  /** `fieldId`: the field that was changed. */
  readonly onChange: (value: Chosen, fieldId: string) => void;
  readonly onBlur: () => void;
}

export function TableChoice({ value, problems, onChange, onBlur }: TableChoiceProps) {
  const errorOf = (id: string) => problems.find(({ fieldId }) => fieldId === id)?.message;
  const error = errorOf('tables');
  return (
    <div id="tables" role="group" aria-labelledby="tables-label" className="grid max-w-xl gap-2">
      <h3 id="tables-label" className="font-semibold">
        Tables <span className="font-normal text-quiet">(required)</span>
      </h3>
      {error !== undefined && <p className="border-l-4 border-oxide pl-2 font-semibold text-oxide">{error}</p>}
      {tables.map(({ value: table, label, holds }) => {
        const chosen = value.find((one) => one.table === table);
        const id = justificationId(table);
        return (
          <div key={table}>
            <Checkbox
              id={`table-${table}`}
              value={chosen !== undefined}
              onChange={(isAsked) =>
                onChange(
                  isAsked
                    ? tables.flatMap(
                        (one) =>
                          value.find((kept) => kept.table === one.value) ?? (one.value === table ? [{ table, justification: '' }] : []),
                      )
                    : value.filter((one) => one.table !== table),
                  'tables',
                )
              }
              onBlur={onBlur}
            >
              {label}
              <span className="block text-small text-quiet">{holds}</span>
            </Checkbox>
            {chosen !== undefined && (
              <div className="mb-3 border-l-2 border-hairline pl-4">
                <TextArea
                  id={id}
                  label={`Why ${label.toLowerCase()} are needed`}
                  isRequired
                  rows={2}
                  maxLength={500}
                  value={chosen.justification}
                  error={errorOf(id)}
                  onChange={(justification) =>
                    onChange(
                      value.map((one) => (one.table === table ? { table, justification } : one)),
                      id,
                    )
                  }
                  onBlur={onBlur}
                />
              </div>
            )}
          </div>
        );
      })}
    </div>
  );
}
