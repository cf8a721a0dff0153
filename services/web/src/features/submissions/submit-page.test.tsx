import type { Submission } from '@cairnstep/contract';
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { fakeApi, json, refusal } from '../../testing/fake-api.ts';
import { fakeUpload } from '../../testing/fake-upload.ts';
import { renderRoutes } from '../../testing/render.tsx';
import { Announcer } from '../../ui/announcer.tsx';
import MonthPage from './month-page.tsx';
import ReceiptPage from './receipt-page.tsx';
import { fakeLookWorker } from './fake-look-worker.ts';
import {
  checked,
  coordinator,
  error,
  fileOf,
  receipt,
  sample,
  sampleWorkbook,
  submissionId,
  therapist,
  warning,
} from './sample-submission.ts';
import SubmitPage from './submit-page.tsx';

const path = `/api/submissions/${submissionId}`;
const safeHeaders = `GET /api/sites/${sample().site.id}/safe-headers`;
const places = { items: [], page: 1, pageSize: 50, total: 0 };

const routes = [
  { path: '/submit/:submissionId', element: <SubmitPage /> },
  { path: '/submissions/:submissionId/receipt', element: <ReceiptPage /> },
  { path: '/month', element: <MonthPage /> },
].map(({ path: at, element }) => ({
  path: at,
  element: (
    <>
      {element}
      <Announcer />
    </>
  ),
}));

function open(submission: Submission, answers: Readonly<Record<string, unknown>> = {}, address = `/submit/${submissionId}`) {
  const asked = fakeApi({
    'GET /api/account': coordinator,
    [`GET ${path}`]: submission,
    [`GET ${path}/findings`]: places,
    [safeHeaders]: { headers: [] },
    ...answers,
  });
  fakeUpload();
  fakeLookWorker();
  return { asked, router: renderRoutes(routes, address) };
}

async function choose(...files: readonly File[]): Promise<void> {
  await screen.findByRole('button', { name: 'Choose files' });
  const input = document.querySelector('input[type=file]');
  if (input === null) throw new Error('no input takes files');
  fireEvent.change(input, { target: { files } });
}

const csv = (name: string) => new File(['participant\r\n'], name, { type: 'text/csv' });
const said = () =>
  screen
    .getAllByRole('status')
    .map(({ textContent }) => textContent)
    .join(' ');
const heading = (name: string | RegExp) => screen.findByRole('heading', { name });
const press = async (name: string | RegExp) => fireEvent.click(await screen.findByRole('button', { name }));
const puts = (asked: ReturnType<typeof open>['asked']) =>
  asked.filter(({ method }) => method === 'PUT').map(({ path: at, search }) => `${at.slice(path.length)}${search}`);

describe('files of a month', () => {
  it('go to the tables their names tell, all at once, when the reader says so', async () => {
    const { asked } = open(sample(), {
      [`PUT ${path}/files/sessions`]: sample({ files: [fileOf('sessions')] }),
      [`PUT ${path}/files/adverse_events`]: sample({ files: [fileOf('sessions'), fileOf('adverse_events')] }),
    });
    await choose(csv('S01 sessions.csv'), csv('adverse-events.csv'));
    expect(puts(asked)).toEqual([]);
    await press('Send 2 files');
    await waitFor(() => expect(screen.queryByRole('list', { name: 'Files not sent yet' })).toBeNull());
    expect(puts(asked)).toEqual(['/files/sessions?fileName=S01+sessions.csv', '/files/adverse_events?fileName=adverse-events.csv']);
    await waitFor(() => expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Check November 2026' })));
  });

  it('wait for the reader when a name does not tell, or two are for one table', async () => {
    open(sample());
    await choose(csv('november.csv'));
    expect(await screen.findByText('Choose the table of november.csv.')).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Send 1 file' }).hasAttribute('disabled')).toBe(true);
    await press('Leave out november.csv');
    await choose(csv('bouts.csv'), csv('bouts (2).csv'));
    expect(await screen.findByText(/Two files are for the same table/)).toBeTruthy();
  });

  it('stay with their reason when they are refused, while others arrive', async () => {
    const { asked } = open(sample(), {
      [`PUT ${path}/files/sessions`]: () => refusal('too-large', 'A file may hold at most 50 MB. Nothing was kept.'),
      [`PUT ${path}/files/bouts`]: sample({ files: [fileOf('bouts')] }),
    });
    await choose(csv('sessions.csv'), csv('bouts.csv'));
    await press('Send 2 files');
    expect(await screen.findByText('A file may hold at most 50 MB. Nothing was kept.')).toBeTruthy();
    await waitFor(() => expect(puts(asked)).toHaveLength(2));
    const left = within(screen.getByRole('list', { name: 'Files not sent yet' })).getAllByRole('listitem');
    expect(left).toHaveLength(1);
    expect(left[0]?.textContent).toContain('sessions.csv');
  });

  it('are listed with size, rows and digest beside the tables that have none, and can be taken out', async () => {
    const { asked } = open(checked({ files: [{ ...fileOf('sessions', 1_204), mended: 2 }] }), {
      [`DELETE ${path}/files/sessions`]: sample(),
    });
    const files = await screen.findByRole('list', { name: 'Files sent' });
    expect(files.textContent).toContain('2.4\u00A0kB, 1\u202F204 rows, 2 cells mended on screen, SHA-256 abababababab');
    expect(within(files).getAllByRole('listitem')).toHaveLength(1);
    expect(screen.getByText(/^No file sent yet for: participants, consents, /).textContent).not.toMatch(/\bsessions\b/);
    await press('Take out the file of sessions');
    const question = screen.getByRole('alertdialog', { name: 'Take out the file of sessions?' });
    expect(question.textContent).toContain('2 cells mended on this page are lost with the old file.');
    expect(asked.some(({ method }) => method === 'DELETE')).toBe(false);
    await press('Take it out');
    expect(await screen.findByText('No file yet.')).toBeTruthy();
    expect(asked.some(({ method }) => method === 'DELETE')).toBe(true);
  });

  it('may be one workbook, whose tables are known after the check', async () => {
    const sent = { ...fileOf('sessions'), table: null, tables: null, fileName: 'month.xlsx' };
    const { asked } = open(sample(), {
      [`PUT ${path}/workbook`]: sample({ files: [sent] }),
      [`DELETE ${path}/workbook`]: sample(),
    });
    await choose(await sampleWorkbook());
    expect(screen.getByText(/a workbook: each of its sheets is a table/)).toBeTruthy();
    await press('Send 1 file');
    await waitFor(() => expect(puts(asked)).toEqual(['/workbook?fileName=month.xlsx']));
    expect((await screen.findByRole('list', { name: 'Files sent' })).textContent).toContain('month.xlsx');
    expect(screen.queryByText(/^No file yet/)).toBeNull();
    await press('Take out the workbook');
    expect(await screen.findByText('No file yet.')).toBeTruthy();
  });

  it('are sent under their own names only where these are made of words of the registry', async () => {
    const { asked } = open(sample(), { [`PUT ${path}/files/bouts`]: sample({ files: [fileOf('bouts')] }) });
    await choose(csv('bouts of Jane Roe 12-05-1961.csv'));
    expect(screen.getByText('bouts of Jane Roe 12-05-1961.csv')).toBeTruthy();
    await press('Send 1 file');
    await waitFor(() => expect(puts(asked)).toEqual(['/files/bouts?fileName=bouts.csv']));
  });

  it('that were not kept say why and what to do', async () => {
    open(checked({ files: [{ ...fileOf('sessions'), refused: true }] }));
    expect((await screen.findByRole('list', { name: 'Files sent' })).textContent).toContain(
      'Not kept: it held something that identifies a person',
    );
  });

  it('can begin with the template of the month', async () => {
    open(sample());
    const link = await screen.findByRole('link', { name: 'Download the template of November 2026' });
    expect(link.getAttribute('href')).toBe(`/api/sites/${sample().site.id}/template?month=2026-11`);
  });

  it('come with the caution that the clinic’s protocol is first', async () => {
    open(sample());
    expect(await screen.findByText('Serious events go to the clinic first.')).toBeTruthy();
  });
});

describe('the check', () => {
  it('is found again under way, shows how far it is, and says what it found when it ends', async () => {
    const checking = sample({
      status: 'checking',
      files: [fileOf('sessions'), fileOf('bouts')],
      progress: { step: 'read', done: 1, of: 2 },
    });
    let asks = 0;
    open(checking, { [`GET ${path}`]: () => json(asks++ === 0 ? checking : checked()) });
    const bar = await screen.findByRole('progressbar', { name: 'Checking' });
    expect(bar.getAttribute('aria-valuetext')).toBe('reading file 2 of 2');
    expect(screen.queryByRole('button', { name: /^Take out/ })).toBeNull();
    await waitFor(() => expect(said()).toContain('The check has finished. Nothing was found.'), {
      timeout: 5_000,
    });
  });

  it('cannot begin without a file', async () => {
    open(sample());
    expect((await screen.findByRole('button', { name: 'Check November 2026' })).hasAttribute('disabled')).toBe(true);
    expect(screen.getByText('Add at least one file, then check it.')).toBeTruthy();
  });
});

describe('findings', () => {
  const withFindings = checked({ findings: [error, warning], preview: null });

  it('stand by rule with what to do, and lead to their places', async () => {
    const { asked, router } = open(withFindings);
    expect(await screen.findByRole('heading', { name: error.statement })).toBeTruthy();
    expect(screen.getAllByText(error.mend).length).toBeGreaterThan(0);
    fireEvent.click(screen.getByRole('link', { name: '3 places of rule F21' }));
    await waitFor(() => expect(router.state.location.search).toBe('?rule=F21'));
    await waitFor(() => expect(asked.at(-1)?.search).toContain('rule=F21'));
    expect(document.activeElement).toBe(screen.getByRole('group', { name: 'Places in the files' }));
  });

  it('name file, line and column, narrowed by the address', async () => {
    const item = {
      id: 1,
      rule: 'F21',
      severity: 'error',
      table: 'sessions',
      line: 5,
      column: 'pain_post',
      found: 'A number above 10.',
      mend: error.mend,
    };
    const { asked } = open(
      withFindings,
      { [`GET ${path}/findings`]: { items: [item], page: 2, pageSize: 50, total: 51 } },
      `/submit/${submissionId}?in=sessions&severity=error&page=2`,
    );
    expect(await screen.findByRole('row', { name: /^Sessions 5 pain_post A number above 10\./ })).toBeTruthy();
    expect(screen.getByRole('link', { name: 'pain_post' }).getAttribute('href')).toBe('/dictionary/sessions/pain_post');
    const question = new URLSearchParams(asked.find(({ path: at }) => at.endsWith('/findings'))?.search);
    expect(Object.fromEntries(question)).toEqual({ table: 'sessions', severity: 'error', page: '2' });
  });

  it('begin with what tells who somebody is', async () => {
    const identifying = { ...error, rule: 'F50', statement: 'Nothing in a file identifies a person.' };
    open(checked({ findings: [error, identifying, warning], preview: null }));
    await screen.findByRole('heading', { name: identifying.statement });
    expect(screen.getAllByRole('heading', { level: 4 }).map(({ textContent }) => textContent)).toEqual([
      identifying.statement,
      error.statement,
      warning.statement,
    ]);
  });

  it('can be taken along as a list and in the cells of the files', async () => {
    open(withFindings);
    const link = async (name: RegExp) => (await screen.findByRole('link', { name })).getAttribute('href');
    expect(await link(/^Download the findings as CSV/)).toBe(`${path}/findings.csv`);
    expect(await link(/findings in their cells/)).toBe(`${path}/findings.xlsx`);
  });

  it('ask for no reason while errors would begin them anew', async () => {
    open(withFindings);
    await screen.findByRole('heading', { name: warning.statement });
    expect(screen.queryByRole('textbox', { name: /Why these stand/ })).toBeNull();
    expect(await screen.findByText(/The errors above keep the month out/)).toBeTruthy();
  });

  it('of warnings take a reason of a few words, and only then let the month in', async () => {
    const kept = { ...warning, acknowledgedReason: 'Short steps are right.' };
    const { asked } = open(checked({ findings: [warning] }), { [`POST ${path}/acknowledgements`]: checked({ findings: [kept] }) });
    const reason = await screen.findByRole('textbox', { name: /Why these stand/ });
    expect(screen.queryByRole('button', { name: 'Commit November 2026' })).toBeNull();
    fireEvent.change(reason, { target: { value: 'ok' } });
    await press(/^Keep this reason/);
    expect(screen.getByRole('alert').textContent).toContain('Say in a few words why these stand');
    fireEvent.change(reason, { target: { value: 'Ask jane.roe@clinic.example' } });
    await press(/^Keep this reason/);
    expect(await screen.findAllByText(/^It holds an e-mail address\. Nothing was sent\./)).toHaveLength(2);
    expect(asked.some(({ method }) => method === 'POST')).toBe(false);
    fireEvent.change(reason, { target: { value: 'Short steps are right.' } });
    await press(/^Keep this reason/);
    expect(await screen.findByRole('button', { name: 'Commit November 2026' })).toBeTruthy();
    expect(asked.find(({ method }) => method === 'POST')?.body).toEqual({ rule: 'T04', reason: 'Short steps are right.' });
  });
});

describe('the review', () => {
  it('warns of rows that would be removed, and opens the rows of a number', async () => {
    const removed = {
      kind: 'removed',
      line: null,
      key: { participant: 'SX', session_day: '-3', session_no: '1' },
      cells: [{ column: 'status', before: 'completed', after: null }],
    };
    open(
      checked(),
      { [`GET ${path}/changes`]: { items: [removed], page: 1, pageSize: 50, total: 1 } },
      `/submit/${submissionId}?changes=sessions&kind=removed`,
    );
    expect(await screen.findByText('1 row would be removed from the registry.')).toBeTruthy();
    expect(screen.getByRole('link', { name: '2 changed rows of sessions' }).getAttribute('href')).toContain(
      'changes=sessions&kind=changed',
    );
    const row = await screen.findByRole('row', { name: /^SX \u22123 1 Removed from the registry/ });
    expect(row.textContent).toContain('What became of the session: completed');
  });

  it('says of a changed value what it was and what it becomes', async () => {
    const changed = {
      kind: 'changed',
      line: 7,
      key: { participant: 'SX', session_day: '4', session_no: '1' },
      cells: [{ column: 'steps_total', before: '410', after: null }],
    };
    open(
      checked(),
      { [`GET ${path}/changes`]: { items: [changed], page: 1, pageSize: 50, total: 1 } },
      `/submit/${submissionId}?changes=sessions&kind=changed`,
    );
    expect((await screen.findByRole('row', { name: /^7 SX 4 1/ })).textContent).toMatch(/410 becomes empty$/);
  });
});

describe('the commit', () => {
  it('names month, site and consequence, commits just what was reviewed, and leads to the receipt', async () => {
    const { asked, router } = open(checked(), { [`POST ${path}/commit`]: receipt, [`GET ${path}/receipt`]: receipt });
    await press('Commit November 2026');
    const dialog = screen.getByRole('alertdialog', { name: 'Commit November 2026 of North Harbour Clinic (S01)?' });
    expect(dialog.textContent).toContain('88 new, 2 changed, 1 removed');
    expect(asked.some(({ method }) => method === 'POST')).toBe(false);
    fireEvent.click(within(dialog).getByRole('button', { name: 'Commit November 2026' }));
    await waitFor(() => expect(router.state.location.pathname).toBe(`/submissions/${submissionId}/receipt`));
    expect(asked.find(({ method }) => method === 'POST')?.body).toEqual({ previewDigest: checked().preview?.digest });
    expect(said()).toContain('November 2026 is accepted.');
  });

  it('says that the registry changed, keeps everything, and offers the check again', async () => {
    const { asked } = open(checked(), {
      [`POST ${path}/commit`]: () => refusal('submission-stale', 'Nothing was committed.'),
      [`POST ${path}/check`]: checked(),
    });
    await press('Commit November 2026');
    fireEvent.click(within(screen.getByRole('alertdialog')).getByRole('button', { name: 'Commit November 2026' }));
    expect((await screen.findByRole('alert')).textContent).toContain('The registry changed since this preview was made.');
    expect(screen.queryByRole('alertdialog')).toBeNull();
    expect(screen.queryByRole('button', { name: 'Commit November 2026' })).toBeNull();
    await press('Check November 2026 again');
    await waitFor(() => expect(asked.some(({ path: at }) => at === `${path}/check`)).toBe(true));
    expect(await screen.findByRole('button', { name: 'Commit November 2026' })).toBeTruthy();
  });

  it('waits for files that were not sent', async () => {
    open(checked());
    await screen.findByRole('button', { name: 'Commit November 2026' });
    await choose(csv('sessions.csv'));
    await waitFor(() => expect(screen.queryByRole('button', { name: 'Commit November 2026' })).toBeNull());
  });

  it('can be given up instead, after asking', async () => {
    const { asked, router } = open(checked(), { [`POST ${path}/discard`]: checked({ status: 'discarded' }) });
    await press('Give up this submission');
    expect(screen.getByRole('alertdialog').textContent).toContain('The registry is not touched');
    expect(asked.some(({ method }) => method === 'POST')).toBe(false);
    await press('Give it up');
    await waitFor(() => expect(router.state.location.pathname).toBe('/month'));
  });
});

describe('a correction', () => {
  it('is called one, and says that the accepted month stands until it is committed', async () => {
    const before = {
      month: '2026-11',
      state: 'in-progress',
      dueOn: '2026-12-15',
      submissionId,
      acceptedAt: '2026-12-01T09:00:00.000Z',
      rows: 4,
      closed: null,
    };
    open(sample(), { [`GET /api/sites/${sample().site.id}/months`]: { site: sample().site, months: [before] } });
    expect(await heading('Correct November 2026')).toBeTruthy();
    expect(screen.getByText(/has been accepted before\. This corrects it/)).toBeTruthy();
  });
});

describe('whoever only looks', () => {
  it('sees where it stands and is offered nothing to change', async () => {
    open(checked({ findings: [warning] }), { 'GET /api/account': therapist });
    await heading('Findings');
    expect(screen.getByText('No reason has been given yet.')).toBeTruthy();
    for (const name of [/^Check/, /^Commit/, /^Give up/, /^Take out/, /^Choose/, /^Keep/]) {
      expect(screen.queryByRole('button', { name })).toBeNull();
    }
  });

  it('is told when there is no such submission, or none of their site', async () => {
    open(sample(), { [`GET ${path}`]: () => refusal('not-found', 'There is nothing at this address, or it is not yours to see.') });
    expect((await screen.findByRole('alert')).textContent).toContain('not yours to see');
  });

  it('is led from a settled submission to its receipt', async () => {
    open(checked({ status: 'accepted', settledAt: '2026-12-01T09:00:00.000Z' }));
    expect((await screen.findByRole('link', { name: 'Open the receipt' })).getAttribute('href')).toBe(
      `/submissions/${submissionId}/receipt`,
    );
    expect(screen.queryByRole('heading', { name: 'Files' })).toBeNull();
  });
});
