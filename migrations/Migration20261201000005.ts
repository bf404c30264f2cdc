import { Migration } from '@mikro-orm/migrations';

/** Remarks to signed records; signatures and remarks are facts, and stand on a signed record only. */
export class Migration20261201000005 extends Migration {
  override async up(): Promise<void> {
    this.addSql(
      `create table "addendum" ("id" serial primary key, "job_id" int not null, "number" int not null, "text" varchar(2000) not null, "reason" varchar(400) not null, "person_id" int not null, "person_name" varchar(120) not null, "role" varchar(40) not null, "at" timestamptz not null, "previous_hash" varchar(64) not null, "hash" varchar(64) not null, constraint addendum_number_check check (number >= 1));`,
    );
    this.addSql(
      `alter table "addendum" add constraint "addendum_job_number_unique" unique ("job_id", "number");`,
    );

    this.addSql(
      `alter table "addendum" add constraint "addendum_job_id_foreign" foreign key ("job_id") references "balance_job" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "addendum" add constraint "addendum_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade;`,
    );

    for (const statement of invariants) this.addSql(statement);
  }

  override async down(): Promise<void> {
    throw new Error('Signed facts are not taken back: restore a backup instead.');
  }
}

const refuses = (table: string, what: string) =>
  `create trigger ${table}_${what === 'truncate' ? 'never_emptied' : 'append_only'} before ${what} on ${table}
     for each ${what === 'truncate' ? 'statement' : 'row'} execute function refuse_change()`;

const ofSignedJob = `create function addendum_of_signed_job() returns trigger language plpgsql as $$
begin
  if not exists (select 1 from sign_off where job_id = new.job_id) then
    raise exception 'an addendum belongs to a signed job: job % is not signed', new.job_id
      using errcode = 'integrity_constraint_violation';
  end if;
  return new;
end $$`;

const sameContent = `create function sign_off_same_content() returns trigger language plpgsql as $$
begin
  if exists (select 1 from sign_off where job_id = new.job_id and content_hash <> new.content_hash) then
    raise exception 'a further signature stands under the content signed first: job %', new.job_id
      using errcode = 'integrity_constraint_violation';
  end if;
  return new;
end $$`;

const invariants = [
  refuses('addendum', 'update or delete'),
  refuses('addendum', 'truncate'),
  refuses('sign_off', 'truncate'),
  ofSignedJob,
  `create trigger addendum_of_signed_job before insert on addendum
     for each row execute function addendum_of_signed_job()`,
  sameContent,
  `create trigger sign_off_same_content before insert on sign_off
     for each row execute function sign_off_same_content()`,
];
