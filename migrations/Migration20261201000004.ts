import { Migration } from '@mikro-orm/migrations';

export class Migration20261201000004 extends Migration {
  override async up(): Promise<void> {
    this.addSql(
      `create table "coefficient_reuse" ("id" serial primary key, "job_id" int not null, "speed_rpm" double precision not null, "coefficients" jsonb not null, "grade" text check ("grade" in ('good', 'with care')) not null, "confirmed" jsonb not null, "reason" varchar(1000) null, "person_id" int not null, "at" timestamptz not null, "withdrawn_at" timestamptz null, "withdrawn_by_id" int null, "withdraw_reason" varchar(1000) null, constraint coefficient_reuse_speed_check check (speed_rpm > 0));`,
    );
    this.addSql(`create index "coefficient_reuse_job_index" on "coefficient_reuse" ("job_id");`);

    this.addSql(
      `alter table "coefficient_reuse" add constraint "coefficient_reuse_job_id_foreign" foreign key ("job_id") references "balance_job" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "coefficient_reuse" add constraint "coefficient_reuse_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "coefficient_reuse" add constraint "coefficient_reuse_withdrawn_by_id_foreign" foreign key ("withdrawn_by_id") references "person" ("id") on update cascade on delete set null;`,
    );

    this.addSql(`alter table "balance_job" drop constraint if exists "balance_job_kind_check";`);

    this.addSql(`alter table "weight" drop constraint if exists "weight_ending_check";`);

    this.addSql(
      `alter table "balance_job" add constraint "balance_job_kind_check" check("kind" in ('one-plane', 'two-plane', 'three or more planes', 'static only', 'couple only', 'check only'));`,
    );

    this.addSql(`alter table "run" add column "replaces_id" int null;`);
    this.addSql(
      `alter table "run" add constraint "run_replaces_id_foreign" foreign key ("replaces_id") references "run" ("id") on update cascade on delete set null;`,
    );

    this.addSql(`alter table "weight" add column "ended_in_job_id" int null;`);
    this.addSql(
      `alter table "weight" add constraint "weight_ended_in_job_id_foreign" foreign key ("ended_in_job_id") references "balance_job" ("id") on update cascade on delete set null;`,
    );
    this.addSql(
      `alter table "weight" add constraint "weight_ending_check" check("ending" in ('taken off', 'moved', 'found missing', 'found worn', 'recorded wrongly'));`,
    );
  }

  override async down(): Promise<void> {
    this.addSql(`drop table if exists "coefficient_reuse" cascade;`);

    this.addSql(`alter table "balance_job" drop constraint if exists "balance_job_kind_check";`);

    this.addSql(`alter table "run" drop constraint "run_replaces_id_foreign";`);

    this.addSql(`alter table "weight" drop constraint if exists "weight_ending_check";`);

    this.addSql(`alter table "weight" drop constraint "weight_ended_in_job_id_foreign";`);

    this.addSql(
      `alter table "balance_job" add constraint "balance_job_kind_check" check("kind" in ('one-plane', 'two-plane'));`,
    );

    this.addSql(`alter table "run" drop column "replaces_id";`);

    this.addSql(`alter table "weight" drop column "ended_in_job_id";`);

    this.addSql(
      `alter table "weight" add constraint "weight_ending_check" check("ending" in ('taken off', 'moved', 'found missing', 'found worn'));`,
    );
  }
}
