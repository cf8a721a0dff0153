/** The stack of five stones: still, it is the logo; one by one, it is how far a submission has come. */
import { stones } from './stones.ts';

export function Mark({ size = 32 }: { readonly size?: number }) {
  return (
    <svg aria-hidden="true" width={size} height={size} viewBox="0 0 32 32" className="shrink-0 fill-lichen">
      {stones.map((stone, index) => (
        <Stone key={index} stone={stone} />
      ))}
    </svg>
  );
}

function Stone({ stone }: { readonly stone: (typeof stones)[number] }) {
  const { x, y, width, height, tilt } = stone;
  return (
    <rect x={x} y={y} width={width} height={height} rx={height / 2} transform={`rotate(${tilt} ${x + width / 2} ${y + height / 2})`} />
  );
}

export type StepState = 'waiting' | 'current' | 'done' | 'failed';

export interface Step {
  readonly key: string;
  readonly label: string;
  readonly state: StepState;
  /** Where it stands, in a few words: "1 204 of 3 000 rows". */
  readonly remark?: string;
}

const stateWords: Record<StepState, string> = { waiting: 'not yet', current: 'now', done: 'done', failed: 'needs mending' };
const stoneLooks: Record<StepState, string> = {
  waiting: 'fill-transparent stroke-edge [stroke-dasharray:3_3]',
  current: 'fill-chosen stroke-lichen stroke-2',
  done: 'fill-lichen stroke-lichen',
  failed: 'fill-transparent stroke-oxide stroke-2',
};
const widths = [132, 112, 92, 72, 52];

/** Up to five steps as stones, the first at the bottom; each with its word and state beside it. */
export function StackProgress({ label, steps }: { readonly label: string; readonly steps: readonly Step[] }) {
  return (
    <ol aria-label={label} className="flex flex-col-reverse">
      {steps.map(({ key, label: name, state, remark }, index) => (
        <li key={key} aria-current={state === 'current' ? 'step' : undefined} className="grid grid-cols-[136px_1fr] items-center gap-4">
          <svg
            aria-hidden="true"
            width="136"
            height="44"
            viewBox="0 0 136 44"
            className={state === 'done' || state === 'current' ? 'stone-settles' : ''}
          >
            <StepStone width={widths[index] ?? 40} offset={index % 2 === 0 ? 0 : 3} look={stoneLooks[state]} />
          </svg>
          <span className="leading-tight">
            <span className={state === 'current' || state === 'failed' ? 'font-semibold' : state === 'waiting' ? 'text-quiet' : ''}>
              {name}
            </span>
            <span className={`block text-small ${state === 'failed' ? 'text-oxide' : 'text-quiet'}`}>{remark ?? stateWords[state]}</span>
          </span>
        </li>
      ))}
    </ol>
  );
}

function StepStone({ width, offset, look }: { readonly width: number; readonly offset: number; readonly look: string }) {
  return <rect x={(136 - width) / 2 + offset} y="2" width={width} height="40" rx="20" className={look} />;
}
