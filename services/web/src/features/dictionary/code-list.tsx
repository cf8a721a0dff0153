import type { Code } from '@cairnstep/dictionary';
import type { ReactNode } from 'react';

export interface CodeListProps {
  readonly caption: string;
  readonly codes: readonly Code[];
  /** Turns a code into a link. */
  readonly link?: (code: Code) => ReactNode;
}

/** The codes a file may hold, as written, with what each means. */
export function CodeList({ caption, codes, link }: CodeListProps) {
  return (
    <table className="w-full max-w-2xl border-collapse">
      <caption className="pb-2 text-left font-semibold">{caption}</caption>
      <thead className="text-small text-quiet">
        <tr className="border-b border-edge">
          <th scope="col" className="py-1 pr-6 text-left font-normal">
            Code
          </th>
          <th scope="col" className="w-full py-1 text-left font-normal">
            Meaning
          </th>
        </tr>
      </thead>
      <tbody>
        {codes.map((code) => (
          <tr key={code.code} className="border-b border-hairline align-top">
            <th scope="row" className="py-2 pr-6 text-left font-normal">
              <code className="wrap-anywhere">{code.code}</code>
            </th>
            <td className="py-2">{link === undefined ? code.label : link(code)}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
