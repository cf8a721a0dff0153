import type { ColumnMatch } from '@cairnstep/deidentification';
import { variableOf } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { useMemo } from 'react';
import { ComboBox } from '../ui/combo-box.tsx';
import { Select } from '../ui/select.tsx';
import { dateFormatWords, isDated, matchOf, meaningOf, meaningsFor, unitsFor } from './meanings.ts';
import type { ColumnPicture } from './worker/protocol.ts';

export interface ColumnEditorProps {
  readonly column: ColumnPicture;
  readonly table: TableKey;
  readonly onMatch: (match: ColumnMatch) => void;
}

/** What one column becomes: its meaning, and what that meaning needs to be read by. Each choice counts at once. */
export function ColumnEditor({ column: { header, match, dateFormats, unknownWords }, table, onMatch }: ColumnEditorProps) {
  const meanings = useMemo(() => meaningsFor(table), [table]);
  const units = unitsFor(table, match);
  const id = `${table}-editor`;
  return (
    <div className="grid gap-4 border-l-2 border-lichen pl-4">
      <ComboBox
        id={`${id}-meaning`}
        label={`What becomes of ${header}`}
        hint="Type a word of its name to narrow the list down."
        value={meaningOf(match)}
        options={meanings}
        autoFocus
        onChange={(meaning) => onMatch(matchOf(meaning, match))}
      />
      {isDated(match) && dateFormats.length > 0 && (
        <Select
          id={`${id}-format`}
          label="How its dates are written"
          value={match.dateFormat ?? null}
          placeholder={dateFormats.length === 1 && dateFormats[0] !== undefined ? dateFormatWords[dateFormats[0]] : 'Choose'}
          options={dateFormats.map((format) => ({ value: format, label: dateFormatWords[format] }))}
          onChange={(value) => {
            const dateFormat = dateFormats.find((each) => each === value);
            if (dateFormat !== undefined) onMatch({ ...match, dateFormat });
          }}
        />
      )}
      {match.as === 'value' && units.length > 1 && (
        <Select
          id={`${id}-unit`}
          label="Unit of its numbers"
          value={match.unit ?? units[0] ?? null}
          options={units.map((unit) => ({ value: unit, label: unit }))}
          onChange={(unit) => onMatch({ ...match, unit })}
        />
      )}
      {match.as === 'value' && <Words id={id} table={table} match={match} unknown={unknownWords} onMatch={onMatch} />}
    </div>
  );
}

interface WordsProps {
  readonly id: string;
  readonly table: TableKey;
  readonly match: Extract<ColumnMatch, { readonly as: 'value' }>;
  readonly unknown: readonly string[];
  readonly onMatch: (match: ColumnMatch) => void;
}

/** The clinic's own words: each leads to a code of the dictionary. A word that leads nowhere leaves its cell empty. */
function Words({ id, table, match, unknown, onMatch }: WordsProps) {
  const known = Object.entries(match.codes ?? {});
  const { codes = [] } = variableOf(table, match.variable);
  if (codes.length === 0 || (known.length === 0 && unknown.length === 0)) return null;
  const options = codes.map(({ code, label }) => ({ value: code, label: code === label ? code : `${label} (${code})` }));
  const rows: readonly (readonly [word: string, code: string | null])[] = [...known, ...unknown.map((word) => [word, null] as const)];
  return (
    <fieldset className="grid gap-3">
      <legend className="font-semibold">Words of your clinic</legend>
      <p className="text-small text-quiet">Cells with a word that leads to nothing are sent empty.</p>
      {rows.map(([word, code], at) => (
        <Select
          key={word}
          id={`${id}-word-${at}`}
          label={`“${word}” means`}
          placeholder="Nothing yet"
          value={code}
          options={options}
          onChange={(chosen) => onMatch({ ...match, codes: { ...match.codes, [word]: chosen } })}
        />
      ))}
    </fieldset>
  );
}
