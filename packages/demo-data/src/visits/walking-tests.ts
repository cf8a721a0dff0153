/** Results of the walking tests of one visit, without the device and in it. */
import { helpAtLevel } from '@cairnstep/scoring';
import type { Person } from '../people/person.ts';
import { walkingLevel } from '../people/walking.ts';
import type { Random } from '../random.ts';
import { clamp, rounded } from '../rows.ts';
import type { Cells } from '../rows.ts';
import type { Visit } from './visit.ts';

interface Help {
  readonly aid: string;
  readonly brace: string;
  readonly assist_persons: number;
}

/** Longest timed up and go that a clinic waits for, in seconds; a person who would take longer is unable. */
const longestUpAndGo = 170;
const sixMinutes = 360;

function timedWalk(random: Random, person: Person, measure: string, speed: number, trial: number, help: Help): Cells {
  const { timedDistance, start } = person.site;
  const seconds = rounded(timedDistance / (speed * random.between(0.98, 1.02)), 1);
  return {
    measure,
    trial_no: trial,
    attempt_status: 'done',
    value: rounded(timedDistance / seconds, 3),
    ...help,
    timed_distance_m: timedDistance,
    time_s: seconds,
    start_type: start,
  };
}

/** Six minutes are walked more slowly than ten metres (Forrest et al., PLoS ONE 2014;9:e94108). */
function sixMinuteWalk(random: Random, person: Person, speed: number, help: Help): Cells {
  const stopped = random.chance(0.05);
  const seconds = stopped ? random.whole(110, 340) : sixMinutes;
  const mean = speed * random.between(0.72, 0.98);
  const scale = person.site.exertionScale;
  const exertion = stopped || random.chance(0.15) ? null : scale === 'cr10' ? random.whole(6, 14) / 2 : random.whole(11, 16);
  return {
    measure: 'six_mwt',
    trial_no: 1,
    attempt_status: stopped ? 'stopped_early' : 'done',
    value: rounded(mean * seconds, 1),
    ...help,
    seconds_walked: seconds,
    rests: speed < 0.3 ? random.whole(0, 3) : random.pick([0, 0, 0, 1]),
    ...(exertion === null ? {} : { rpe_end: exertion, rpe_scale: scale }),
  };
}

function upAndGo(random: Random, seconds: number, help: Help): Cells {
  if (seconds > longestUpAndGo) return { measure: 'tug', trial_no: 1, attempt_status: 'unable_physical' };
  return {
    measure: 'tug',
    trial_no: 1,
    attempt_status: 'done',
    value: rounded(seconds, 1),
    ...help,
    chair_arms: random.chance(0.9) ? 'yes' : null,
  };
}

function notDone(measure: string, status: string, trial = 1): Cells {
  return { measure, trial_no: trial, attempt_status: status };
}

const allTests = ['tmwt_ss', 'tmwt_fast', 'six_mwt', 'tug'];

/** Without the device. Whoever does not walk is recorded as unable, once for each test that is tried. */
function deviceFree(random: Random, person: Person, visit: Visit, independence: number): Cells[] {
  const { speed } = visit;
  const level = walkingLevel(speed, independence);
  const index: Cells = { measure: 'wisci2', trial_no: 1, attempt_status: 'done', value: level, level_basis: 'self_selected' };
  const helped = helpAtLevel(level === 0 ? 1 : level);
  if (speed === null || !helped) {
    return [...allTests.map((measure) => notDone(measure, random.chance(0.93) ? 'unable_physical' : 'not_attempted')), index];
  }
  const help: Help = { aid: helped.aid, brace: helped.brace ? 'yes' : 'no', assist_persons: helped.persons };
  const fast = speed * random.between(1.15, 1.45);
  const trials = Array.from({ length: person.site.trials }, (_, trial) => trial + 1);
  return [
    ...trials.map((trial) => timedWalk(random, person, 'tmwt_ss', speed, trial, help)),
    ...trials.map((trial) => timedWalk(random, person, 'tmwt_fast', fast, trial, help)),
    sixMinuteWalk(random, person, speed, help),
    upAndGo(random, (6 / speed) * random.between(1.1, 1.5) + random.between(4, 10), help),
    index,
  ].map((cells) =>
    random.chance(0.02)
      ? notDone(String(cells['measure']), random.pick(['unable_other', 'not_attempted']), Number(cells['trial_no']))
      : cells,
  );
}

/**
 * In a powered device: 0.12-0.20 m/s at the first and 0.17-0.30 m/s at the last session (Gagnon et al., J Neuroeng Rehabil 2018,
 * doi 10.1186/s12984-018-0354-2), up to 0.6 m/s after twelve weeks (Khan et al., same journal 2019, doi
 * 10.1186/s12984-019-0585-x).
 */
function inDevice(random: Random, person: Person, visit: Visit, aptitude: number): Cells[] {
  const speed = clamp(0.16 + 0.04 * aptitude + (0.13 + 0.05 * aptitude) * visit.progress + random.around(0, 0.015), 0.08, 0.6);
  const help: Help = {
    aid: visit.progress > 0.5 && aptitude > 0 ? 'two_crutches' : 'walker',
    brace: 'no',
    assist_persons: visit.progress < 1 ? 1 : 0,
  };
  return [
    timedWalk(random, person, 'tmwt_ss', speed, 1, help),
    sixMinuteWalk(random, person, speed, help),
    upAndGo(random, (6 / speed) * random.between(1.2, 1.8) + random.between(10, 25), help),
  ];
}

export interface WalkingHabit {
  /** 0 to 1: how little help the person takes for the speed reached. */
  readonly independence: number;
  /** -1 to 1: how apt the person is with a powered device. */
  readonly aptitude: number;
}

export function walkingTestCells(random: Random, person: Person, visit: Visit, habit: WalkingHabit): Cells[] {
  const free = deviceFree(random, person, visit, habit.independence).map((cells) => ({ in_device: 'no', ...cells }));
  const powered = visit.powered ? inDevice(random, person, visit, habit.aptitude).map((cells) => ({ in_device: 'yes', ...cells })) : [];
  return [...free, ...powered];
}
