/** What the exam holds beside its cells: non-key muscles, an earlier deficit, and one reason for all that was not tested. */
import { keyMuscles, sides } from '@cairnstep/scoring';
import type { Side } from '@cairnstep/scoring';
import { memo } from 'react';
import { RadioGroup } from '../../ui/radio-group.tsx';
import { Select } from '../../ui/select.tsx';
import type { Act } from './entry.ts';
import { ntReasons } from './exam-sheet.ts';
import type { ExamSheet } from './exam-sheet.ts';

export const nonKeyFieldId = (side: Side): string => `non-key-${side}`;

const nobody = 'none';
const muscles = [
  { value: nobody, label: 'None found, or not looked for' },
  ...keyMuscles.map((muscle) => ({ value: muscle, label: muscle })),
];

export interface RestOfExamProps extends Pick<ExamSheet, 'nonKey' | 'earlierDeficit' | 'ntReason'> {
  readonly anyNotTested: boolean;
  readonly act: (act: Act) => void;
}

/** Kept from rendering at every key: its lists of choices are slow to build. */
export const RestOfExam = memo(function RestOfExam({ nonKey, earlierDeficit, ntReason, anyNotTested, act }: RestOfExamProps) {
  return (
    <div className="not-printed grid gap-4">
      <div className="grid gap-4 sm:grid-cols-2">
        {sides.map((side) => (
          <Select
            key={side}
            id={nonKeyFieldId(side)}
            label={`Lowest non-key muscle, ${side}`}
            hint="The segment, where one moves"
            value={nonKey[side] ?? nobody}
            onChange={(value) => act({ act: 'non-key', side, muscle: keyMuscles.find((muscle) => muscle === value) ?? null })}
            options={muscles}
          />
        ))}
      </div>
      <RadioGroup
        id="earlier-deficit"
        label="Is an earlier deficit on record?"
        hint="A normal exam is graded E only then"
        inline
        value={earlierDeficit === null ? null : earlierDeficit ? 'yes' : 'no'}
        onChange={(value) => act({ act: 'earlier-deficit', answer: value === 'yes' })}
        options={[
          { value: 'yes', label: 'Yes' },
          { value: 'no', label: 'No' },
        ]}
      />
      {anyNotTested && (
        <Select
          id="nt-reason"
          label="Why cells were not tested"
          hint="For all that have no reason of their own"
          value={ntReason ?? nobody}
          onChange={(value) => act({ act: 'reason-for-all', reason: value === nobody ? null : value })}
          options={[{ value: nobody, label: 'No reason given' }, ...ntReasons.map(({ code, label }) => ({ value: code, label }))]}
        />
      )}
    </div>
  );
});
