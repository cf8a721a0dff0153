import { describeConversion } from '@cairnstep/dictionary';
import type { AcceptedUnit } from '@cairnstep/dictionary';

/** Other units a file may use, with the factors exactly as they are applied. */
export function Conversions({ stored, units }: { readonly stored: string; readonly units: readonly AcceptedUnit[] }) {
  return (
    <ul className="grid max-w-2xl gap-2">
      {units.map((accepted) => (
        <li key={accepted.unit} className="border-b border-hairline pb-2">
          <span className="numbers">{describeConversion(accepted, stored)}</span>
          <span className="block text-small text-quiet">{accepted.source}</span>
        </li>
      ))}
    </ul>
  );
}
