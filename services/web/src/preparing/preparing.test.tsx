import { cleanup, configure, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import { I18nProvider } from 'react-aria-components/I18nProvider';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { saveFile } from '../lib/save-file.ts';
import { Embedded } from './embedded.tsx';
import { inProcessWorkroom } from './in-process-workroom.ts';
import type { FromPreparing, Task, ToPreparing } from './messages.ts';
import { Offline } from './offline.tsx';
import { csvFile, passphrase, sampleFiles, sessionsCsv } from './sample-month.ts';

vi.mock('../lib/save-file.ts', () => ({ saveFile: vi.fn() }));

const today = '2026-12-01';
const task: Task = {
  kind: 'task',
  view: 'prepare',
  site: { code: 'S01', name: 'Harbour Clinic' },
  month: '2026-11',
  knownParticipants: [],
  safeHeaders: [],
  theme: 'system',
};

// Locking and opening a key file takes half a second on purpose, and more on a busy machine.
configure({ asyncUtilTimeout: 15_000 });
beforeEach(() => vi.mocked(saveFile).mockClear());
afterEach(() => cleanup());

function embed(given: Partial<Task> = {}) {
  const told: FromPreparing[] = [];
  const listeners = new Set<(message: ToPreparing) => void>();
  const say = (message: ToPreparing) => listeners.forEach((listener) => listener(message));
  const surroundings = {
    tell: (message: FromPreparing) => {
      told.push(message);
      if (message.kind === 'ready') say({ ...task, ...given });
    },
    listen: (take: (message: ToPreparing) => void) => {
      listeners.add(take);
      return () => listeners.delete(take);
    },
  };
  render(
    <I18nProvider locale="en-GB">
      <Embedded workroom={inProcessWorkroom()} surroundings={surroundings} today={today} />
    </I18nProvider>,
  );
  return { told, say, ofKind: <K extends FromPreparing['kind']>(kind: K) => told.filter((message) => message.kind === kind) };
}

interface KeyFiles {
  readonly fresh: File;
  readonly used: File;
}
let made: Promise<KeyFiles> | undefined;

/** The file of a key made elsewhere, and the same after a month was prepared with it. */
const keyFiles = (): Promise<KeyFiles> => (made ??= makeKeyFiles());

async function makeKeyFiles(): Promise<KeyFiles> {
  const room = inProcessWorkroom();
  await room.ask('begin', { site: 'S01', month: null, knownParticipants: [], safeHeaders: [], today });
  const { file } = await room.ask('make-key', { mode: 'random', idType: 'mrn', stripLeadingZeros: false, passphrase });
  await room.ask('add-files', { files: sampleFiles() });
  await room.ask('prepare', null);
  const saved = await room.ask('save-key', null);
  return { fresh: new File([file.text], file.name), used: new File([saved.file.text], saved.file.name) };
}

const savedNames = () => vi.mocked(saveFile).mock.calls.map(([name]) => name);

/** Where the focus is once something has ended; nothing is said to be under way any more. */
function expectToGoOnAt(outcome: string | RegExp): void {
  expect(screen.getByRole('group', { name: outcome })).toBe(document.activeElement);
  for (const status of screen.getAllByRole('status')) expect(status.textContent).not.toContain('Under way');
}

function drop(within: string, ...files: readonly File[]): void {
  const input = document.querySelector(`${within} input[type=file]`);
  if (input === null) throw new Error(`nothing takes files in ${within}`);
  fireEvent.change(input, { target: { files } });
}

const press = async (name: string | RegExp) => fireEvent.click(await screen.findByRole('button', { name }));
const fill = (label: string | RegExp, value: string) => fireEvent.change(screen.getByLabelText(label), { target: { value } });

async function unfold(title: string): Promise<HTMLDetailsElement> {
  const details = (await screen.findByText(title)).closest('details') as HTMLDetailsElement;
  details.open = true;
  fireEvent(details, new Event('toggle'));
  return details;
}

async function openKey(file: File, words = passphrase): Promise<void> {
  await screen.findByText(/Key file of S01/);
  drop('#key', file);
  fill(/^Passphrase/, words);
  await press('Open the key');
}

describe('preparing a month inside the registry', () => {
  it('goes from key and files to what is sent, the key file first', async () => {
    const { used } = await keyFiles();
    const { ofKind, say } = embed();
    await openKey(used);
    await screen.findByText(/The key of S01 is open: it knows 2 people/);
    drop('#files', csvFile('sessions.csv', `${sessionsCsv}00482999;03/04/2024;1;1;completed;manual_bwstt;0,01;x\r\n`));
    await screen.findByRole('heading', { name: 'Preview' });
    expect(screen.getByText(/1 thing to mend or to know\.$/)).toBeTruthy();

    const send = await screen.findByRole('button', { name: 'Send 5 rows in 1 table' });
    expect(send).toHaveProperty('disabled', true);
    fireEvent.click(screen.getByText(/I have looked at/));
    await screen.findByText('Save the key file first.');
    await press('Save the key file');
    await waitFor(() => expect(savedNames()).toEqual([expect.stringMatching(/^S01-site-key-r3-2026-12-01-[0-9a-f]{4}\.json$/)]));
    await waitFor(() => expect(send).toHaveProperty('disabled', false));
    fireEvent.click(send);
    await waitFor(() => expect(ofKind('send')).toMatchObject([{ tables: [{ table: 'sessions', rows: 5 }], replacedCodes: [] }]));

    say({ kind: 'sending', state: 'failed', done: 0, of: 1, message: 'The registry did not answer.' });
    await screen.findByText('The registry did not answer.');
    expectToGoOnAt('The registry did not answer.');
    await press('Send 5 rows in 1 table again');
    await waitFor(() => expect(ofKind('send')).toHaveLength(2));
    say({ kind: 'sending', state: 'done', done: 1, of: 1, message: null });
    await screen.findByText('5 rows in 1 table were sent.');
    expectToGoOnAt('5 rows in 1 table were sent.');
    await press('Go on to the check');
    expect(ofKind('finished')).toHaveLength(1);
    expect(ofKind('unsaved').map((message) => message.kind === 'unsaved' && message.isUnsaved)).toEqual([false, true, false]);
  });

  it('folds columns that are as last month', async () => {
    const { used } = await keyFiles();
    embed();
    await openKey(used);
    await screen.findByText(/is open:/);
    drop(
      '#files',
      csvFile('participants.csv', 'MRN,Sex\r\n0048-2913,female\r\n'),
      csvFile('bouts.csv', 'MRN,Session date\r\n00482913,28/03/2024\r\n'),
    );
    await screen.findByText(/2 columns used, none stays behind. As last month/);
    expect(screen.getByRole('button', { name: 'Show the columns of Participants' })).toBeTruthy();
    await screen.findByText(/New: next month they are remembered/);
    expect(screen.getByRole('button', { name: 'Show the columns of Bouts' })).toBeTruthy();
  });

  it('leads past folded columns to what has to be decided, and shows what stays behind alone', async () => {
    const { fresh } = await keyFiles();
    embed({ month: '2024-03' });
    await openKey(fresh);
    await screen.findByText(/is open:/);
    drop('#files', ...sampleFiles());
    const parts = within(await screen.findByRole('navigation', { name: 'Parts of this sheet' }));
    expect(parts.getAllByRole('listitem').map(({ textContent }) => textContent)).toEqual([
      'Columns: 1 thing to decide',
      'Preview: 6 rows in 2 tables',
      'Save and send: 1 thing to look at before',
    ]);
    Element.prototype.scrollIntoView = vi.fn();
    fireEvent.click(parts.getByRole('link', { name: 'Save and send' }));
    expect(document.activeElement).toBe(screen.getByRole('heading', { name: 'Save and send' }));

    expect(screen.getByRole('button', { name: 'Show the columns of Participants' })).toBeTruthy();
    expect(screen.getByText(/5 columns used, 2 stay behind: Surname, Notes/)).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Fold the columns of Sessions' })).toBeTruthy();
    fireEvent.click(screen.getByText('Show only what stays behind of Sessions'));
    expect(screen.getAllByRole('button', { name: /^Change what becomes of/ }).map((button) => button.getAttribute('aria-label'))).toEqual([
      'Change what becomes of Status in Sessions',
      'Change what becomes of Therapist',
    ]);
    await press('Change what becomes of Therapist');
    await press('Close');
    await screen.findByRole('button', { name: 'Change what becomes of Therapist' });
  });

  it('says first that the files look like those of another month, and waits until somebody says that this is meant', async () => {
    const { used } = await keyFiles();
    embed();
    await openKey(used);
    await screen.findByText(/is open:/);
    drop('#files', csvFile('sessions.csv', sessionsCsv));
    const title = await screen.findByText(/files of another month: 0 of 4 rows of Sessions are of November 2026/);
    expect(title.compareDocumentPosition(screen.getByRole('heading', { name: 'Columns' }))).toBe(Node.DOCUMENT_POSITION_FOLLOWING);
    expect(screen.getByText('The preview is ready. Take care: the files look like those of another month.')).toBeTruthy();
    expect(screen.getByText(/I have looked at files that look like those of another month: 0 of 4 rows/)).toBeTruthy();
    expect(screen.getByText('Ages sent as 90').nextElementSibling?.textContent).toBe('none');
  });

  it('takes a word of the clinic for a code, and works the preview out again', async () => {
    const { fresh } = await keyFiles();
    embed();
    await openKey(fresh);
    await screen.findByText(/is open:/);
    drop('#files', csvFile('sessions.csv', sessionsCsv));
    await press('Change what becomes of Status');
    await press(/all done/);
    fireEvent.click(await screen.findByRole('option', { name: 'completed' }));
    await screen.findByText('Every row and cell of the files can be read.');
    expect(screen.getByText(/1 of your words known/)).toBeTruthy();
  });

  it('says what to do about a file that is of no table, and goes on when it is left out', async () => {
    const { fresh } = await keyFiles();
    embed();
    await openKey(fresh);
    await screen.findByText(/is open:/);
    drop('#files', csvFile('sessions.csv', sessionsCsv), csvFile('rota.csv', 'Monday,Tuesday\r\nearly,late\r\n'), csvFile('bouts.csv', ''));
    await screen.findByText(/Say which table rota.csv is, or leave it out/);
    await screen.findByText(/bouts.csv was not read/);
    expect(screen.queryByRole('heading', { name: 'Preview' })).toBeNull();
    await press('Leave out rota.csv');
    await screen.findByRole('heading', { name: 'Preview' });
  });
});

describe('the site key', () => {
  it('is not opened with the wrong passphrase, and the page says what to do', async () => {
    const { fresh } = await keyFiles();
    embed();
    await openKey(fresh, 'bafo rina tuke sobi malu pegu');
    const alert = await screen.findByRole('alert');
    expect(within(alert).getByText(/The passphrase is wrong, or the file was altered/)).toBeTruthy();
    expect(within(alert).getByText(/take the second copy/)).toBeTruthy();
    expect(screen.getByText(/Open the site key first/)).toBeTruthy();
  });

  it('shows the passphrase while it is typed only where that is asked for', async () => {
    const { fresh } = await keyFiles();
    embed();
    expect(await screen.findByLabelText(/^Passphrase/)).toHaveProperty('type', 'password');
    fireEvent.click(screen.getByText('Show what I type'));
    expect(screen.getByLabelText(/^Passphrase/)).toHaveProperty('type', 'text');
    await openKey(fresh, passphrase.toUpperCase());
    await screen.findByText(/is open:/);
  });

  it('asks for file and passphrase where they are missing', async () => {
    embed();
    await press('Open the key');
    const summary = await screen.findByRole('alert');
    expect(within(summary).getByText('Choose the key file.')).toBeTruthy();
    expect(within(summary).getByText('Type the passphrase.')).toBeTruthy();
  });

  it('that lacks people of the registry is shown to be an older copy', async () => {
    const { fresh } = await keyFiles();
    embed({ knownParticipants: ['S00000000000000000000Z'] });
    await openKey(fresh);
    await screen.findByText(/The key lacks 1 of the 1 participants that the registry holds of S01/);
  });

  it('is made with words that were written down, and its file saved', async () => {
    embed({ knownParticipants: ['S00000000000000000000Z'] });
    await press('Make a key');
    await screen.findByText(/The registry holds 1 participant of S01 already/);
    const words = await waitFor(() => {
      const shown = [...document.querySelectorAll('ol li')].map(({ textContent }) => textContent);
      expect(shown).toHaveLength(6);
      return shown;
    });
    await press('Make the key and save its file');
    const summary = await screen.findByRole('alert');
    expect(within(summary).getAllByRole('link')).toHaveLength(3);
    fireEvent.click(screen.getByText('I have written these six words down'));
    fill(/^Word 2/, words[1] ?? '');
    fill(/^Word 5/, `${words[4] ?? ''}x`);
    await press('Make the key and save its file');
    await screen.findByText('1 thing needs mending');
    expect(saveFile).not.toHaveBeenCalled();
    fill(/^Word 5/, words[4] ?? '');
    await press('Make the key and save its file');
    await screen.findByText(/The key file was saved as S01-site-key-r1-2026-12-01-[0-9a-f]{4}.json/);
    expect(savedNames()).toEqual([expect.stringMatching(/^S01-site-key-r1-/)]);
  });

  it('alone shows what it holds, and tells the registry of codes that were joined once its file is saved', async () => {
    const { used } = await keyFiles();
    const { ofKind, say } = embed({ view: 'key', month: null });
    await openKey(used);
    await screen.findByText('First training days');
    expect(screen.queryByRole('heading', { name: 'Files' })).toBeNull();
    await unfold('One person with two record numbers');
    fill(/whose code stays/, '0048-2913');
    fill(/other record number/, '00482914');
    await press('Join the two');
    await screen.findByText(/Both record numbers lead to one code now/);
    expect(await screen.findByRole('button', { name: 'Tell the registry' })).toHaveProperty('disabled', true);
    await press('Save the key file');
    await waitFor(() => expect(screen.getByRole('button', { name: 'Tell the registry' })).toHaveProperty('disabled', false));
    await waitFor(() => expectToGoOnAt(/^The key file is saved as S01-site-key-r3-/));
    await press('Tell the registry');
    await waitFor(() => expect(ofKind('replace-codes')).toMatchObject([{ replacedCodes: [{}] }]));
    say({ kind: 'sending', state: 'done', done: 1, of: 1, message: null });
    await screen.findByText(/The registry has replaced 1 code\./);
    expectToGoOnAt('The registry has replaced 1 code.');
    await waitFor(() => expect(ofKind('unsaved').at(-1)).toEqual({ kind: 'unsaved', isUnsaved: false }));
  });

  it('is made one with the copy of another coordinator', async () => {
    const { fresh, used } = await keyFiles();
    embed({ view: 'key', month: null });
    await openKey(fresh);
    const form = await unfold('Two copies of the key');
    fireEvent.change(form.querySelector('input[type=file]') as HTMLInputElement, { target: { files: [used] } });
    fireEvent.change(within(form).getByLabelText(/^Passphrase/), { target: { value: passphrase } });
    await press('Make one key of both');
    await screen.findByText(/The two copies are one now/);
    await screen.findByText(/it knows 2 people, 2 of them not yet in its file, and was saved 2 times/);
    expect(screen.getByText(/No code had to be replaced/)).toBeTruthy();
  });

  it('gets a new passphrase with the file that is saved next', async () => {
    const { fresh } = await keyFiles();
    embed({ view: 'key', month: null });
    await openKey(fresh);
    const form = await unfold('A new passphrase');
    await waitFor(() => expect(form.querySelectorAll('ol li')).toHaveLength(6));
    const words = [...form.querySelectorAll('ol li')].map(({ textContent }) => textContent);
    fireEvent.click(within(form).getByText('I have written these six words down'));
    fill(/^Word 2/, words[1] ?? '');
    fill(/^Word 5/, words[4] ?? '');
    await press('Use these words');
    await screen.findByText(/The key has a new passphrase/);
    await press('Save the key file');
    await waitFor(() => expect(saveFile).toHaveBeenCalled());
    const [name = '', content = ''] = vi.mocked(saveFile).mock.calls[0] ?? [];
    cleanup();
    embed();
    await openKey(new File([content], name), words.join(' '));
    await screen.findByText(/is open:/);
  });

  it('gets a new secret only after a second word', async () => {
    const { used } = await keyFiles();
    embed({ view: 'key', month: null });
    await openKey(used);
    await unfold('A new secret for the key');
    await press('Draw a new secret');
    fill(/to carry over now/, '00482913\n00482914');
    await press('Draw a new secret');
    await screen.findByText(/The key has a new secret/);
    expect(screen.getByText(/2 codes were replaced/)).toBeTruthy();
  });
});

function openFromDisk(): void {
  render(
    <I18nProvider locale="en-GB">
      <Offline workroom={inProcessWorkroom()} today={today} />
    </I18nProvider>,
  );
}

async function begin(month: string): Promise<void> {
  fill(/Code of your site/, 's01');
  fill(/^Month/, month);
  await press('Begin');
}

describe('the edition opened from disk', () => {
  it('asks for site and month, and saves cleaned files with a text that says what was prepared', async () => {
    const { used } = await keyFiles();
    openFromDisk();
    await press('Begin');
    expect(within(await screen.findByRole('alert')).getAllByRole('link')).toHaveLength(2);
    await begin('2026-11');
    await openKey(used);
    await screen.findByText(/is open:/);
    drop('#files', ...sampleFiles());
    fireEvent.click(await screen.findByText(/I have looked at/));
    await press('Save 2 cleaned files');
    await screen.findByText(/The cleaned files are saved/);
    expectToGoOnAt('The cleaned files are saved.');
    const saved = new Map(vi.mocked(saveFile).mock.calls.map(([name, content]) => [name, content]));
    expect([...saved.keys()]).toEqual(['participants.csv', 'sessions.csv', 'what-was-prepared.txt']);
    const csv = saved.get('sessions.csv') as ArrayBuffer;
    const digest = Buffer.from(await crypto.subtle.digest('SHA-256', csv)).toString('hex');
    expect(saved.get('what-was-prepared.txt')).toContain(digest);
  });

  it('says that it cannot know the codes of the registry, and waits where the key knows few of the people', async () => {
    const { fresh, used } = await keyFiles();
    openFromDisk();
    await begin('2024-03');
    await openKey(used);
    await screen.findByText(/is open:/);
    drop('#files', ...sampleFiles());
    await screen.findByText(/cannot know which codes the registry holds: use the newest key file/);
    expect(screen.getByText(/knows 2 of the 2 people in these files/)).toBeTruthy();
    expect(screen.queryByText(/I have looked at .*a key that knows/)).toBeNull();
    expect(screen.getByText('The key file holds everything that later months need.')).toBeTruthy();
    cleanup();
    openFromDisk();
    await begin('2024-03');
    await openKey(fresh);
    await screen.findByText(/is open:/);
    drop('#files', ...sampleFiles());
    await screen.findByText(/I have looked at a key that knows 0 of the 2 people in the files/);
    expect(screen.getByText('Say that you have looked at what stands above.')).toBeTruthy();
    expect(screen.getByText(/holds what its file does not: 2 new people; how columns of Participants, Sessions are read/)).toBeTruthy();
  });
});
