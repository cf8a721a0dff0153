import { expect, it } from 'vitest';
import { problemsOf } from './field-problems.ts';
import { ProblemError } from './problem-error.ts';

const refused = new ProblemError({
  type: '/problems/invalid-input',
  status: 400,
  title: 'Some of what was sent cannot be used',
  detail: 'Nothing was changed.',
  instance: '/requests/1',
  errors: [
    { pointer: '/form/title', detail: 'Write a title' },
    { pointer: '/form/team/0', detail: 'Write an address' },
    { pointer: '/form/titleless', detail: 'Unknown field' },
  ],
});

it('places each message at the field that can mend it, and keeps the others', () => {
  expect(problemsOf(refused, { '/form/title': 'title', '/form/team': 'team' })).toEqual([
    { fieldId: 'title', message: 'Write a title' },
    { fieldId: 'team', message: 'Write an address' },
    { message: 'Unknown field' },
  ]);
});

it('has nothing to place for an error that names no field', () => {
  expect(problemsOf(new Error('other'), { '/form/title': 'title' })).toEqual([]);
});
