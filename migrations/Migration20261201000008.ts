import { Migration } from '@mikro-orm/migrations';

export class Migration20261201000008 extends Migration {
  override async up(): Promise<void> {
    this.addSql(
      `alter table "balance_job" add column "cleaned" text check ("cleaned" in ('yes', 'no', 'cannot be')) null;`,
    );
  }

  override async down(): Promise<void> {
    this.addSql(`alter table "balance_job" drop column "cleaned";`);
  }
}
