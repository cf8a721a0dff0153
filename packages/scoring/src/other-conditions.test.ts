import { describe, expect, it } from 'vitest';
import { constructedCases } from '../reference/constructed-cases.ts';
import { withCell } from '../reference/open-cells.ts';
import { cellPlaces } from './cell-key.ts';
import { classify } from './classify.ts';
import type { Exam } from './exam.ts';
import { affectedByOtherConditions } from './other-conditions.ts';

const exam = (id: string) => constructedCases.find((constructed) => constructed.id === id)?.exam as Exam;

function tagged(id: string, cells: Readonly<Record<string, string>>): Exam {
  return cellPlaces.reduce((changed, place) => {
    const written = cells[place.key];
    return written === undefined ? changed : withCell(changed, place, written);
  }, exam(id));
}

describe('what conditions other than the injury affect', () => {
  it('is nothing without tags, and nothing where tags change no result', () => {
    expect(affectedByOtherConditions(classify(exam('case-01')))).toBe('none');
    expect(affectedByOtherConditions(classify(tagged('case-01', { lt_r_l3: '0*', pp_r_l3: '0*' })))).toBe('none');
  });

  it('is the level, when a tagged muscle above it would have stopped the search', () => {
    expect(affectedByOtherConditions(classify(exam('case-30')))).toBe('nli');
  });

  it('is the grade, when a tagged muscle below the level makes the half that D takes', () => {
    // Four of ten leg muscles reach 3 as examined; the fifth is taken as normal, so half do.
    expect(affectedByOtherConditions(classify(tagged('case-09', { m_l_l3: '2**' })))).toBe('ais');
  });

  it('is both, when tags at S4-5 and above the level change each', () => {
    const both = tagged('case-01', { m_r_c6: '3**', lt_r_s4_5: '0**' });
    expect(affectedByOtherConditions(classify(both))).toBe('both');
  });
});
