import { Migration } from '@mikro-orm/migrations';

export class Migration20261201000003 extends Migration {
  override async up(): Promise<void> {
    this.addSql(`alter table "answer" add column "after_run_number" int not null;`);

    this.addSql(`alter table "weight" add column "answer_number" int null;`);
  }

  override async down(): Promise<void> {
    this.addSql(`alter table "answer" drop column "after_run_number";`);

    this.addSql(`alter table "weight" drop column "answer_number";`);
  }
}
