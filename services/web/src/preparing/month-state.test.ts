import { describe, expect, it } from 'vitest';
import { isOfAnotherMonth, isUnsaved, obstacleOf, obstacleToSending, reduceMonth, startState, worthALook } from './month-state.ts';
import type { MonthState } from './month-state.ts';
import type { KeyPicture, PreparedPicture, SourcePicture } from './worker/protocol.ts';

const key: KeyPicture = {
  keyId: '2026-12',
  revision: 1,
  mode: 'random',
  idType: 'mrn',
  stripLeadingZeros: false,
  people: 2,
  peopleWithFirstDay: 2,
  secrets: 1,
  tables: [],
  isUnsaved: false,
  changes: null,
  lacking: null,
  codesToReplace: 0,
};
const source: SourcePicture = {
  id: 1,
  fileName: 'sessions.csv',
  sheet: null,
  table: 'sessions',
  rows: 1,
  columns: 1,
  encoding: 'utf-8',
  delimiter: ',',
  fittingDelimiters: [],
  decimalMark: '.',
  hasBothMarks: false,
  notes: [],
};
const prepared: PreparedPicture = {
  tables: [{ table: 'sessions', rows: 1, rowsInFile: 1, people: 1, bytes: 1, digest: '', headers: [], firstRows: [], words: [] }],
  columns: [],
  problems: [],
  findings: [],
  firstDays: [],
  emptyTables: [],
  rowsLeftBehind: 0,
  people: 1,
  newPeople: 1,
  newToKey: null,
  agesTopCoded: 0,
  lengthChange: null,
  rowsInMonth: { table: 'sessions', inside: 1, dated: 1 },
};
const problem = {
  kind: 'unreadable-cell',
  table: 'sessions',
  header: 'x',
  columnNumber: 1,
  variable: 'status',
  lines: [2],
  count: 1,
  message: '',
} as const;
const picture = { key, sources: [source], refused: [] };
const ready: MonthState = { ...startState, picture, prepared };

describe('files', () => {
  it('have to have a table each, and no two the same; sheets that are none of the month do not matter', () => {
    expect(obstacleOf([source])).toBeNull();
    expect(obstacleOf([{ ...source, table: null }])).toContain('sessions.csv');
    expect(obstacleOf([source, { ...source, id: 2, sheet: 'Rota', table: null }])).toBeNull();
    expect(obstacleOf([source, { ...source, id: 2 }])).toContain('the same table');
  });
});

describe('sending', () => {
  it('is possible once everything is there, and not before', () => {
    expect(obstacleToSending(ready, false)).toBeNull();
    expect(obstacleToSending({ ...ready, isStale: true }, false)).toContain('Wait');
    expect(obstacleToSending({ ...ready, prepared: null }, false)).toContain('Wait');
    expect(obstacleToSending({ ...ready, prepared: { ...prepared, tables: [] } }, false)).toContain('No row');
  });

  it('waits for the key file', () => {
    const unsaved = { ...ready, picture: { ...picture, key: { ...key, isUnsaved: true } } };
    expect(obstacleToSending(unsaved, false)).toBe('Save the key file first.');
  });

  it('waits until somebody has looked at what stays behind', () => {
    const withProblem = { ...ready, prepared: { ...prepared, problems: [problem] } };
    expect(obstacleToSending(withProblem, false)).toContain('looked at');
    expect(obstacleToSending(withProblem, true)).toBeNull();
  });

  it('waits until somebody has looked at record numbers of a new length, and at a key that may be an older copy', () => {
    const lengthChange = { ids: 240, newLengths: 18 };
    expect(obstacleToSending({ ...ready, prepared: { ...prepared, lengthChange } }, false)).toContain('looked at');
    expect(worthALook({ ...prepared, lengthChange: { ids: 240, newLengths: 0 } }, key)).toEqual([]);
    const lacking = { missing: 1, of: 2 };
    const older = { ...ready, picture: { ...picture, key: { ...key, lacking } } };
    expect(obstacleToSending(older, false)).toContain('looked at');
    expect(obstacleToSending(older, true)).toBeNull();
  });

  it('waits until somebody has looked at files that are mostly of another month, and says that first', () => {
    const of = (inside: number) => ({ ...prepared, problems: [problem], rowsInMonth: { table: 'sessions' as const, inside, dated: 111 } });
    expect(worthALook(of(0), key)[0]).toContain('another month: 0 of 111 rows of Sessions');
    expect(worthALook(of(56), key)).toHaveLength(1);
    const wrong = { ...ready, prepared: { ...of(0), problems: [] } };
    expect(obstacleToSending(wrong, false)).toContain('looked at');
    expect(obstacleToSending(wrong, true)).toBeNull();
  });

  it('waits, where nobody says whom the registry holds, until somebody has looked at a key that knows fewer than half of the people', () => {
    const offline = { ...prepared, people: 5 };
    expect(worthALook({ ...offline, newToKey: 2 }, key)).toEqual([]);
    expect(worthALook({ ...offline, newToKey: 3 }, key)).toEqual([expect.stringContaining('knows 2 of the 5 people')]);
    const stranger = { ...ready, prepared: { ...offline, newToKey: 5 } };
    expect(obstacleToSending(stranger, false)).toContain('looked at');
    expect(obstacleToSending(stranger, true)).toBeNull();
  });

  it('is not possible where a file would be sent without its rows', () => {
    expect(obstacleToSending({ ...ready, prepared: { ...prepared, emptyTables: ['bouts'] } }, true)).toContain('cannot be prepared');
    const unknown = { ...problem, kind: 'no-participant-column' as const };
    expect(obstacleToSending({ ...ready, prepared: { ...prepared, problems: [unknown] } }, true)).toContain('cannot be prepared');
  });
});

it('is of another month where less than half of the training is of the one prepared', () => {
  expect(isOfAnotherMonth({ table: 'sessions', inside: 4, dated: 9 })).toBe(true);
  expect(isOfAnotherMonth({ table: 'sessions', inside: 4, dated: 8 })).toBe(false);
});

describe('leaving the page', () => {
  it('loses files that were not sent, a key that was not saved and codes the registry does not know of', () => {
    const sent = { kind: 'sending', state: 'done', done: 1, of: 1, message: null } as const;
    expect(isUnsaved(startState)).toBe(false);
    expect(isUnsaved({ ...ready, picture: { ...picture, sources: [] } })).toBe(false);
    expect(isUnsaved(ready)).toBe(true);
    expect(isUnsaved({ ...ready, sending: sent })).toBe(false);
    expect(isUnsaved({ ...ready, sending: sent, picture: { ...picture, key: { ...key, isUnsaved: true } } })).toBe(true);
    expect(isUnsaved({ ...ready, sending: sent, picture: { ...picture, key: { ...key, codesToReplace: 1 } } })).toBe(true);
  });
});

describe('the month', () => {
  it('keeps the last preview in sight while a newer one is worked out, and forgets what was said of sending', () => {
    const sending = { kind: 'sending', state: 'failed', done: 0, of: 1, message: 'x' } as const;
    const changed = reduceMonth({ ...ready, sending, refusal: 'y' }, { kind: 'changed' });
    expect(changed).toMatchObject({ prepared, isStale: true, sending: null, refusal: null });
    expect(reduceMonth(changed, { kind: 'prepared', picture, prepared })).toMatchObject({ isStale: false, progress: null });
    expect(reduceMonth(changed, { kind: 'nothing-to-prepare' })).toMatchObject({ prepared: null, isStale: false });
    expect(reduceMonth(changed, { kind: 'refused', message: 'z' })).toMatchObject({ isStale: true, refusal: 'z' });
  });
});
