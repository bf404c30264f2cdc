import { Migration } from '@mikro-orm/migrations';

/** One open reuse a job, one correction a run, and what may change of weights and reuses. */
export class Migration20261201000007 extends Migration {
  override up(): void {
    for (const statement of statements) this.addSql(statement);
  }

  override down(): void {
    throw new Error('The invariants are not taken back: restore a backup instead.');
  }
}

const statements = [
  `create unique index coefficient_reuse_job_open_unique on coefficient_reuse (job_id) where withdrawn_at is null`,
  `create unique index run_replaces_unique on run (replaces_id)`,
  `drop trigger weight_keeps_facts on weight`,
  `create trigger weight_keeps_facts before update on weight
     for each row execute function only_changing('stays', 'permanent', 'ended_at', 'ending', 'ended_by_id', 'end_reason', 'ended_in_job_id')`,
  `create trigger coefficient_reuse_keeps_facts before update on coefficient_reuse
     for each row execute function only_changing('withdrawn_at', 'withdrawn_by_id', 'withdraw_reason')`,
  `create trigger coefficient_reuse_never_deleted before delete on coefficient_reuse
     for each row execute function refuse_change()`,
];
