/** A month of hundreds of thousands of bouts is staged and brought in with less work for its indexes. */
import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Tables and the keys by which their staged rows were told apart before. */
const rowKeys = {
  participants: 'participant',
  consents: 'participant, consent_no',
  exams: 'participant, exam_day',
  assessments: 'participant, assessment_day, measure, in_device, trial_no',
  sessions: 'participant, session_day, session_no',
  bouts: 'participant, session_day, session_no, bout_no',
  adverse_events: 'participant, event_no',
};

export class QuickerMonths1796083200030 implements MigrationInterface {
  name = 'QuickerMonths1796083200030';

  async up(runner: QueryRunner): Promise<void> {
    for (const table of Object.keys(rowKeys)) {
      await runner.query(`alter table staged_${table} drop constraint staged_${table}_pkey`);
      await runner.query(`alter table staged_${table} add constraint staged_${table}_pkey primary key (submission_id, line)`);
      // Lost in a crash of the server, then checked again: what is staged only repeats the files, and would otherwise be written three times.
      await runner.query(`alter table staged_${table} set unlogged`);
    }
    await runner.query('drop index bouts_month_idx');
    await runner.query('create index bouts_month_idx on bouts using brin (site_id, month)');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('drop index bouts_month_idx');
    await runner.query('create index bouts_month_idx on bouts (site_id, month)');
    for (const [table, keys] of Object.entries(rowKeys)) {
      await runner.query(`alter table staged_${table} set logged`);
      await runner.query(`alter table staged_${table} drop constraint staged_${table}_pkey`);
      await runner.query(`alter table staged_${table} add constraint staged_${table}_pkey primary key (submission_id, ${keys})`);
    }
  }
}
