import { Migration } from '@mikro-orm/migrations';

/** Invariants that the entity definitions cannot say: one open head, and facts that never change. */
export class Migration20261201000002 extends Migration {
  override up(): void {
    for (const statement of [...openHeads, ...frozenFacts]) this.addSql(statement);
  }

  override down(): void {
    throw new Error('The invariants are not taken back: restore a backup instead.');
  }
}

const openHeads = [
  `create unique index area_site_name_top_unique on area (site_id, name) where parent_id is null`,
  `create unique index limit_set_site_title_edition_unique on limit_set (coalesce(site_id, 0), title, edition)`,
  `create unique index measured_record_supersedes_unique on measured_record (supersedes_id)`,
  `create unique index weight_replaces_unique on weight (replaces_id)`,
  `create unique index rotor_stay_rotor_open_unique on rotor_stay (rotor_id) where to_at is null`,
  `create unique index rotor_stay_machine_open_unique on rotor_stay (machine_id) where to_at is null`,
  `create unique index setup_machine_open_unique on setup (machine_id) where valid_to is null`,
  `create unique index limit_use_machine_open_unique on limit_use (machine_id) where to_at is null`,
  `create unique index balance_job_rotor_open_unique on balance_job (rotor_id) where closed_at is null`,
  `create unique index reading_point_kind_taken_unique on reading (point_id, kind, taken_at) where status = 'kept'`,
  `create unique index one_x_vector_point_taken_unique on one_x_vector (point_id, taken_at) where status = 'kept'`,
  `create index weight_rotor_on_index on weight (rotor_id) where ended_at is null`,
  `create index session_person_open_index on session (person_id) where ended_at is null`,
  `alter table machine_event add constraint machine_event_balance_job_foreign
     foreign key (balance_job_id) references balance_job (id)`,
];

const refuse = `create function refuse_change() returns trigger language plpgsql as $$
begin
  raise exception '% is append-only: % refused', tg_table_name, lower(tg_op)
    using errcode = 'integrity_constraint_violation';
end $$`;

/** Lets only the named columns change; everything else of the row is a fact. */
const onlyChanging = `create function only_changing() returns trigger language plpgsql as $$
declare
  allowed text[] := tg_argv;
begin
  if (to_jsonb(new) - allowed) is distinct from (to_jsonb(old) - allowed) then
    raise exception '% keeps its facts: only % may change', tg_table_name, array_to_string(allowed, ', ')
      using errcode = 'integrity_constraint_violation';
  end if;
  return new;
end $$`;

const appendOnly = (table: string) =>
  `create trigger ${table}_append_only before update or delete on ${table}
     for each row execute function refuse_change()`;

const neverEmptied = (table: string) =>
  `create trigger ${table}_never_emptied before truncate on ${table}
     for each statement execute function refuse_change()`;

const keeps = (table: string, ...columns: string[]) =>
  `create trigger ${table}_keeps_facts before update on ${table}
     for each row execute function only_changing(${columns.map((c) => `'${c}'`).join(', ')})`;

const neverDeleted = (table: string) =>
  `create trigger ${table}_never_deleted before delete on ${table}
     for each row execute function refuse_change()`;

const frozenFacts = [
  refuse,
  onlyChanging,
  ...['audit_event', 'waveform', 'answer', 'run_vector', 'sign_off', 'caution_shown'].map(
    appendOnly,
  ),
  neverEmptied('audit_event'),
  keeps('run', 'state', 'state_reason'),
  keeps('measured_record', 'state', 'hold_reasons', 'decision_reason', 'point_id'),
  keeps('weight', 'stays', 'permanent', 'ended_at', 'ending', 'ended_by_id', 'end_reason'),
  ...['run', 'measured_record', 'weight', 'balance_job', 'coefficient', 'machine'].map(
    neverDeleted,
  ),
];
