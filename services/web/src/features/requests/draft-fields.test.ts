import { describe, expect, it } from 'vitest';
import { problemsOf } from '../../lib/field-problems.ts';
import { ProblemError } from '../../lib/problem-error.ts';
import { exampleRequest } from '../../testing/example-request.ts';
import { draftProblems, fieldIdsOf, readDate, readTeam } from './draft-fields.ts';

describe('what is typed freely', () => {
  it('is a date only when the calendar has the day', () => {
    expect(readDate(' 2027-06-30 ')).toBe('2027-06-30');
    for (const wrong of ['', '2027-6-30', '30.06.2027', '2027-02-30', '2027-13-01']) expect(readDate(wrong)).toBeNull();
  });

  it('is a list of addresses, one a line or with commas; what is none is named', () => {
    expect(readTeam('a@one.example\nb@two.example, c@three.example\n\nsomebody')).toEqual({
      team: ['a@one.example', 'b@two.example', 'c@three.example'],
      unreadable: ['somebody'],
    });
    expect(
      draftProblems({ ...exampleRequest.form, ethicsExpiresOn: null }, { ethicsExpiresOn: 'soon', team: 'somebody' }, '2026-12-01'),
    ).toEqual([
      { fieldId: 'ethics-expires-on', message: 'Write the day as year, month and day, for example 2027-06-30.' },
      { fieldId: 'team', message: 'Write whole e-mail addresses, one a line. Not one: somebody.' },
    ]);
    expect(draftProblems(exampleRequest.form, { ethicsExpiresOn: '2099-12-31', team: '' }, '2026-12-01')).toEqual([]);
  });
});

describe('what was refused', () => {
  it('is placed at the justification of its table, whatever the order of tables', () => {
    const refused = new ProblemError({
      type: '/problems/request-incomplete',
      status: 409,
      title: 'The request is not complete',
      detail: 'Fill in what is listed.',
      instance: '/x',
      errors: [
        { pointer: '/form/tables/1/justification', detail: 'Say why.' },
        { pointer: '/form/team/0', detail: 'Nobody has this address.' },
        { pointer: '/form/tables', detail: 'A table is asked for once.' },
      ],
    });
    const tables = [
      { table: 'sessions' as const, justification: 'x' },
      { table: 'outcomes' as const, justification: '' },
    ];
    expect(problemsOf(refused, fieldIdsOf({ tables })).map(({ fieldId }) => fieldId)).toEqual(['justification-outcomes', 'team', 'tables']);
  });
});
