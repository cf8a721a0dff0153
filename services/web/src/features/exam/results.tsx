/** Levels, grade, zones and totals as they stand. Choosing one shows why it came out and marks the cells that decided. */
import { affectedByOtherConditions, levelGroups, resultNames, sides } from '@cairnstep/scoring';
import type { Classification, ResultName, Side, Totals } from '@cairnstep/scoring';
import { segmentNamed } from '../../lib/level-range.ts';
import { SmallLevelColumn } from '../../ui/level-column.tsx';
import type { Reading } from './reading.ts';
import { nameOfResult, shownResult, totalInWords } from './result-words.ts';

export interface ResultsProps {
  readonly reading: Reading;
  readonly chosen: ResultName | null;
  readonly choose: (name: ResultName | null) => void;
}

const headlines = resultNames.filter(({ side }) => side === undefined);
const rows = ['sensoryLevel', 'motorLevel', 'zppSensory', 'zppMotor'] as const;
const rowWords = { sensoryLevel: 'Sensory level', motorLevel: 'Motor level', zppSensory: 'Sensory zone', zppMotor: 'Motor zone' };

export function Results({ reading, chosen, choose }: ResultsProps) {
  const { classification } = reading;
  const level = classification.nli.values.length === 1 ? segmentNamed(classification.nli.values[0]) : null;
  return (
    <div className="grid gap-4 print:gap-2">
      <div className="flex items-start justify-between gap-4">
        <dl className="grid gap-2 print:gap-0">
          {headlines.map((name) => (
            <div key={name.result}>
              <dt className="text-small text-quiet">{nameOfResult(name)}</dt>
              <dd>
                <ResultButton name={name} reading={reading} chosen={chosen} choose={choose} isLarge />
              </dd>
            </div>
          ))}
        </dl>
        {level !== null && <SmallLevelColumn range={{ from: level, to: level }} label="" />}
      </div>
      <table className="w-full border-collapse">
        <caption className="sr-only">Levels and zones of partial preservation by side</caption>
        <thead className="text-small text-quiet">
          <tr className="border-b border-edge">
            <td />
            {sides.map((side) => (
              <th key={side} scope="col" className="py-1 text-left font-normal">
                {sideWords[side]}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((result) => (
            <tr key={result} className="border-b border-hairline">
              <th scope="row" className="py-1 pr-4 text-left font-normal print:py-0.5">
                {rowWords[result]}
              </th>
              {sides.map((side) => (
                <td key={side} className="py-1 pr-2">
                  <ResultButton name={{ result, side }} reading={reading} chosen={chosen} choose={choose} />
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      <TotalsTable totals={classification.totals} isFull={reading.blank.length === 0} />
      <Groups classification={classification} />
    </div>
  );
}

const sideWords: Readonly<Record<Side, string>> = { right: 'Right', left: 'Left' };

function ResultButton({
  name,
  reading,
  chosen,
  choose,
  isLarge = false,
}: ResultsProps & { readonly name: ResultName; readonly isLarge?: boolean }) {
  const { words, state, starred } = shownResult(reading.classification, name, reading.blank.length === 0);
  const isChosen = chosen !== null && chosen.result === name.result && chosen.side === name.side;
  return (
    <button
      type="button"
      aria-pressed={isChosen}
      onClick={() => choose(isChosen ? null : name)}
      className={`-ml-3 min-h-7 rounded-sm border-l-4 pr-2 pl-2 text-left numbers hover:underline print:min-h-0 ${
        isChosen ? 'border-lichen bg-chosen' : 'border-transparent'
      } ${state === 'settled' ? 'font-semibold' : 'text-quiet'} ${isLarge && state === 'settled' ? 'text-section' : ''}`}
    >
      <span className="sr-only">{nameOfResult(name)}: </span>
      {state === 'open' && 'open: '}
      {state === 'not-determinable' && 'ND: '}
      {words}
      {starred && (
        <>
          <span aria-hidden="true">*</span>
          <span className="sr-only">, changed by starred cells</span>
        </>
      )}
    </button>
  );
}

/** The highest possible sums: 5 points for each of 5 key muscles, 2 for each of 28 dermatomes, a side. */
const totalRows: readonly { readonly name: string; readonly keys: readonly (keyof Totals)[]; readonly most: number }[] = [
  { name: 'Strength, arms', keys: ['uer', 'uel', 'uems'], most: 25 },
  { name: 'Strength, legs', keys: ['ler', 'lel', 'lems'], most: 25 },
  { name: 'Light touch', keys: ['ltr', 'ltl', 'lt'], most: 56 },
  { name: 'Pin prick', keys: ['ppr', 'ppl', 'pp'], most: 56 },
];

function TotalsTable({ totals, isFull }: { readonly totals: Totals; readonly isFull: boolean }) {
  return (
    <table className="w-full border-collapse">
      <caption className="sr-only">Totals in points</caption>
      <thead className="text-small text-quiet">
        <tr className="border-b border-edge">
          <th scope="col" className="py-1 text-left font-normal">
            Totals, points
          </th>
          {['Right', 'Left', 'Both'].map((head) => (
            <th key={head} scope="col" className="py-1 text-right font-normal">
              {head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {totalRows.map(({ name, keys, most }) => (
          <tr key={name} className="border-b border-hairline">
            <th scope="row" className="py-1 pr-2 text-left font-normal print:py-0.5">
              {name}
            </th>
            {keys.map((key, index) => (
              <td key={key} className="py-1 text-right numbers print:py-0.5">
                {totalInWords(totals[key], isFull)}
                {totals[key] !== 'ND' && <span className="text-small text-quiet"> of {index === 2 ? most * 2 : most}</span>}
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

const affectedWords = { none: 'neither level nor grade', nli: 'the level', ais: 'the grade', both: 'level and grade' };

/** What the registry would make of it. */
function Groups({ classification }: { readonly classification: Classification }) {
  const group = levelGroups.assign(classification.nli.values);
  const label = levelGroups.groups.find(({ id }) => id === group)?.label;
  return (
    <p className="text-small text-quiet">
      Level group in the registry: {label ?? 'not determinable yet'}. Starred cells change{' '}
      {affectedWords[affectedByOtherConditions(classification)]}.
    </p>
  );
}
