import type { NotDeterminable } from './assign-by-set.ts';
import { assignBySet } from './assign-by-set.ts';
import type { AisGrade } from './classification.ts';

export interface CompletenessClass<Id extends string = string> {
  readonly id: Id;
  readonly label: string;
  readonly grades: readonly AisGrade[];
}

/** The classes customary in reports. They overlap: motor complete takes in complete and sensory incomplete. */
export const completenessClasses = {
  id: 'completeness-1',
  classes: [
    { id: 'complete', label: 'Complete (AIS A)', grades: ['A'] },
    { id: 'motor_complete', label: 'Motor complete (AIS A, B)', grades: ['A', 'B'] },
    { id: 'sensory_incomplete', label: 'Sensory incomplete (AIS B)', grades: ['B'] },
    { id: 'motor_incomplete', label: 'Motor incomplete (AIS C, D)', grades: ['C', 'D'] },
  ],
} as const satisfies { readonly id: string; readonly classes: readonly CompletenessClass[] };
export type CompletenessClassId = (typeof completenessClasses)['classes'][number]['id'];

/** Whether a grade belongs to a class: yes or no only when that holds for every grade it can be. */
export function inCompletenessClass(classId: CompletenessClassId, grades: readonly AisGrade[]): 'yes' | 'no' | NotDeterminable {
  const members: readonly AisGrade[] = completenessClasses.classes.find(({ id }) => id === classId)!.grades;
  return assignBySet(grades, (grade) => (members.includes(grade) ? 'yes' : 'no'));
}
