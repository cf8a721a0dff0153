import { cellPlaces, writtenIn } from './cell-key.ts';
import { cellName, rowName } from './cell-name.ts';
import type { CellReadings } from './cell-reading.ts';
import { motorReadings, readCell, sensoryReadings } from './cell-reading.ts';
import type { ExamErrorCode, ExamIssue } from './exam-issue.ts';
import type { CellKey, Exam, Observation, Remark, SideExam } from './exam.ts';
import { observations } from './exam.ts';
import { hasRemark } from './remark.ts';
import type { KeyMuscle, Modality, Side } from './segments.ts';
import { keyMuscles, modalities, sensorySegments } from './segments.ts';

type Fields = Readonly<Record<string, unknown>>;
type Where = Pick<ExamIssue, 'side' | 'modality' | 'segment' | 'field'>;

const examFields = ['right', 'left', 'vac', 'dap', 'earlierDeficit', 'ntReason', 'tagCause', 'ageYears', 'hoursSinceInjury'];
const sideFields = [...modalities, 'nonKey'];

function isFields(value: unknown): value is Fields {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** Collects what is wrong. Absent optional fields may be `undefined` or `null`. */
export class ExamCheck {
  readonly issues: ExamIssue[] = [];

  private report(code: ExamErrorCode, message: string, where: Where): undefined {
    this.issues.push({ severity: 'error', code, message, ...where });
    return undefined;
  }

  exam(input: unknown): Exam | undefined {
    if (!isFields(input)) return this.report('not-an-exam', 'This is not an exam: an object with a right and a left side is expected.', {});
    this.unknownFields(input, examFields, 'The exam', {});
    const right = this.side(input['right'], 'right');
    const left = this.side(input['left'], 'left');
    const vac = this.observation(input['vac'], 'vac', 'voluntary anal contraction');
    const dap = this.observation(input['dap'], 'dap', 'deep anal pressure');
    const earlierDeficit = this.flag(input['earlierDeficit'], 'earlierDeficit');
    const ntReason = this.remark(input['ntReason'], 'ntReason');
    const tagCause = this.remark(input['tagCause'], 'tagCause');
    const ageYears = this.number(input['ageYears'], 'ageYears', 0);
    const hoursSinceInjury = this.number(input['hoursSinceInjury'], 'hoursSinceInjury', -Infinity);
    if (right === undefined || left === undefined) return undefined;
    this.tagCauses({ right, left }, tagCause);
    if (vac === undefined || dap === undefined) return undefined;

    const exam: Exam = {
      right,
      left,
      vac,
      dap,
      ...(earlierDeficit === undefined ? {} : { earlierDeficit }),
      ...(ntReason === undefined ? {} : { ntReason }),
      ...(tagCause === undefined ? {} : { tagCause }),
      ...(ageYears === undefined ? {} : { ageYears }),
      ...(hoursSinceInjury === undefined ? {} : { hoursSinceInjury }),
    };
    return this.issues.length === 0 ? exam : undefined;
  }

  private side(input: unknown, side: Side): SideExam | undefined {
    if (!isFields(input)) return this.report('missing', `The ${side} side is missing.`, { side, field: side });
    this.unknownFields(input, sideFields, `The ${side} side`, { side });
    const lightTouch = this.row(input['lightTouch'], side, 'lightTouch', sensorySegments, sensoryReadings);
    const pinPrick = this.row(input['pinPrick'], side, 'pinPrick', sensorySegments, sensoryReadings);
    const motor = this.row(input['motor'], side, 'motor', keyMuscles, motorReadings);
    const nonKey = this.nonKey(input['nonKey'], side);
    if (lightTouch === undefined || pinPrick === undefined || motor === undefined) return undefined;
    return { lightTouch, pinPrick, motor, ...(nonKey === undefined ? {} : { nonKey }) };
  }

  private row<Segment extends string>(
    input: unknown,
    side: Side,
    modality: Modality,
    segments: readonly Segment[],
    readings: CellReadings,
  ): Record<Segment, string> | undefined {
    const name = rowName(side, modality);
    if (!isFields(input)) return this.report('missing', `The ${name} scores are missing.`, { side, modality });
    for (const segment of Object.keys(input)) {
      if ((segments as readonly string[]).includes(segment)) continue;
      this.report('unknown-segment', `The ${name} scores hold a segment that is not tested.`, { side, modality, segment });
    }
    const row: Partial<Record<Segment, string>> = {};
    for (const segment of segments) {
      const cell = this.cell(input[segment], readings, { side, modality, segment });
      if (cell !== undefined) row[segment] = cell;
    }
    return row as Record<Segment, string>;
  }

  private cell(
    input: unknown,
    readings: CellReadings,
    where: Required<Pick<ExamIssue, 'side' | 'modality' | 'segment'>>,
  ): string | undefined {
    const name = `The ${cellName(where.side, where.modality, where.segment)}`;
    if (input === undefined || input === null || input === '') return this.report('missing', `${name} is missing.`, where);
    if (typeof input !== 'string') return this.report('not-text', `${name} must be text, as written on the sheet.`, where);
    if (readCell(readings, input) !== undefined) return input;
    const normal = readings.plain.length - 1;
    if (input === `${normal}*` || input === `${normal}**`) {
      return this.report('tag-on-normal', `${name} is normal, so it cannot have a tag.`, where);
    }
    return this.report('not-listed', `${name} holds no listed value: 0 to ${normal} or NT, with * or ** after an altered score.`, where);
  }

  private nonKey(input: unknown, side: Side): KeyMuscle | undefined {
    if (input === undefined || input === null) return undefined;
    const found = keyMuscles.find((muscle) => muscle === input);
    return (
      found ?? this.report('not-listed', `The ${side} non-key muscle must be one of ${keyMuscles.join(', ')}.`, { side, field: 'nonKey' })
    );
  }

  private observation(input: unknown, field: 'vac' | 'dap', name: string): Observation | undefined {
    if (input === undefined || input === null || input === '') return this.report('missing', `The ${name} is missing.`, { field });
    const found = observations.find((observation) => observation === input);
    return found ?? this.report('not-listed', `The ${name} must be Yes, No or NT.`, { field });
  }

  private flag(input: unknown, field: string): boolean | undefined {
    if (input === undefined || input === null || typeof input === 'boolean') return input ?? undefined;
    return this.report('not-listed', `${field} must be true or false.`, { field });
  }

  private number(input: unknown, field: string, least: number): number | undefined {
    if (input === undefined || input === null) return undefined;
    if (typeof input === 'number' && Number.isFinite(input) && input >= least) return input;
    return this.report('out-of-range', `${field} must be a finite number${least === 0 ? ', 0 or more' : ''}.`, { field });
  }

  private remark(input: unknown, field: string): Remark | undefined {
    if (input === undefined || input === null || typeof input === 'string') return input ?? undefined;
    if (!isFields(input)) return this.report('not-text', `${field} must be a code, or codes by cell.`, { field });
    const keys: readonly string[] = [...cellPlaces.map(({ key }) => key), 'vac', 'dap'];
    const entries = Object.entries(input).filter(([, code]) => code !== undefined);
    if (entries.some(([key]) => !keys.includes(key)))
      return this.report('unknown-segment', `${field} names a cell that is not on the sheet.`, { field });
    if (entries.some(([, code]) => typeof code !== 'string'))
      return this.report('not-text', `${field} must hold codes as text.`, { field });
    return Object.fromEntries(entries) as Partial<Record<CellKey, string>>;
  }

  private tagCauses(exam: Pick<Exam, Side>, tagCause: Remark | undefined): void {
    // A cell that is missing has been reported and has no tag to explain.
    const tagged = cellPlaces.filter((place) => (writtenIn(exam, place) as string | undefined)?.includes('*'));
    for (const place of tagged) {
      if (hasRemark(tagCause, place.key)) continue;
      const { side, modality, segment } = place;
      const name = cellName(side, modality, segment);
      this.report('tag-without-cause', `The ${name} has a tag, but no condition is named for it.`, { side, modality, segment });
    }
  }

  private unknownFields(input: Fields, known: readonly string[], owner: string, where: Where): void {
    for (const field of Object.keys(input)) {
      if (!known.includes(field))
        this.report('unknown-field', `${owner} has a field that does not belong to an exam.`, { ...where, field });
    }
  }
}
