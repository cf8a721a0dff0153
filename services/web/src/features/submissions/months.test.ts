import { describe, expect, it } from 'vitest';
import { nextStep } from './months.ts';
import type { Month } from './months.ts';

const month = (name: string, state: Month['state'], more: Partial<Month> = {}): Month => ({
  month: name,
  state,
  dueOn: `${name}-28`,
  submissionId: null,
  acceptedAt: null,
  rows: null,
  closed: null,
  ...more,
});
const accepted = { acceptedAt: '2026-10-20T10:00:00.000Z', rows: 900 };
const today = '2026-11-30';

describe('what a site does next', () => {
  it('is the oldest month that nothing has settled, and says how many wait behind it', () => {
    const months = [month('2026-12', 'not-yet-due'), month('2026-11', 'due'), month('2026-10', 'in-progress'), month('2026-09', 'overdue')];
    const next = nextStep(months, today);
    expect(next).toMatchObject({ begun: false, late: true, others: 2 });
    expect(next?.month.month).toBe('2026-09');
  });

  it('is to go on with a month that was begun; its day counts as passed only after it', () => {
    const months = [month('2026-11', 'in-progress', { dueOn: today }), month('2026-10', 'accepted', accepted)];
    expect(nextStep(months, today)).toMatchObject({ begun: true, correction: false, late: false, others: 0 });
  });

  it('is a correction only when no month waits', () => {
    const correction = month('2026-09', 'in-progress', accepted);
    expect(nextStep([month('2026-11', 'due'), correction], today)?.month.month).toBe('2026-11');
    expect(nextStep([month('2026-12', 'not-yet-due'), correction], today)).toMatchObject({ correction: true, begun: true, late: false });
  });

  it('is not a month that had nothing to report, until a submission of it was begun after all', () => {
    const closed = { closed: { at: '2026-10-02T10:00:00.000Z', by: 'Mara Lind' } };
    expect(nextStep([month('2026-09', 'nothing-to-report', closed), month('2026-08', 'accepted', accepted)], today)).toBeNull();
    expect(nextStep([month('2026-09', 'checking', closed)], today)).toMatchObject({ correction: true, begun: true, late: false });
  });

  it('is nothing while all past months are accepted', () => {
    expect(nextStep([month('2026-12', 'not-yet-due'), month('2026-11', 'accepted', accepted)], today)).toBeNull();
  });
});
