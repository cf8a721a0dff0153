import type { Submission } from '@cairnstep/contract';
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { fakeApi, refusal } from '../../testing/fake-api.ts';
import { renderRoutes } from '../../testing/render.tsx';
import { Announcer } from '../../ui/announcer.tsx';
import { checked, coordinator, error, fileOf, sample, submissionId, therapist } from './sample-submission.ts';
import SubmitPage from './submit-page.tsx';

const path = `/api/submissions/${submissionId}`;
const withErrors = checked({ findings: [error], preview: null });

let id = 0;
const finding = (more: object) => ({
  id: (id += 1),
  rule: 'F21',
  severity: 'error',
  table: 'sessions',
  line: 5,
  column: 'hr_rest',
  found: 'A number above 250.',
  mend: error.mend,
  ...more,
});
const places = [
  finding({}),
  finding({ line: 7 }),
  finding({ line: 7, rule: 'T18' }),
  finding({ line: 8, column: 'status' }),
  finding({ line: null }),
  finding({ line: 9, column: 'colour' }),
  finding({ table: null, line: null, column: null }),
];

function open(answers: Readonly<Record<string, unknown>> = {}, submission: Submission = withErrors) {
  const asked = fakeApi({
    'GET /api/account': coordinator,
    [`GET ${path}`]: submission,
    [`GET ${path}/findings`]: { items: places, page: 1, pageSize: 50, total: places.length },
    ...answers,
  });
  const element = (
    <>
      <SubmitPage />
      <Announcer />
    </>
  );
  renderRoutes([{ path: '/submit/:submissionId', element }], `/submit/${submissionId}`);
  return asked;
}
const press = async (name: string | RegExp) => fireEvent.click(await screen.findByRole('button', { name }));
const field = (name: string) => screen.getByRole<HTMLInputElement>('textbox', { name });
const type = (name: string, value: string) => fireEvent.change(field(name), { target: { value } });
const posted = (asked: ReturnType<typeof open>) =>
  asked.filter(({ method }) => method === 'POST').map(({ path: at, body }) => [at.slice(path.length), body]);

describe('a cell with a finding', () => {
  it('is offered for mending once, where it has a line and a column of the dictionary', async () => {
    open();
    await screen.findByRole('button', { name: 'Mend hr_rest in line 5 of sessions' });
    expect(screen.getAllByRole('button', { name: /^Mend / }).map((button) => button.getAttribute('aria-label'))).toEqual([
      'Mend hr_rest in line 5 of sessions',
      'Mend hr_rest in line 7 of sessions',
      'Mend status in line 8 of sessions',
    ]);
    expect(screen.getByText('as above')).toBeTruthy();
  });

  it('says what is expected in it, takes the keyboard, and says at once what cannot be read', async () => {
    open();
    await press('Mend hr_rest in line 5 of sessions');
    const input = field('New value of hr_rest, line 5');
    expect(document.activeElement).toBe(input);
    expect(screen.getByText(/: a whole number, \d+ to \d+ beats\/min/)).toBeTruthy();
    type('New value of hr_rest, line 5', 'fast');
    expect(screen.getByText('Write a number without unit or sign of thousands.')).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Apply 1 change and check again' }).hasAttribute('disabled')).toBe(true);
    type('New value of hr_rest, line 5', '64');
    expect(screen.getByRole('button', { name: 'Apply 1 change and check again' }).hasAttribute('disabled')).toBe(false);
  });

  it('gives a list to choose from where there are codes', async () => {
    open();
    await press('Mend status in line 8 of sessions');
    const list = screen.getByRole('button', { name: /New value of status, line 8/ });
    expect(document.activeElement).toBe(list);
    fireEvent.click(list);
    expect(screen.getAllByRole('option').map(({ textContent }) => textContent)).toContain('completed');
  });

  it('is not offered to be left empty where it was found empty and its row needs it', async () => {
    const empty = [
      finding({ rule: 'F20', line: 3, column: 'hr_rest', found: 'An empty cell.' }),
      finding({ rule: 'F20', line: 4, column: 'surface', table: 'bouts', found: 'An empty cell.' }),
      finding({ rule: 'F11', line: 5, column: 'surface', table: 'bouts', found: 'None of the codes.' }),
    ];
    const files = [...withErrors.files, fileOf('bouts')];
    open({ [`GET ${path}/findings`]: { items: empty, page: 1, pageSize: 50, total: empty.length } }, { ...withErrors, files });
    const codesAt = async (line: number) => {
      await press(`Mend surface in line ${line} of bouts`);
      fireEvent.click(screen.getByRole('button', { name: new RegExp(`New value of surface, line ${line}`) }));
      const codes = screen.getAllByRole('option').map(({ textContent }) => textContent);
      fireEvent.keyDown(screen.getByRole('listbox'), { key: 'Escape' });
      return codes;
    };
    expect(await codesAt(4)).not.toContain('Leave the cell empty');
    expect(screen.getByText(/It is empty now, and its row needs it\./).textContent).not.toContain('May be empty');
    expect(await codesAt(5)).toContain('Leave the cell empty');
    expect(screen.getByText(/May be empty\. What it holds now stands only in the file: look there\./)).toBeTruthy();
  });

  it('goes on to the next with Enter and takes back what was typed with Escape', async () => {
    open();
    await press('Mend hr_rest in line 5 of sessions');
    type('New value of hr_rest, line 5', '64');
    fireEvent.keyDown(field('New value of hr_rest, line 5'), { key: 'Enter' });
    expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Mend hr_rest in line 7 of sessions' }));
    fireEvent.keyDown(field('New value of hr_rest, line 5'), { key: 'Escape' });
    expect(await screen.findByRole('button', { name: 'Mend hr_rest in line 5 of sessions' })).toBeTruthy();
    expect(screen.queryByRole('group', { name: 'Changes not applied yet' })).toBeNull();
  });

  it('is not offered where the file was not kept', async () => {
    const files = withErrors.files.map((file) => ({ ...file, refused: true }));
    open({}, { ...withErrors, files });
    await screen.findByRole('row', { name: /^Sessions 5 hr_rest/ });
    expect(screen.queryByRole('button', { name: /^Mend / })).toBeNull();
  });

  it('is not offered to whoever only looks', async () => {
    open({ 'GET /api/account': therapist });
    await screen.findByRole('row', { name: /^Sessions 5 hr_rest/ });
    expect(screen.queryByRole('button', { name: /^Mend / })).toBeNull();
  });
});

describe('changes typed', () => {
  const mends = [
    { table: 'sessions', line: 5, column: 'hr_rest', value: '64' },
    { table: 'sessions', line: 7, column: 'hr_rest', value: '66' },
  ];
  async function typeBoth(): Promise<void> {
    for (const { line, value } of mends) {
      await press(`Mend hr_rest in line ${line} of sessions`);
      type(`New value of hr_rest, line ${line}`, value);
    }
  }

  it('are sent all together, and checked again', async () => {
    const checking = sample({ status: 'checking', files: withErrors.files, progress: { step: 'read', done: 0, of: 1 } });
    const asked = open({ [`POST ${path}/mends`]: sample({ files: withErrors.files }), [`POST ${path}/check`]: checking });
    await typeBoth();
    await press('Apply 2 changes and check again');
    await waitFor(() =>
      expect(posted(asked)).toEqual([
        ['/mends', { mends }],
        ['/check', {}],
      ]),
    );
    expect(await screen.findByRole('progressbar', { name: 'Checking' })).toBeTruthy();
    await waitFor(() => expect(document.activeElement).toBe(screen.getByRole('button', { name: /^Check November 2026/ })));
  });

  it('stay when they are refused, with the reason', async () => {
    const asked = open({ [`POST ${path}/mends`]: () => refusal('identifies-somebody', 'Nothing of it was kept.') });
    await typeBoth();
    await press('Apply 2 changes and check again');
    const bar = screen.getByRole('group', { name: 'Changes not applied yet' });
    expect((await within(bar).findByRole('alert')).textContent).toContain('Nothing of it was kept.');
    expect(field('New value of hr_rest, line 7').value).toBe('66');
    expect(posted(asked)).toHaveLength(1);
  });

  it('outlast another page of findings, and can be dropped', async () => {
    open();
    await typeBoth();
    fireEvent.click(screen.getByRole('link', { name: /places of rule F21/ }));
    expect(await screen.findByText(/2 changes typed, not applied yet/)).toBeTruthy();
    await press('Drop them');
    expect(screen.queryByRole('group', { name: 'Changes not applied yet' })).toBeNull();
  });
});
