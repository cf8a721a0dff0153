/**
 * Seeded random exams for tests and benchmarks. Two kinds: `noise` draws every cell alone; `levelled` draws a level on
 * each side, normal above it, altered in a zone below it and mostly absent further down, as real exams look.
 */
import { cellPlaces } from '../src/cell-key.ts';
import type { Exam, Observation, SideExam } from '../src/exam.ts';
import { keyMuscles, levels, sensorySegments } from '../src/segments.ts';
import { motorTags, sensoryTags, withCell } from './open-cells.ts';

/** A small generator of repeatable fractions in [0, 1) (mulberry32, public domain, by Tommy Ettinger). */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

type Random = () => number;
const motorPlaces = cellPlaces.filter((place) => place.modality === 'motor');
type Cells<Segment extends string> = Record<Segment, string>;
interface OpenSide {
  lightTouch: Cells<(typeof sensorySegments)[number]>;
  pinPrick: Cells<(typeof sensorySegments)[number]>;
  motor: Cells<(typeof keyMuscles)[number]>;
  nonKey?: (typeof keyMuscles)[number];
}

function pick<T>(random: Random, from: readonly T[]): T {
  return from[Math.floor(random() * from.length)] as T;
}

function observation(random: Random, yes: number): Observation {
  return random() < yes ? 'Yes' : 'No';
}

function addNonKey(random: Random, side: OpenSide): SideExam {
  return random() < 0.15 ? { ...side, nonKey: pick(random, keyMuscles) } : side;
}

function noiseSide(random: Random): SideExam {
  const normal = random() < 0.5 ? 0.6 : 0.97;
  const sense = () => (random() < normal ? '2' : pick(random, ['0', '1', '2']));
  const grade = () => (random() < normal ? '5' : pick(random, ['0', '1', '2', '3', '4', '5']));
  return addNonKey(random, {
    lightTouch: Object.fromEntries(sensorySegments.map((s) => [s, sense()])) as OpenSide['lightTouch'],
    pinPrick: Object.fromEntries(sensorySegments.map((s) => [s, sense()])) as OpenSide['pinPrick'],
    motor: Object.fromEntries(keyMuscles.map((m) => [m, grade()])) as OpenSide['motor'],
  });
}

function levelledSide(random: Random, level: number, spared: number): SideExam {
  const zone = Math.floor(random() * 5);
  const sense = (index: number) => {
    if (index < level) return '2';
    if (index === level) return pick(random, ['0', '1', '1']);
    if (index <= level + zone) return pick(random, ['0', '1', '1', '2']);
    return random() < spared ? pick(random, ['1', '2']) : '0';
  };
  const motorFloor = level + Math.floor(random() * 3) - 1;
  const grade = (muscle: (typeof keyMuscles)[number]) => {
    const distance = levels.indexOf(muscle) - motorFloor;
    if (distance < 0) return '5';
    if (distance <= 2) return pick(random, ['1', '2', '3', '3', '4', '5']);
    return random() < spared ? pick(random, ['1', '2', '3', '4', '5']) : '0';
  };
  return addNonKey(random, {
    lightTouch: Object.fromEntries(sensorySegments.map((s, i) => [s, sense(i)])) as OpenSide['lightTouch'],
    pinPrick: Object.fromEntries(sensorySegments.map((s, i) => [s, sense(i)])) as OpenSide['pinPrick'],
    motor: Object.fromEntries(keyMuscles.map((m) => [m, grade(m)])) as OpenSide['motor'],
  });
}

/** One determinate exam. An earlier deficit is on record, as it is for anyone in a registry of injuries. */
export function randomExam(random: Random, kind: 'noise' | 'levelled'): Exam {
  if (kind === 'noise') {
    return {
      right: noiseSide(random),
      left: noiseSide(random),
      vac: observation(random, 0.5),
      dap: observation(random, 0.5),
      earlierDeficit: true,
    };
  }
  const level = Math.floor(random() * 29);
  const other = Math.max(0, Math.min(28, level + pick(random, [0, 0, 0, 1, -1, 2, -3, 6])));
  const spared = pick(random, [0, 0.1, 0.5, 0.95]);
  return {
    right: levelledSide(random, level, spared),
    left: levelledSide(random, other, spared),
    vac: observation(random, spared),
    dap: observation(random, spared),
    earlierDeficit: true,
  };
}

/** The same exam with one to four cells not tested, VAC and DAP among them. */
export function withUntested(random: Random, exam: Exam): Exam {
  let opened = exam;
  for (let count = 1 + Math.floor(random() * 4); count > 0; count--) {
    const draw = random();
    if (draw < 0.06) opened = { ...opened, vac: 'NT' };
    else if (draw < 0.12) opened = { ...opened, dap: 'NT' };
    else opened = withCell(opened, pick(random, draw < 0.55 ? motorPlaces : cellPlaces), 'NT');
  }
  return opened;
}

/** The same exam with one or two cells tagged. */
export function withTagged(random: Random, exam: Exam): Exam {
  let tagged = exam;
  for (let count = 1 + Math.floor(random() * 2); count > 0; count--) {
    const place = pick(random, random() < 0.5 ? motorPlaces : cellPlaces);
    tagged = withCell(tagged, place, pick(random, place.modality === 'motor' ? motorTags : sensoryTags));
  }
  return tagged;
}

/** The same exam with a given number of cells not tested, most of them key muscles, where they leave most open. */
export function withManyUntested(random: Random, exam: Exam, count: number): Exam {
  let opened = exam;
  const left = new Set(cellPlaces);
  for (let done = 0; done < count; done++) {
    const muscles = motorPlaces.filter((place) => left.has(place));
    const place = pick(random, muscles.length > 0 && random() < 0.6 ? muscles : [...left]);
    left.delete(place);
    opened = withCell(opened, place, 'NT');
  }
  return opened;
}
