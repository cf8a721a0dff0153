import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { constructedCases } from '../reference/constructed-cases.ts';
import { withCell } from '../reference/open-cells.ts';
import { randomExam, seededRandom, withTagged, withUntested } from '../reference/random-exams.ts';
import type { CellPlace } from './cell-key.ts';
import { cellPlaces, writtenIn } from './cell-key.ts';
import type { ExamIssue } from './exam-issue.ts';
import type { Exam } from './exam.ts';
import { columnOfIssue, examFromCells } from './exam-from-cells.ts';
import { validateExam } from './validate-exam.ts';

const sound = constructedCases[0]?.exam as Exam;
const normal = constructedCases.find(({ id }) => id === 'case-14')?.exam as Exam;

function placeOf(key: string): CellPlace {
  const found = cellPlaces.find((place) => place.key === key);
  if (found === undefined) throw new Error(`No cell ${key}.`);
  return found;
}

/** An exam with one cell replaced by anything, or taken away. */
function broken(key: string, value: unknown): unknown {
  const { side, modality, segment } = placeOf(key);
  const row: Record<string, unknown> = { ...sound[side][modality], [segment]: value };
  if (value === undefined) delete row[segment];
  return { ...sound, [side]: { ...sound[side], [modality]: row } };
}

function issuesOf(input: unknown): readonly ExamIssue[] {
  const checked = validateExam(input);
  return 'issues' in checked ? checked.issues : [];
}

function located(input: unknown): string[] {
  return issuesOf(input).map((issue) => `${issue.code} ${columnOfIssue(issue) ?? issue.field ?? issue.segment ?? ''}`.trim());
}

function warningsOf(input: unknown): string[] {
  const checked = validateExam(input);
  if ('issues' in checked) throw new Error(`Refused: ${checked.issues.map(({ message }) => message).join(' ')}`);
  return checked.warnings.map((issue) => `${issue.code} ${columnOfIssue(issue) ?? issue.field ?? ''}`.trim());
}

describe('checking an exam', () => {
  it('accepts a sound exam unchanged and without a warning', () => {
    expect(validateExam(sound)).toEqual({ exam: sound, warnings: [] });
  });

  it('refuses what is no exam at all', () => {
    for (const input of [undefined, null, 'C5', 5, [], [sound]]) expect(located(input)).toEqual(['not-an-exam']);
  });

  it('locates a missing cell, wherever it is', () => {
    for (const { key, side, modality, segment } of cellPlaces) {
      for (const absent of [undefined, null, '']) {
        expect(issuesOf(broken(key, absent))).toMatchObject([{ severity: 'error', code: 'missing', side, modality, segment }]);
      }
    }
  });

  it('takes only text', () => {
    expect(located(broken('lt_r_c5', 2))).toEqual(['not-text lt_r_c5']);
    expect(located(broken('m_l_s1', 5))).toEqual(['not-text m_l_s1']);
  });

  it('takes only listed values', () => {
    for (const value of ['3', '-1', '02', ' 2', 'nt', 'NT ', '1+', '0***', 'x', 'constructor']) {
      expect(located(broken('pp_l_t4', value))).toEqual(['not-listed pp_l_t4']);
    }
    for (const value of ['6', '2.5', '5.0', 'N', '4-']) expect(located(broken('m_r_l2', value))).toEqual(['not-listed m_r_l2']);
  });

  it('refuses a tag on a normal score', () => {
    for (const value of ['2*', '2**']) expect(located(broken('lt_r_s4_5', value))).toEqual(['tag-on-normal lt_r_s4_5']);
    for (const value of ['5*', '5**']) expect(located(broken('m_l_c5', value))).toEqual(['tag-on-normal m_l_c5']);
  });

  it('refuses a tag without a cause, for the exam or for its own cell', () => {
    const tagged = withCell(sound, placeOf('m_r_c6'), '3**');
    expect(located(tagged)).toEqual(['tag-without-cause m_r_c6']);
    expect(located({ ...tagged, tagCause: ' ' })).toEqual(['tag-without-cause m_r_c6']);
    expect(located({ ...tagged, tagCause: { m_r_c7: 'fracture_or_cast' } })).toEqual(['tag-without-cause m_r_c6']);
    expect(located({ ...tagged, tagCause: { m_r_c6: 'fracture_or_cast' } })).toEqual([]);
    expect(located({ ...tagged, tagCause: 'fracture_or_cast' })).toEqual([]);
    expect(located({ ...withCell(sound, placeOf('lt_l_c7'), 'NT*'), ntReason: 'amputation' })).toEqual(['tag-without-cause lt_l_c7']);
  });

  it('asks for the reason of a cell that was not tested, as a warning', () => {
    const untested: Exam = { ...withCell(sound, placeOf('m_l_l4'), 'NT'), dap: 'NT' };
    expect(warningsOf(untested)).toEqual(['nt-without-reason m_l_l4', 'nt-without-reason dap']);
    expect(warningsOf({ ...untested, ntReason: { m_l_l4: 'pain' } })).toEqual(['nt-without-reason dap']);
    expect(warningsOf({ ...untested, ntReason: 'declined' })).toEqual([]);
  });

  it('locates missing sides, rows and answers', () => {
    expect(located({ ...sound, right: undefined })).toEqual(['missing right']);
    expect(issuesOf({ ...sound, left: { ...sound.left, pinPrick: undefined } })).toMatchObject([
      { code: 'missing', side: 'left', modality: 'pinPrick' },
    ]);
    expect(located({ ...sound, vac: undefined })).toEqual(['missing vac']);
    expect(located({ ...sound, dap: '' })).toEqual(['missing dap']);
    expect(located({ ...sound, vac: 'yes' })).toEqual(['not-listed vac']);
    expect(located({ ...sound, dap: true })).toEqual(['not-listed dap']);
  });

  it('refuses segments and fields that do not belong to an exam', () => {
    expect(located({ ...sound, right: { ...sound.right, lightTouch: { ...sound.right.lightTouch, S5: '2' } } })).toEqual([
      'unknown-segment S5',
    ]);
    expect(located({ ...sound, left: { ...sound.left, motor: { ...sound.left.motor, T2: '5' } } })).toEqual(['unknown-segment T2']);
    expect(located({ ...sound, left: { ...sound.left, nonkey: 'L2' } })).toEqual(['unknown-field nonkey']);
    expect(located({ ...sound, voluntaryAnalContraction: 'No' })).toEqual(['unknown-field voluntaryAnalContraction']);
  });

  it('takes a key muscle segment only as lowest non-key muscle', () => {
    for (const nonKey of ['T2', 'l5', '', 5]) {
      expect(located({ ...sound, right: { ...sound.right, nonKey } })).toEqual(['not-listed non_key_r']);
      expect(located({ ...sound, left: { ...sound.left, nonKey } })).toEqual(['not-listed non_key_l']);
    }
    expect(validateExam({ ...sound, right: { ...sound.right, nonKey: null } })).toEqual({ exam: sound, warnings: [] });
  });

  it('refuses circumstances that cannot be', () => {
    expect(located({ ...sound, earlierDeficit: 'yes' })).toEqual(['not-listed earlier_deficit']);
    expect(located({ ...sound, ageYears: -1 })).toEqual(['out-of-range ageYears']);
    expect(located({ ...sound, ageYears: Number.NaN })).toEqual(['out-of-range ageYears']);
    expect(located({ ...sound, hoursSinceInjury: '12' })).toEqual(['out-of-range hoursSinceInjury']);
    expect(located({ ...sound, tagCause: 3 })).toEqual(['not-text tag_cause']);
    expect(located({ ...sound, ntReason: { m_r_t2: 'pain' } })).toEqual(['unknown-segment nt_reason']);
    expect(located({ ...sound, ntReason: { vac: 3 } })).toEqual(['not-text nt_reason']);
  });

  it('tells every problem at once', () => {
    const input = { ...(broken('lt_r_c5', '7') as Exam), vac: 'maybe', left: { ...sound.left, nonKey: 'T4' } };
    expect(located(input)).toEqual(['not-listed lt_r_c5', 'not-listed non_key_l', 'not-listed vac']);
    const tagged = withCell(sound, placeOf('m_r_c6'), '3**');
    expect(located({ ...tagged, vac: undefined })).toEqual(['missing vac', 'tag-without-cause m_r_c6']);
  });

  it('never repeats the value it found', () => {
    for (const input of [
      broken('lt_r_c5', 'Zebra'),
      { ...sound, vac: 'Zebra' },
      { ...sound, right: { ...sound.right, nonKey: 'Zebra' } },
    ]) {
      for (const { message } of issuesOf(input)) expect(message).not.toContain('Zebra');
    }
  });

  it('accepts every exam the random generators make, and classifies it', () => {
    fc.assert(
      fc.property(fc.nat(), fc.constantFrom('noise' as const, 'levelled' as const), (seed, kind) => {
        const random = seededRandom(seed);
        const exam = withTagged(random, withUntested(random, randomExam(random, kind)));
        expect(validateExam({ ...exam, tagCause: 'other', ntReason: 'other' })).toHaveProperty('exam');
      }),
      { seed: 61, numRuns: 300 },
    );
  });

  it('survives any JSON without an exam coming out of it', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (input) => {
        expect(issuesOf(input).length).toBeGreaterThan(0);
      }),
      { seed: 62, numRuns: 300 },
    );
  });
});

describe('warnings about improbable exams', () => {
  it('point at a normal exam without contraction or pressure, and at nothing in one with both', () => {
    expect(warningsOf({ ...normal, vac: 'No', dap: 'Yes' })).toEqual(['normal-without-contraction vac']);
    expect(warningsOf({ ...normal, vac: 'Yes', dap: 'No' })).toEqual(['normal-without-pressure dap']);
    expect(warningsOf({ ...normal, vac: 'No', dap: 'No' })).toEqual(['normal-without-contraction vac', 'normal-without-pressure dap']);
    expect(warningsOf({ ...normal, vac: 'Yes', dap: 'Yes' })).toEqual([]);
    expect(warningsOf({ ...withCell(normal, placeOf('m_r_s1'), '4'), vac: 'No' })).toEqual([]);
  });

  it('find nothing in contraction with normal key muscles on one side only', () => {
    const oneSided = constructedCases.find(({ id }) => id === 'case-39')?.exam;
    expect(warningsOf(oneSided)).toEqual([]);
  });

  it('point at S4-5 normal over S3 absent, by side and modality', () => {
    const slipped = withCell(withCell(sound, placeOf('pp_l_s4_5'), '2'), placeOf('lt_r_s4_5'), '1');
    expect(warningsOf(slipped)).toEqual(['perianal-normal-s3-absent pp_l_s4_5']);
    expect(warningsOf(withCell(slipped, placeOf('pp_l_s3'), '1'))).toEqual([]);
  });

  it('point at a non-key muscle that has no effect', () => {
    const atT4 = (nonKey: string) => ({ ...sound, right: { ...sound.right, nonKey } });
    expect(warningsOf(atT4('T1'))).toEqual(['non-key-without-effect non_key_r']);
    expect(warningsOf(atT4('L2'))).toEqual([]);
    const noEffect = constructedCases.find(({ id }) => id === 'case-36')?.exam;
    expect(warningsOf(noEffect)).toEqual(['non-key-without-effect non_key_r']);
  });

  it('point at an exam before the injury, within a day of it, or under six years of age', () => {
    expect(warningsOf({ ...sound, hoursSinceInjury: -1 })).toEqual(['exam-before-injury hoursSinceInjury']);
    expect(warningsOf({ ...sound, hoursSinceInjury: 0 })).toEqual(['exam-within-a-day hoursSinceInjury']);
    expect(warningsOf({ ...sound, hoursSinceInjury: 23.9 })).toEqual(['exam-within-a-day hoursSinceInjury']);
    expect(warningsOf({ ...sound, hoursSinceInjury: 24 })).toEqual([]);
    expect(warningsOf({ ...sound, ageYears: 5 })).toEqual(['under-six ageYears']);
    expect(warningsOf({ ...sound, ageYears: 6 })).toEqual([]);
  });
});

describe('an exam from the cells of a row', () => {
  const answers = { Yes: 'yes', No: 'no', NT: 'NT' } as const;

  function rowOf(exam: Exam): Map<string, string> {
    const row = new Map<string, string>(cellPlaces.map((place) => [place.key, writtenIn(exam, place)]));
    row.set('vac', answers[exam.vac]).set('dap', answers[exam.dap]);
    if (exam.right.nonKey) row.set('non_key_r', exam.right.nonKey);
    if (exam.left.nonKey) row.set('non_key_l', exam.left.nonKey);
    row
      .set('earlier_deficit', exam.earlierDeficit === true ? 'yes' : 'no')
      .set('tag_cause', 'other')
      .set('nt_reason', 'other');
    return row;
  }

  it('is the exam the row was written from', () => {
    for (const { exam } of constructedCases) {
      const row = rowOf(exam);
      expect(validateExam(examFromCells((key) => row.get(key)))).toMatchObject({ exam: { ...exam, tagCause: 'other', ntReason: 'other' } });
    }
  });

  it('takes answers in any case and empty cells as absent', () => {
    const row = rowOf(sound);
    row.set('vac', 'NO').set('dap', ' nt ').set('non_key_l', '').set('m_r_l3', 'nt').set('earlier_deficit', '');
    const { earlierDeficit: _unset, ...rest } = withCell(sound, placeOf('m_r_l3'), 'NT');
    expect(validateExam(examFromCells((key) => row.get(key)))).toMatchObject({ exam: { ...rest, dap: 'NT' } });
  });

  it('passes on what it cannot read, to be refused in its column', () => {
    const row = rowOf(sound);
    row.set('vac', 'constructor').set('earlier_deficit', 'perhaps').set('lt_l_c3', '9').set('non_key_r', 'T4');
    row.delete('m_r_s1');
    const issues = issuesOf(examFromCells((key) => row.get(key)));
    expect(issues.map((issue) => `${issue.code} ${columnOfIssue(issue)}`)).toEqual([
      'missing m_r_s1',
      'not-listed non_key_r',
      'not-listed lt_l_c3',
      'not-listed vac',
      'not-listed earlier_deficit',
    ]);
  });

  it('is refused with every cell named when the row is empty', () => {
    expect(issuesOf(examFromCells(() => undefined))).toHaveLength(134);
  });
});
