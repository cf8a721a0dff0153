import { sides } from '@cairnstep/scoring';
import { cellTitle, labelIn, ntReasons, reasonFor, tagCauses, treatmentIn } from './exam-sheet.ts';
import type { ExamSheet } from './exam-sheet.ts';
import { allCells } from './places.ts';

/** What the digits alone do not say: stars, reasons, non-key muscles, an earlier deficit. */
export function Remarks({ sheet }: { readonly sheet: ExamSheet }) {
  const remarks = [...starRemarks(sheet), ...reasonRemarks(sheet), ...otherRemarks(sheet)];
  if (remarks.length === 0) return <p className="text-quiet">None.</p>;
  return (
    <ul className="grid gap-1">
      {remarks.map((remark) => (
        <li key={remark}>{remark}</li>
      ))}
    </ul>
  );
}

function starRemarks({ written, tagCauses: causes }: ExamSheet): string[] {
  return allCells.flatMap((key) => {
    const code = written[key];
    const treatment = code === undefined ? null : treatmentIn(code);
    if (code === undefined || treatment === null) return [];
    const cause = labelIn(tagCauses, causes[key]) ?? 'no condition named';
    return [`${cellTitle(key)}, ${code}: ${cause}; counts as ${treatment === 'normal' ? 'normal' : 'not normal'}.`];
  });
}

/** Cells with the same reason are told together. */
function reasonRemarks(sheet: ExamSheet): string[] {
  const byReason = new Map<string, string[]>();
  for (const key of allCells) {
    const reason = reasonFor(sheet, key);
    if (reason !== undefined) byReason.set(reason, [...(byReason.get(reason) ?? []), cellTitle(key)]);
  }
  return [...byReason].map(([reason, cells]) => `Not tested (${labelIn(ntReasons, reason) ?? reason}): ${cells.join('; ')}.`);
}

function otherRemarks({ nonKey, earlierDeficit }: ExamSheet): string[] {
  const moving = sides.flatMap((side) => (nonKey[side] === null ? [] : [`Lowest non-key muscle that moves, ${side}: ${nonKey[side]}.`]));
  return [...moving, ...(earlierDeficit === null ? [] : [`Earlier deficit on record: ${earlierDeficit ? 'yes' : 'no'}.`])];
}
