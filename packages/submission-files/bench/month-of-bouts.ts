/** An invented month for measuring: participants, sessions and bouts that agree with each other and give no finding. */
import { exampleRow } from '@cairnstep/dictionary';
import type { Row } from '@cairnstep/dictionary';
import { tableFromRows, writeCsv } from '@cairnstep/submission-files';

export interface MonthSize {
  readonly participants: number;
  readonly sessionsEach: number;
  readonly boutsEach: number;
}

/** 20,000 sessions and 200,000 bouts. */
export const largeMonth: MonthSize = { participants: 400, sessionsEach: 50, boutsEach: 10 };

const codeOf = (person: number): string => `S${String(person).padStart(21, '0')}`;
const sessionKey = (person: number, session: number) => ({ participant: codeOf(person), session_day: session, session_no: session + 1 });

function boutOf(person: number, session: number, bout: number): Row {
  const seconds = 60 + ((person * 7 + session * 13 + bout * 31) % 97);
  const mps = 0.3 + ((person + session) % 20) / 100;
  const metres = Math.round(seconds * mps * 10) / 10;
  return {
    ...exampleRow('bouts'),
    ...sessionKey(person, session),
    bout_no: bout + 1,
    duration_s: seconds,
    distance_m: metres,
    steps: Math.round(metres / 0.45) + (bout % 3),
    treadmill_speed_mps: Math.round(mps * 100) / 100,
    hr_end: 90 + ((session + bout * 5) % 40),
    rest_after_s: 30,
  };
}

function sessionOf(person: number, session: number, bouts: readonly Row[]): Row {
  const sum = (key: string): number => bouts.reduce((total, bout) => total + Number(bout[key]), 0);
  return {
    ...exampleRow('sessions'),
    ...sessionKey(person, session),
    course_no: 1,
    upright_min: Math.ceil(sum('duration_s') / 60) + 5,
    steps_total: sum('steps'),
    distance_total_m: Math.round(sum('distance_m') * 10) / 10,
    hr_peak: 110 + (session % 40),
  };
}

const range = (length: number): number[] => Array.from({ length }, (_, index) => index);

function rowsOfMonth({ participants, sessionsEach, boutsEach }: MonthSize): { readonly sessions: Row[]; readonly bouts: Row[] } {
  const sessions: Row[] = [];
  const bouts: Row[] = [];
  for (const person of range(participants)) {
    for (const session of range(sessionsEach)) {
      const own = range(boutsEach).map((bout) => boutOf(person, session, bout));
      bouts.push(...own);
      sessions.push(sessionOf(person, session, own));
    }
  }
  return { sessions, bouts };
}

const encode = (text: string): Uint8Array => new TextEncoder().encode(text);

/** The month as files. */
export function monthOfBouts(size: MonthSize): {
  readonly participants: Uint8Array;
  readonly consents: Uint8Array;
  readonly sessions: Uint8Array;
  readonly bouts: Uint8Array;
} {
  const { participants } = size;
  const { sessions, bouts } = rowsOfMonth(size);
  const people = range(participants).map((person) => ({
    ...exampleRow('participants'),
    participant: codeOf(person),
    days_injury_to_index: 200 + person,
  }));
  const consents = range(participants).map((person) => ({ ...exampleRow('consents'), participant: codeOf(person) }));
  return {
    participants: encode(writeCsv(tableFromRows('participants', people))),
    consents: encode(writeCsv(tableFromRows('consents', consents))),
    sessions: encode(writeCsv(tableFromRows('sessions', sessions))),
    bouts: encode(writeCsv(tableFromRows('bouts', bouts))),
  };
}
