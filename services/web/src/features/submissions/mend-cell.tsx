/** The place of one finding, mended where it stands: what is expected, and a field or a list for it. */
import { useEffect, useRef, useState } from 'react';
import type { KeyboardEvent } from 'react';
import { Button } from '../../ui/button.tsx';
import { Select } from '../../ui/select.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { cellProblem, codesOf, expectedWords, variableAt } from './expected-cell.ts';
import type { CellPlace, MendDrafts } from './mend-drafts.ts';
import { tableName } from './table-names.ts';

export interface MendCellProps {
  readonly place: CellPlace;
  /** It was found empty where its row needs it. */
  readonly mustBeFilled: boolean;
  readonly drafts: MendDrafts;
}

export function MendCell({ place, mustBeFilled, drafts }: MendCellProps) {
  const draft = drafts.valueAt(place);
  const [isOpen, setOpen] = useState(false);
  const words = `${place.column} in line ${place.line} of ${tableName(place.table).toLowerCase()}`;
  if (!isOpen && draft === undefined) {
    return (
      <span data-mend-cell>
        <Button variant="quiet" onPress={() => setOpen(true)} aria-label={`Mend ${words}`}>
          Mend
        </Button>
      </span>
    );
  }
  const leave = () => {
    drafts.drop(place);
    setOpen(false);
  };
  return (
    // Keys go up from the field: Enter goes on to the next place, Escape takes the typed value back.
    <div data-mend-cell className="grid w-72 gap-1 px-1 py-2" onKeyDown={(event) => goOn(event, leave)}>
      <Field place={place} mustBeFilled={mustBeFilled} drafts={drafts} value={draft} takesFocus={isOpen} />
      <div>
        <Button variant="quiet" onPress={leave} aria-label={`Leave ${words} as it is`}>
          Leave as it is
        </Button>
      </div>
    </div>
  );
}

interface FieldProps extends MendCellProps {
  readonly value: string | undefined;
  readonly takesFocus: boolean;
}

function Field({ place, mustBeFilled, drafts, value, takesFocus }: FieldProps) {
  const input = useRef<HTMLInputElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  useEffect(() => {
    if (takesFocus) (input.current ?? button.current)?.focus();
  }, [takesFocus]);
  const { table, line, column } = place;
  const variable = variableAt(table, column);
  if (variable === undefined) return null;
  const codes = codesOf(variable, mustBeFilled);
  const shared = {
    id: `mend-${table}-${line}-${column}`,
    label: `New value of ${column}, line ${line}`,
    hint: `${expectedWords(variable, mustBeFilled)} ${mustBeFilled ? 'It is empty now, and its row needs it.' : 'What it holds now stands only in the file: look there.'}`,
    onChange: (written: string) => drafts.write(place, written),
  };
  if (codes !== null) return <Select {...shared} ref={button} value={value ?? null} options={codes} placeholder="Choose a code" />;
  const problem = value === undefined ? null : cellProblem(table, column, value);
  return (
    <TextField
      {...shared}
      ref={input}
      value={value ?? ''}
      maxLength={200}
      autoComplete="off"
      spellCheck="false"
      inputMode={variable.type === 'integer' ? 'numeric' : variable.type === 'decimal' ? 'decimal' : 'text'}
      error={problem ?? undefined}
    />
  );
}

function goOn(event: KeyboardEvent<HTMLElement>, leave: () => void): void {
  if (event.key === 'Escape') return leave();
  if (event.key !== 'Enter' || !(event.target instanceof HTMLInputElement)) return;
  event.preventDefault();
  const places = [...document.querySelectorAll<HTMLElement>('[data-mend-cell]')];
  const next = places[places.indexOf(event.currentTarget) + 1];
  (next?.querySelector<HTMLElement>('input, button') ?? document.getElementById(applyMendsId))?.focus();
}

/** The button that sends what was typed. */
export const applyMendsId = 'apply-mends';
