/** What a request says, in the words of the screens. */
import type { AccessRequest, RequestForm } from '@cairnstep/contract';
import { measureOf } from '@cairnstep/dictionary';

export const statusWords: Readonly<Record<AccessRequest['status'], string>> = {
  draft: 'draft',
  submitted: 'waiting for a decision',
  in_review: 'under review',
  approved: 'approved',
  declined: 'declined',
  withdrawn: 'taken back',
  ended: 'access has ended',
};

export const purposes: readonly { readonly value: NonNullable<RequestForm['purpose']>; readonly label: string; readonly hint: string }[] = [
  { value: 'condition_research', label: 'Research on spinal cord injury', hint: 'Most participants consent to this.' },
  {
    value: 'biomedical_research',
    label: 'Health research beyond this condition',
    hint: 'Leaves out participants who consent to research on their condition only.',
  },
  { value: 'methods_development', label: 'Development of methods', hint: 'Statistics, devices or software as a purpose of its own.' },
];

export const tables: readonly { readonly value: RequestForm['tables'][number]['table']; readonly label: string; readonly holds: string }[] =
  [
    { value: 'participants', label: 'Participants', holds: 'One row for each person: level group, AIS grade, age band, sex.' },
    { value: 'outcomes', label: 'Outcomes', holds: 'Each measure at baseline and at the end of the course, with how the attempt went.' },
    { value: 'sessions', label: 'Sessions', holds: 'Four-week block, device class, bouts, minutes walked, distance, steps. No dates.' },
  ];

/** Duties that some participants attach to their consent. */
export const duties = [
  { field: 'agreesToPublish', id: 'agrees-to-publish', label: 'Will you publish the results where other researchers can read them?' },
  { field: 'agreesToCollaborate', id: 'agrees-to-collaborate', label: 'Will you work together with the clinics that collected the data?' },
  { field: 'agreesToReturn', id: 'agrees-to-return', label: 'Will you give derived data back to the registry?' },
] as const;

export const terms = 'no attempt to find out who a participant is, no passing on, and the files are destroyed when access ends';

export function outcomeInWords({ outcome, inDevice }: RequestForm['cohort']): string {
  return `${measureOf(outcome)?.name ?? outcome}, ${inDevice ? 'in the training device' : 'without the training device'}`;
}

/** A title may still be missing. */
export const titleOf = ({ title }: { readonly title: string }): string => (title === '' ? 'Request without a title' : title);
