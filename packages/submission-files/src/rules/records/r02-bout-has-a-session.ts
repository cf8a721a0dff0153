import type { Rule } from '../../checking/rule.ts';

const tookPlace = new Set(['completed', 'shortened']);

export const boutHasASession: Rule = {
  id: 'R02',
  evaluate: (submission, report) => {
    const bouts = submission.table('bouts');
    const status = submission.table('sessions').column('status');
    const numbers = submission.sessionNumbers('bouts');
    const { sessionOfBout } = submission;
    for (let row = 0; row < bouts.fileRows; row += 1) {
      if ((numbers[row] ?? -1) < 0) continue;
      const session = sessionOfBout[row] ?? -1;
      if (session < 0) {
        report.add(bouts, row, 'session_no', 'A bout of a session that is neither in the file of sessions nor in the registry.');
        continue;
      }
      const became = status.word(session);
      if (became !== null && !tookPlace.has(became)) report.add(bouts, row, 'session_no', 'A bout of a session that did not take place.');
    }
  },
};
