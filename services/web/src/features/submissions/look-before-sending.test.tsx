import type { Submission } from '@cairnstep/contract';
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { fakeApi, refusal } from '../../testing/fake-api.ts';
import { fakeUpload } from '../../testing/fake-upload.ts';
import { renderRoutes } from '../../testing/render.tsx';
import { fakeLookWorker } from './fake-look-worker.ts';
import { coordinator, fileOf, sample, submissionId } from './sample-submission.ts';
import SubmitPage from './submit-page.tsx';

const path = `/api/submissions/${submissionId}`;
const safeHeaders = `GET /api/sites/${sample().site.id}/safe-headers`;

function open(submission: Submission = sample(), answers: Readonly<Record<string, unknown>> = {}) {
  const asked = fakeApi({
    'GET /api/account': coordinator,
    [`GET ${path}`]: submission,
    [safeHeaders]: { headers: [] },
    [`PUT ${path}/files/sessions`]: sample({ files: [fileOf('sessions')] }),
    ...answers,
  });
  fakeUpload();
  fakeLookWorker();
  renderRoutes([{ path: '/submit/:submissionId', element: <SubmitPage /> }], `/submit/${submissionId}`);
  return { sent: () => asked.filter(({ method }) => method !== 'GET').map(({ path: at }) => at.slice(path.length)) };
}

async function choose(...files: readonly File[]): Promise<void> {
  await screen.findByRole('button', { name: 'Choose files' });
  fireEvent.change(document.querySelector('input[type=file]') ?? expect.fail('no input takes files'), { target: { files } });
}
const csv = (name: string, ...lines: readonly string[]) => new File([lines.join('\r\n')], name);
const prepared = csv('sessions.csv', 'participant,session_day');
const raw = csv('participants.csv', 'participant,surname', '00417723,Rosenquist', '00417724,Abernathy');
const doubtful = csv(
  'sessions.csv',
  'participant,remark',
  ...['later', 'sooner', 'never'].map((word) => `,walked well on the day and came back ${word}`),
);
const press = async (name: string | RegExp) => fireEvent.click(await screen.findByRole('button', { name }));

describe('a file chosen to be sent', () => {
  it('stays in the browser when it tells who somebody is, with the place, the kind of thing and the way out', async () => {
    const { sent } = open();
    await choose(raw, prepared);
    const [stopped] = within(await screen.findByRole('list', { name: 'Files not sent yet' })).getAllByRole('listitem');
    if (stopped === undefined) throw new Error('no file is listed');
    expect(await within(stopped).findByText(/would tell who somebody is/)).toBeTruthy();
    expect(stopped.textContent).toContain(
      'Participants, line 2 and further down, column participant: Something other than a participant code.',
    );
    expect(stopped.textContent).toMatch(/column surname: .*the name of a person/);
    for (const value of ['00417723', 'Rosenquist']) expect(document.body.textContent).not.toContain(value);
    expect(within(stopped).getByRole('link', { name: 'Prepare the clinic’s files' }).getAttribute('href')).toBe(
      `/submit/${submissionId}/prepare`,
    );
    await press('Send 1 file');
    await waitFor(() => expect(sent()).toEqual(['/files/sessions']));
    expect(screen.getByText('participants.csv')).toBeTruthy();
    expect(screen.queryByRole('button', { name: /^Send / })).toBeNull();
  });

  it('is looked through anew when it is moved to another table', async () => {
    open();
    await choose(csv('bouts.csv', 'colour'));
    expect(await screen.findByText('Bouts, line 1')).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: /^Bouts .*bouts\.csv/ }));
    fireEvent.click(screen.getByRole('option', { name: 'Sessions' }));
    expect(await screen.findByText('Sessions, line 1')).toBeTruthy();
  });

  it('is sent after a question when it might tell who somebody is', async () => {
    const { sent } = open();
    await choose(doubtful);
    expect(await screen.findByText(/it might tell who somebody is/)).toBeTruthy();
    await press('Send 1 file');
    const question = screen.getByRole('alertdialog', { name: 'Send this file?' });
    expect(question.textContent).toMatch(/Sessions, line 2, column remark: May hold running text/);
    expect(sent()).toEqual([]);
    fireEvent.click(within(question).getByRole('button', { name: 'Send 1 file' }));
    await waitFor(() => expect(sent()).toEqual(['/files/sessions']));
  });

  it('says which mended cells are lost with the file it replaces, and asks first', async () => {
    const { sent } = open(sample({ files: [{ ...fileOf('sessions'), mended: 3 }] }));
    await choose(prepared);
    expect(screen.getByText(/^A file that comes in the place of another, prepared here or sent as it is/)).toBeTruthy();
    expect(await screen.findByText(/^3 cells mended on this page are lost with the old file/)).toBeTruthy();
    await press('Send 1 file');
    expect(screen.getByRole('alertdialog').textContent).toContain('The findings workbook holds them');
    expect(sent()).toEqual([]);
  });

  it('is not sent when it could not be looked through', async () => {
    const { sent } = open();
    await screen.findByRole('button', { name: 'Choose files' });
    vi.stubGlobal(
      'Worker',
      class extends EventTarget {
        postMessage = () => queueMicrotask(() => this.dispatchEvent(new Event('error')));
        terminate = () => undefined;
      },
    );
    await choose(prepared);
    expect((await screen.findByRole('alert')).textContent).toContain('the file could not be looked through');
    expect(screen.queryByRole('button', { name: /^Send / })).toBeNull();
    expect(sent()).toEqual([]);
  });

  it('waits while nobody knows which headers the registry’s steward has marked as safe', async () => {
    const { sent } = open(sample(), { [safeHeaders]: () => refusal('internal-error', 'Nothing was changed.') });
    await choose(prepared);
    expect((await screen.findByRole('alert')).textContent).toContain('Nothing was changed.');
    expect(screen.queryByRole('button', { name: /^Send / })).toBeNull();
    expect(sent()).toEqual([]);
  });
});
