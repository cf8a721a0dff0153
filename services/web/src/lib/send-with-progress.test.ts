import { putSubmissionFile } from '@cairnstep/contract';
import { describe, expect, it } from 'vitest';
import { fakeApi, refusal } from '../testing/fake-api.ts';
import { fakeUpload } from '../testing/fake-upload.ts';
import { call } from './call.ts';
import { ProblemError, UnreachableError } from './problem-error.ts';

const input = { submissionId: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a11', table: 'sessions', fileName: 'sessions.csv' } as const;
const path = `PUT /api/submissions/${input.submissionId}/files/sessions`;
const file = new Blob(['a,b\r\n'], { type: 'text/csv' });

describe('a call that tells how much has been sent', () => {
  it('tells the parts, sends what any call sends and meets the same refusals', async () => {
    const asked = fakeApi({ [path]: () => refusal('submission-busy', 'Wait until the check has finished.') });
    fakeUpload();
    const parts: number[] = [];
    const outcome = call(putSubmissionFile, input, { file, onSent: (part) => parts.push(part) });
    await expect(outcome).rejects.toThrow(ProblemError);
    await expect(outcome).rejects.toMatchObject({ code: 'submission-busy' });
    expect(parts).toEqual([0.5, 1]);
    expect(asked[0]?.body).toBe(file);
    expect(asked[0]?.search).toBe('?fileName=sessions.csv');
    expect(asked[0]?.headers.get('Content-Type')).toBe('text/csv');
    expect(asked[0]?.headers.get('X-Cairnstep-Request')).toBe('1');
  });

  it('says that the registry cannot be reached when no answer comes', async () => {
    fakeApi({ [path]: () => Promise.reject(new TypeError('down')) });
    fakeUpload();
    await expect(call(putSubmissionFile, input, { file, onSent: () => undefined })).rejects.toThrow(UnreachableError);
  });

  it('stops when it is told to', async () => {
    fakeApi({});
    fakeUpload();
    const control = new AbortController();
    const outcome = call(putSubmissionFile, input, { file, signal: control.signal, onSent: () => control.abort() });
    await expect(outcome).rejects.toMatchObject({ name: 'AbortError' });
  });
});
