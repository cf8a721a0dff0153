import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { firstDayOf, isWorkingDay, workingDayFrom } from '../calendar.ts';
import { Random } from '../random.ts';
import { drawCourse } from './course.ts';

const courses = fc
  .record({ seed: fc.nat(), perWeek: fc.integer({ min: 2, max: 5 }), weeks: fc.integer({ min: 4, max: 12 }), start: fc.nat({ max: 365 }) })
  .map(({ seed, perWeek, weeks, start }) => {
    const first = workingDayFrom(firstDayOf('2025-01') + start);
    return { first, course: drawCourse(Random.of(seed), 1, first, { perWeek, sessions: perWeek * weeks }, first + 400) };
  });

const tookPlace = ({ status }: { status: string }): boolean => status === 'completed' || status === 'shortened';

describe('a course of training', () => {
  it('begins with a session that takes place, and numbers its sessions from 1', () => {
    fc.assert(
      fc.property(courses, ({ first, course: { sessions } }) => {
        expect(sessions[0]).toMatchObject({ day: first, number: 1, status: 'completed' });
        expect(sessions.map(({ number }) => number)).toEqual(sessions.map((_, index) => index + 1));
      }),
      { seed: 51, numRuns: 60 },
    );
  });

  it('keeps to open days, one session a day, never more than three weeks apart', () => {
    fc.assert(
      fc.property(courses, ({ course: { sessions } }) => {
        expect(sessions.every(({ day }) => isWorkingDay(day))).toBe(true);
        const attended = sessions.filter(tookPlace).map(({ day }) => day);
        attended.slice(1).forEach((day, index) => {
          expect(day - (attended[index] ?? day)).toBeGreaterThan(0);
          expect(day - (attended[index] ?? day)).toBeLessThanOrEqual(21);
        });
      }),
      { seed: 52, numRuns: 200 },
    );
  });

  it('gives a reason for every session that was not completed, and only for those', () => {
    fc.assert(
      fc.property(courses, ({ course: { sessions } }) =>
        sessions.every(({ status, reason }) => (status === 'completed') === (reason === undefined)),
      ),
      { seed: 53, numRuns: 60 },
    );
  });

  it('stops at the horizon', () => {
    const first = firstDayOf('2025-03') + 2;
    const course = drawCourse(Random.of(9), 1, first, { perWeek: 5, sessions: 50 }, first + 13);
    expect(course.ended).toBe('running');
    expect(course.sessions.length).toBe(10);
  });
});
