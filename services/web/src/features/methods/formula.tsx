import { typeset } from './typeset.ts';
import type { Piece } from './typeset.ts';

/** A formula, statement under statement. */
export function Formula({ lines }: { readonly lines: readonly string[] }) {
  return (
    <div className="grid gap-3 border-l-3 border-lichen pl-4 font-serif text-lead">
      {lines.map((line) => (
        <p key={line} className="pl-6 -indent-6">
          {typeset(line).map((piece, at) => (
            <Placed key={at} {...piece} />
          ))}
        </p>
      ))}
    </div>
  );
}

function Placed({ text, place }: Piece) {
  if (place === 'line') return text;
  return place === 'below' ? <sub>{text}</sub> : <sup>{text}</sup>;
}
