import { Migration } from '@mikro-orm/migrations';

export class Migration20261201000006 extends Migration {
  override async up(): Promise<void> {
    this.addSql(
      `create table "photo" ("id" serial primary key, "site_id" int not null, "weight_id" int not null, "file_name" varchar(200) not null, "sha256" varchar(64) not null, "thumbnail_sha256" varchar(64) not null, "width_px" int not null, "height_px" int not null, "person_id" int not null, "at" timestamptz not null, constraint photo_size_check check (width_px > 0 and height_px > 0));`,
    );
    this.addSql(`create index "photo_weight_index" on "photo" ("weight_id");`);
    this.addSql(
      `alter table "photo" add constraint "photo_weight_sha256_unique" unique ("weight_id", "sha256");`,
    );

    this.addSql(
      `create table "weight_fixing" ("id" serial primary key, "weight_id" int not null, "kind" text check ("kind" in ('temporary', 'weld', 'bolt', 'rivet', 'set screw', 'clip')) not null, "secured" boolean null, "no_photo_reason" varchar(200) null);`,
    );
    this.addSql(
      `alter table "weight_fixing" add constraint "weight_fixing_weight_unique" unique ("weight_id");`,
    );

    this.addSql(
      `alter table "photo" add constraint "photo_site_id_foreign" foreign key ("site_id") references "site" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "photo" add constraint "photo_weight_id_foreign" foreign key ("weight_id") references "weight" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "photo" add constraint "photo_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "weight_fixing" add constraint "weight_fixing_weight_id_foreign" foreign key ("weight_id") references "weight" ("id") on update cascade;`,
    );

    // Facts: a photo and how a weight was fixed are never changed and never deleted.
    for (const table of ['photo', 'weight_fixing'])
      this.addSql(
        `create trigger ${table}_append_only before update or delete on ${table} for each row execute function refuse_change()`,
      );
  }

  override async down(): Promise<void> {
    this.addSql(`drop table if exists "photo" cascade;`);

    this.addSql(`drop table if exists "weight_fixing" cascade;`);
  }
}
