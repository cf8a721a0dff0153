import type { Submission } from '@cairnstep/contract';
import { describe, expect, it } from 'vitest';
import { checked, error, fileOf, sample, warning } from './sample-submission.ts';
import { changeWords, stackSteps } from './stack-steps.ts';

const states = (submission: Submission, unsent = 0) =>
  stackSteps(submission, unsent)
    .map(({ state }) => state)
    .join(' ');
const remark = (submission: Submission, key: string) => stackSteps(submission, 0).find((step) => step.key === key)?.remark;
const files = [fileOf('sessions'), fileOf('bouts')];
const reasoned = { ...warning, acknowledgedReason: 'Short steps are right.' };

describe('the stones of a submission', () => {
  it('settle one by one, the current one always the next thing to do', () => {
    expect(states(sample())).toBe('current waiting waiting waiting waiting');
    expect(states(sample(), 2)).toBe('done current waiting waiting waiting');
    expect(states(sample({ files }))).toBe('done done current waiting waiting');
    expect(states(sample({ files, status: 'checking' }))).toBe('done done current waiting waiting');
    expect(states(checked({ findings: [error, warning], preview: null }))).toBe('done done failed waiting waiting');
    expect(states(checked({ findings: [warning] }))).toBe('done done done current waiting');
    expect(states(checked({ findings: [reasoned] }))).toBe('done done done done current');
    expect(states(checked({ status: 'accepted' }))).toBe('done done done done done');
  });

  it('do not reach the commit while chosen files were not sent', () => {
    expect(states(checked(), 1)).toBe('done current done waiting waiting');
  });

  it('go back to the check when the registry changed under the preview', () => {
    const steps = stackSteps(checked(), 0, true);
    expect(steps.map(({ state }) => state).join(' ')).toBe('done done current waiting waiting');
  });

  it('say how far the check is, and wait in words until it is taken up', () => {
    const checking = (progress: Submission['progress']) => remark(sample({ files, status: 'checking', progress }), 'check');
    expect(checking({ step: 'read', done: 0, of: 1 })).toBe('waiting to be taken up');
    expect(checking({ step: 'read', done: 0, of: 2 })).toBe('reading file 1 of 2');
    expect(checking({ step: 'check', done: 0, of: 1 })).toBe('checking every row against the rules');
    expect(checking({ step: 'compare', done: 0, of: 1 })).toBe('comparing with what the registry holds');
  });

  it('count what was found and what would change', () => {
    expect(remark(checked({ findings: [error, warning], preview: null }), 'check')).toBe('3 errors to mend');
    expect(remark(checked({ findings: [warning] }), 'check')).toBe('no errors, 2 warnings');
    expect(remark(checked({ findings: [warning] }), 'review')).toBe('1 warning without a reason');
    expect(remark(checked(), 'review')).toBe('88 new, 2 changed, 1 removed');
  });
});

it('a change that is none is said to be none', () => {
  expect(changeWords([{ added: 0, changed: 0, unchanged: 9, removed: 0 }])).toBe('no row would change');
});
