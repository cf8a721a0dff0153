/** A draft that nobody else has seen can be deleted by whoever wrote it. */
import type { MigrationInterface, QueryRunner } from 'typeorm';

export class DeletedDrafts1796083200031 implements MigrationInterface {
  name = 'DeletedDrafts1796083200031';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query('grant delete on access_requests to cairnstep_app');
    await runner.query(`create policy app_delete on access_requests for delete to cairnstep_app
      using (lead_id = (select actor_account()) and status = 'draft')`);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('drop policy app_delete on access_requests');
    await runner.query('revoke delete on access_requests from cairnstep_app');
  }
}
