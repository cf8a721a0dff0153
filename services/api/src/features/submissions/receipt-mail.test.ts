import type { SubmissionReceipt } from '@cairnstep/contract';
import { expect, it } from 'vitest';
import { receiptMail } from './receipt-mail.ts';

const receipt: SubmissionReceipt = {
  submissionId: '2b9a7c1e-7d0e-4a51-9c3f-6a5d1f0b8e44',
  site: { id: '7c5f8a0e-3c1b-4c8e-8d49-0f4e5b6a7c11', code: 'S01', name: 'North Harbour Clinic' },
  month: '2026-11',
  acceptedAt: '2026-12-01T08:05:31.482Z',
  acceptedBy: 'Mara Lind',
  digest: 'ab'.repeat(32),
  tables: [{ table: 'adverse_events', added: 2, changed: 0, unchanged: 1, removed: 0 }],
  files: [],
  acknowledged: [],
};

it('says in words which month of which site is in the registry, since when, and what was taken in', () => {
  const { subject, body } = receiptMail(receipt, 'https://cairnstep.example/submissions/1/receipt');
  expect(subject).toBe('Cairnstep: November 2026 of North Harbour Clinic (S01) is in the registry');
  expect(body.split('\n')).toEqual([
    'November 2026 of North Harbour Clinic (S01) is in the registry: accepted on 1 December 2026, 08:05 UTC, committed by Mara Lind.',
    '',
    'Adverse events: 2 new, 0 changed, 1 unchanged, 0 removed',
    '',
    `Digest of what was committed: ${receipt.digest}`,
    'Receipt: https://cairnstep.example/submissions/1/receipt',
  ]);
});
