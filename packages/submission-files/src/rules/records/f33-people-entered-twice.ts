import type { Rule } from '../../checking/rule.ts';
import type { CheckedTable } from '../../checking/checked-table.ts';

const compared = ['age_at_index', 'sex', 'injury_year', 'days_injury_to_index', 'cause', 'ventilator'];

/** What two codes of one person would share; null when too little is known to tell two people apart. */
function likeness(table: Pick<CheckedTable, 'column'>, row: number): string | null {
  if (table.column('days_injury_to_index').number(row) === null) return null;
  return JSON.stringify(compared.map((key) => table.column(key).cell(row)));
}

export const peopleEnteredTwice: Rule = {
  id: 'F33',
  evaluate: (submission, report) => {
    const participants = submission.table('participants');
    const others = submission.context.otherParticipants;
    const codes = participants.column('participant');
    const codesOf = new Map<string, Set<string>>();
    const note = (key: string | null, code: string | null): void => {
      if (key === null || code === null) return;
      const known = codesOf.get(key);
      if (known) known.add(code);
      else codesOf.set(key, new Set([code]));
    };
    for (let row = 0; row < participants.length; row += 1) note(likeness(participants, row), codes.word(row));
    for (let row = 0; row < (others?.length ?? 0); row += 1)
      if (others) note(likeness(others, row), others.column('participant').word(row));
    for (let row = 0; row < participants.fileRows; row += 1) {
      const key = likeness(participants, row);
      if (key !== null && (codesOf.get(key)?.size ?? 0) > 1)
        report.add(participants, row, null, 'A participant who agrees with another one in everything recorded.');
    }
  },
};
