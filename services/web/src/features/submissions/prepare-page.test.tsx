/** The page around the preparing page, with messages as that one would send them. */
import type { Submission } from '@cairnstep/contract';
import { act, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { FromPreparing, ToPreparing } from '../../preparing/messages.ts';
import { fakeApi, refusal, site } from '../../testing/fake-api.ts';
import { fakeUpload } from '../../testing/fake-upload.ts';
import { renderRoutes } from '../../testing/render.tsx';
import PreparePage from './prepare-page.tsx';
import { checked, coordinator, fileOf, sample, submissionId, therapist } from './sample-submission.ts';

const path = `/api/submissions/${submissionId}`;
const known = 'S000000000000000000012';
const knowledge = {
  [`GET /api/sites/${site.id}/participant-codes`]: { codes: [known] },
  [`GET /api/sites/${site.id}/safe-headers`]: { headers: [{ header: 'ward', markedAt: '2026-11-03T09:00:00.000Z', markedBy: 'Steward' }] },
};
const routes = [
  { path: '/submit/:submissionId', element: <h1>The submission</h1> },
  { path: '/submit/:submissionId/prepare', element: <PreparePage /> },
  { path: '/elsewhere', element: <h1>Elsewhere</h1> },
];

/** What the preparing page was told. */
let told: ToPreparing[];
const window_ = { postMessage: (message: ToPreparing) => told.push(message) };
beforeEach(() => {
  told = [];
  vi.spyOn(HTMLIFrameElement.prototype, 'contentWindow', 'get').mockReturnValue(window_ as unknown as Window);
});
afterEach(() => vi.restoreAllMocks());

function open(answers: Readonly<Record<string, unknown>> = {}, submission: Submission = sample()) {
  const asked = fakeApi({ 'GET /api/account': coordinator, [`GET ${path}`]: submission, ...knowledge, ...answers });
  fakeUpload();
  return { asked, router: renderRoutes(routes, `/submit/${submissionId}/prepare`) };
}

async function say(
  data: unknown,
  { source = window_, origin = location.origin }: { source?: unknown; origin?: string } = {},
): Promise<void> {
  await act(async () => {
    window.dispatchEvent(Object.assign(new MessageEvent('message', { data, origin }), { source }));
  });
}
const frame = () => screen.findByTitle('Preparing the files of November 2026');
const csv = (text: string): ArrayBuffer => new TextEncoder().encode(text).buffer as ArrayBuffer;
const send = (text = 'participant,session_day\r\nS000000000000000000012,4\r\n'): FromPreparing => ({
  kind: 'send',
  tables: [{ table: 'sessions', rows: 1, csv: csv(text) }],
  replacedCodes: [],
});
const puts = (asked: ReturnType<typeof open>['asked']) => asked.filter(({ method }) => method === 'PUT');
const lastSending = () => told.filter((message) => message.kind === 'sending').at(-1);

describe('the page that prepares a month', () => {
  it('shows the preparing page once it is ready, as high as it says, and tells it its task', async () => {
    open();
    const shown = await frame();
    expect(shown.hidden).toBe(true);
    expect(screen.getByText('Opening the preparing page.')).toBeTruthy();
    await say({ kind: 'ready' });
    await say({ kind: 'height', pixels: 1_234 });
    expect(shown.hidden).toBe(false);
    expect(shown.style.height).toBe('1234px');
    expect(shown.getAttribute('src')).toBe('/prepare.html');
    expect(told[0]).toMatchObject({ kind: 'task', view: 'prepare', month: '2026-11', site: { code: 'S01' }, theme: 'system' });
    expect(told[0]).toMatchObject({ knownParticipants: [known], safeHeaders: ['ward'] });
  });

  it('hears nobody but the preparing page', async () => {
    const { asked } = open();
    await frame();
    await say({ kind: 'ready' }, { source: window });
    await say(send(), { source: { postMessage: () => undefined } });
    await say(send(), { origin: 'https://elsewhere.example' });
    expect((await frame()).hidden).toBe(true);
    expect(puts(asked)).toEqual([]);
  });

  it('sends what it is given, table by table, tells how far that is, and goes on to the check when told that all is seen', async () => {
    const { asked, router } = open({
      [`PUT ${path}/files/sessions`]: sample({ files: [fileOf('sessions')] }),
      [`POST ${path}/check`]: sample({ status: 'checking', files: [fileOf('sessions')] }),
    });
    await frame();
    await say({ kind: 'ready' });
    await say(send());
    await waitFor(() => expect(lastSending()).toMatchObject({ state: 'done', message: null }));
    expect(lastSending()).toMatchObject({ done: 1, of: 1 });
    expect(puts(asked).map(({ path: at, search }) => at + search)).toEqual([`${path}/files/sessions?fileName=sessions.csv`]);
    expect(await (puts(asked)[0]?.body as File).text()).toBe('participant,session_day\r\nS000000000000000000012,4\r\n');
    expect(asked.some(({ path: at }) => at === `${path}/check`)).toBe(false);
    await say({ kind: 'finished' });
    await waitFor(() => expect(router.state.location.pathname).toBe(`/submit/${submissionId}`));
    expect(asked.some(({ path: at }) => at === `${path}/check`)).toBe(true);
  });

  it('tells the registry which codes were replaced before the first file', async () => {
    const replacedCodes = [{ from: 'S000000000000000000012', to: 'S00000000000000000002Z' }];
    const path_ = `POST /api/sites/${site.id}/replaced-codes`;
    const answers = {
      [path_]: { replaced: 1, unknown: 0, joined: 0, rows: 3, earlierValues: 0 },
      [`PUT ${path}/files/sessions`]: sample({ files: [fileOf('sessions')] }),
    };
    const { asked } = open(answers);
    await frame();
    await say({ kind: 'ready' });
    await say({ ...send(), replacedCodes });
    await waitFor(() => expect(lastSending()).toMatchObject({ state: 'done' }));
    const changes = asked.filter(({ method }) => method !== 'GET');
    expect(changes.map(({ method }) => method)).toEqual(['POST', 'PUT']);
    expect(changes[0]?.body).toEqual({ codes: replacedCodes });
  });

  it('sends no file when the registry cannot replace codes', async () => {
    const { asked } = open({ [`POST /api/sites/${site.id}/replaced-codes`]: () => refusal('codes-collide') });
    await frame();
    await say({ kind: 'ready' });
    await say({ ...send(), replacedCodes: [{ from: 'S000000000000000000012', to: 'S00000000000000000002Z' }] });
    await waitFor(() => expect(lastSending()).toMatchObject({ state: 'failed' }));
    expect(puts(asked)).toEqual([]);
  });

  it.each([
    ['a name in a cell', 'participant,session_day\r\nMara Lind,4\r\n'],
    ['a column that is not of the dictionary', 'participant,record_no\r\nS000000000000000000012,4\r\n'],
    ['a column of another table', 'participant,bout_no\r\nS000000000000000000012,4\r\n'],
    ['a column twice', 'participant,participant\r\nS000000000000000000012,4\r\n'],
  ])('sends nothing when there is %s', async (_, text) => {
    const { asked } = open();
    await frame();
    await say({ kind: 'ready' });
    await say(send(text));
    await waitFor(() => expect(lastSending()).toMatchObject({ state: 'failed' }));
    expect(lastSending()).toMatchObject({ message: expect.stringContaining('Nothing was sent.') as string });
    expect(puts(asked)).toEqual([]);
  });

  it('sends nothing when the bytes are no text', async () => {
    const { asked } = open();
    await frame();
    await say({ kind: 'ready' });
    await say({ ...send(), tables: [{ table: 'sessions', rows: 1, csv: Uint8Array.of(0x70, 0xff).buffer }] });
    await waitFor(() => expect(lastSending()).toMatchObject({ state: 'failed' }));
    expect(puts(asked)).toEqual([]);
  });

  it('tells why the sending failed and how much arrived', async () => {
    open({ [`PUT ${path}/files/sessions`]: () => refusal('submission-busy', 'It is being checked.') });
    await frame();
    await say({ kind: 'ready' });
    await say(send());
    await waitFor(() => expect(lastSending()).toMatchObject({ state: 'failed' }));
    expect(lastSending()?.kind === 'sending' && lastSending()).toMatchObject({
      message: expect.stringMatching(/It is being checked\. 0 of 1 tables arrived/) as string,
    });
  });

  it('closes the preparing page when that says something else than agreed', async () => {
    open();
    await frame();
    await say({ kind: 'ready' });
    await say({ kind: 'send', tables: [], replacedCodes: [] });
    expect((await screen.findByRole('alert')).textContent).toContain('Nothing was sent.');
    expect(screen.queryByTitle('Preparing the files of November 2026')).toBeNull();
  });

  it('asks before what is kept nowhere is left', async () => {
    const { router } = open();
    await frame();
    await say({ kind: 'ready' });
    await say({ kind: 'unsaved', isUnsaved: true });
    await act(() => router.navigate('/elsewhere'));
    const dialog = await screen.findByRole('alertdialog', { name: 'Leave the preparing?' });
    expect(dialog.textContent).toContain('key file that you have not saved');
    fireEvent.click(within(dialog).getByRole('button', { name: 'Leave and forget it' }));
    expect(await screen.findByRole('heading', { name: 'Elsewhere' })).toBeTruthy();
  });

  it('says so when the preparing page does not open', async () => {
    vi.useFakeTimers({ shouldAdvanceTime: true });
    try {
      open();
      await frame();
      await act(() => vi.advanceTimersByTimeAsync(21_000));
      expect((await screen.findByRole('alert')).textContent).toContain('The preparing page does not open.');
    } finally {
      vi.useRealTimers();
    }
  });

  it('is for coordinators of the site while files may come', async () => {
    open({ 'GET /api/account': therapist });
    expect(await screen.findByText('Only a coordinator of North Harbour Clinic can prepare its files.')).toBeTruthy();
  });

  it.each([
    ['checking', 'The files of this month are being checked.'],
    ['accepted', 'This submission is settled.'],
  ] as const)('does not open while the submission is %s', async (status, words) => {
    open({}, checked({ status, preview: null }));
    expect(await screen.findByText(words, { exact: false })).toBeTruthy();
    expect(screen.queryByTitle('Preparing the files of November 2026')).toBeNull();
  });
});
