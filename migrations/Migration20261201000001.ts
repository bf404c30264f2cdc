import { Migration } from '@mikro-orm/migrations';

export class Migration20261201000001 extends Migration {
  override async up(): Promise<void> {
    this.addSql(
      `create table "person" ("id" serial primary key, "name" varchar(120) not null, "email" varchar(200) not null, "password_hash" varchar(100) not null, "role" text check ("role" in ('reader', 'technician', 'engineer', 'planner', 'administrator')) not null, "state" text check ("state" in ('active', 'closed')) not null default 'active', "created_at" timestamptz not null, constraint person_email_lower_check check (email = lower(email)));`,
    );
    this.addSql(`alter table "person" add constraint "person_email_unique" unique ("email");`);

    this.addSql(
      `create table "session" ("id" serial primary key, "key_hash" varchar(64) not null, "person_id" int not null, "created_at" timestamptz not null, "expires_at" timestamptz not null, "ended_at" timestamptz null);`,
    );
    this.addSql(
      `alter table "session" add constraint "session_key_hash_unique" unique ("key_hash");`,
    );

    this.addSql(
      `create table "sign_in_attempt" ("id" serial primary key, "key" varchar(250) not null, "at" timestamptz not null);`,
    );
    this.addSql(`create index "sign_in_attempt_key_at_index" on "sign_in_attempt" ("key", "at");`);

    this.addSql(
      `create table "site" ("id" serial primary key, "name" varchar(80) not null, "time_zone" varchar(60) not null, "units_shown" text check ("units_shown" in ('metric', 'inch')) not null default 'metric', "decimal_mark" text check ("decimal_mark" in ('.', ',')) not null default '.', "phase_shown" text check ("phase_shown" in ('lag', 'lead')) not null default 'lag');`,
    );
    this.addSql(`alter table "site" add constraint "site_name_unique" unique ("name");`);

    this.addSql(
      `create table "rotor" ("id" serial primary key, "site_id" int not null, "serial" varchar(60) not null, "name" varchar(120) not null, "mass_kg" double precision null, "mass_source" text check ("mass_source" in ('known', 'estimated')) not null default 'estimated', "behaviour" text check ("behaviour" in ('rigid', 'flexible', 'unknown')) not null default 'unknown', "balance_grade" double precision null, "bearing_span_m" double precision null, "centre_of_mass_from_a_m" double precision null, "overhung" boolean not null default false, constraint rotor_mass_check check (mass_kg is null or mass_kg > 0), constraint rotor_grade_check check (balance_grade is null or balance_grade > 0));`,
    );
    this.addSql(
      `alter table "rotor" add constraint "rotor_site_serial_unique" unique ("site_id", "serial");`,
    );

    this.addSql(
      `create table "plane" ("id" serial primary key, "rotor_id" int not null, "name" varchar(40) not null, "plane_order" int not null, "from_a_m" double precision null, "radius_mm" double precision not null, "kind" text check ("kind" in ('free', 'fixed positions')) not null default 'free', "max_g_total" double precision null, "piece_g" double precision null, "max_tip_speed_m_s" double precision null, constraint plane_radius_check check (radius_mm > 0), constraint plane_limit_check check (max_g_total is null or max_g_total > 0));`,
    );
    this.addSql(
      `alter table "plane" add constraint "plane_rotor_name_unique" unique ("rotor_id", "name");`,
    );

    this.addSql(
      `create table "position" ("id" serial primary key, "plane_id" int not null, "number" int not null, "label" varchar(40) not null, "angle_deg" double precision not null, "max_g" double precision null, constraint position_angle_check check (angle_deg >= 0 and angle_deg < 360), constraint position_limit_check check (max_g is null or max_g > 0));`,
    );
    this.addSql(
      `alter table "position" add constraint "position_plane_number_unique" unique ("plane_id", "number");`,
    );
    this.addSql(
      `alter table "position" add constraint "position_plane_label_unique" unique ("plane_id", "label");`,
    );

    this.addSql(
      `create table "limit_set" ("id" serial primary key, "site_id" int null, "title" varchar(160) not null, "edition" varchar(120) not null, "quantity" text check ("quantity" in ('velocity', 'displacement')) not null default 'velocity', "unit" varchar(20) not null default 'mm/s rms', "band_low_hz" double precision not null default 10, "band_high_hz" double precision not null default 1000, "b_ab" double precision not null, "b_bc" double precision not null, "b_cd" double precision not null, "speed_min_rpm" double precision null, "speed_max_rpm" double precision null, "power_min_kw" double precision null, "power_max_kw" double precision null, "support" text check ("support" in ('rigid', 'flexible', 'any')) not null default 'any', "citation" varchar(400) not null, "state" text check ("state" in ('in use', 'retired')) not null default 'in use', "entered_by_id" int null, "entered_at" timestamptz not null, constraint limit_set_order_check check (0 < b_ab and b_ab < b_bc and b_bc < b_cd), constraint limit_set_band_check check (0 < band_low_hz and band_low_hz < band_high_hz));`,
    );

    this.addSql(
      `create table "instrument" ("id" serial primary key, "site_id" int not null, "name" varchar(80) not null, "serial" varchar(60) not null, "calibration_due" date null, "phase_sense" text check ("phase_sense" in ('lag', 'lead')) not null, "phase_reference" text check ("phase_reference" in ('positive peak', 'negative peak', 'zero crossing')) not null default 'positive peak');`,
    );
    this.addSql(
      `alter table "instrument" add constraint "instrument_site_serial_unique" unique ("site_id", "serial");`,
    );

    this.addSql(
      `create table "column_layout" ("id" serial primary key, "site_id" int not null, "name" varchar(80) not null, "version" int not null, "shape_key" varchar(400) not null, "layout" jsonb not null, "person_id" int not null, "created_at" timestamptz not null);`,
    );
    this.addSql(
      `alter table "column_layout" add constraint "column_layout_site_name_version_unique" unique ("site_id", "name", "version");`,
    );

    this.addSql(
      `create table "audit_event" ("id" serial primary key, "at" timestamptz not null, "person_id" int null, "site_id" int null, "action" varchar(80) not null, "entity" varchar(60) not null, "entity_id" int null, "before" jsonb null, "after" jsonb null, "reason" varchar(1000) null);`,
    );
    this.addSql(
      `create index "audit_event_entity_index" on "audit_event" ("entity", "entity_id");`,
    );

    this.addSql(
      `create table "area" ("id" serial primary key, "site_id" int not null, "parent_id" int null, "name" varchar(80) not null);`,
    );
    this.addSql(
      `alter table "area" add constraint "area_site_parent_name_unique" unique ("site_id", "parent_id", "name");`,
    );

    this.addSql(
      `create table "machine" ("id" serial primary key, "site_id" int not null, "area_id" int not null, "tag" varchar(40) not null, "tag_key" varchar(40) not null, "name" varchar(120) not null, "aliases" text[] not null default '{}', "kind" varchar(60) not null, "power_kw" double precision null, "speed_min_rpm" double precision not null, "speed_max_rpm" double precision not null, "nominal_speed_rpm" double precision not null, "drive" text check ("drive" in ('direct', 'belt', 'gear', 'variable speed')) not null default 'direct', "line_hz" double precision not null default 50, "criticality" text check ("criticality" in ('A', 'B', 'C', 'D')) not null, "support" text check ("support" in ('rigid', 'flexible', 'unknown')) not null default 'unknown', "blade_count" int null, "confined_space" boolean not null default false, "state" text check ("state" in ('active', 'retired')) not null default 'active', "retired_reason" varchar(400) null, "created_at" timestamptz not null, constraint machine_speed_range_check check (speed_min_rpm > 0 and speed_max_rpm >= speed_min_rpm and nominal_speed_rpm between speed_min_rpm and speed_max_rpm), constraint machine_power_check check (power_kw is null or power_kw > 0));`,
    );
    this.addSql(`create index "machine_area_index" on "machine" ("area_id");`);
    this.addSql(
      `alter table "machine" add constraint "machine_site_tag_unique" unique ("site_id", "tag_key");`,
    );

    this.addSql(
      `create table "setup" ("id" serial primary key, "machine_id" int not null, "number" int not null, "mark_description" varchar(300) not null, "tacho_deg" double precision not null, "tacho_edge" text check ("tacho_edge" in ('rising', 'falling')) not null default 'rising', "pulses_per_turn" int not null default 1, "rotation_from_drive_end" text check ("rotation_from_drive_end" in ('clockwise', 'counter-clockwise')) not null, "sensor_places" jsonb not null default '[]', "support_note" varchar(400) null, "reason" varchar(400) not null, "valid_from" timestamptz not null, "valid_to" timestamptz null, "person_id" int not null, constraint setup_tacho_check check (tacho_deg >= 0 and tacho_deg < 360), constraint setup_pulses_check check (pulses_per_turn >= 1));`,
    );
    this.addSql(
      `alter table "setup" add constraint "setup_machine_number_unique" unique ("machine_id", "number");`,
    );

    this.addSql(
      `create table "rotor_stay" ("id" serial primary key, "rotor_id" int not null, "machine_id" int not null, "from_at" timestamptz not null, "to_at" timestamptz null);`,
    );

    this.addSql(
      `create table "machine_event" ("id" serial primary key, "machine_id" int not null, "at" timestamptz not null, "kind" text check ("kind" in ('cleaning', 'repair', 'alignment', 'balance', 'trip', 'process', 'other')) not null, "text" varchar(1000) not null, "breaks_trend" boolean not null default false, "balance_job_id" int null, "person_id" int not null);`,
    );
    this.addSql(
      `create index "machine_event_machine_at_index" on "machine_event" ("machine_id", "at");`,
    );

    this.addSql(
      `create table "limit_use" ("id" serial primary key, "machine_id" int not null, "limit_set_id" int not null, "from_at" timestamptz not null, "to_at" timestamptz null, "reason" varchar(400) not null, "person_id" int null);`,
    );

    this.addSql(
      `create table "bearing" ("id" serial primary key, "machine_id" int not null, "label" varchar(20) not null, "bearing_order" int not null, "place" text check ("place" in ('driver', 'driven', 'gear')) not null default 'driven', "from_a_m" double precision null, "type" varchar(60) null, "ball_count" int null, "ball_diameter_mm" double precision null, "pitch_diameter_mm" double precision null, "contact_deg" double precision null, "static_load_n" double precision null);`,
    );
    this.addSql(
      `alter table "bearing" add constraint "bearing_machine_label_unique" unique ("machine_id", "label");`,
    );

    this.addSql(
      `create table "point" ("id" serial primary key, "machine_id" int not null, "bearing_id" int not null, "label" varchar(40) not null, "direction" text check ("direction" in ('H', 'V', 'A', 'degrees')) not null, "direction_deg" double precision null, "sensor_kind" text check ("sensor_kind" in ('housing', 'shaft')) not null default 'housing', "mounting" varchar(80) null, "point_order" int not null, constraint point_direction_deg_check check (direction_deg is null or (direction_deg >= 0 and direction_deg < 360)));`,
    );
    this.addSql(`create index "point_bearing_index" on "point" ("bearing_id");`);
    this.addSql(
      `alter table "point" add constraint "point_machine_label_unique" unique ("machine_id", "label");`,
    );

    this.addSql(
      `create table "balance_job" ("id" serial primary key, "site_id" int not null, "number" int not null, "machine_id" int not null, "rotor_id" int not null, "setup_id" int not null, "kind" text check ("kind" in ('one-plane', 'two-plane')) not null, "reason" varchar(1000) not null, "unit" text check ("unit" in ('mm/s rms', 'µm p-p')) not null, "phase_sense" text check ("phase_sense" in ('lag', 'lead')) not null, "angle_sense" text check ("angle_sense" in ('against', 'with')) not null, "targets" jsonb not null, "starts_allowed" int null, "state" text check ("state" in ('opened', 'base taken', 'answered', 'signed', 'stopped safe', 'not a balance job')) not null, "opened_by_id" int not null, "opened_at" timestamptz not null, "closed_at" timestamptz null, "closing_note" varchar(2000) null);`,
    );
    this.addSql(
      `alter table "balance_job" add constraint "balance_job_site_number_unique" unique ("site_id", "number");`,
    );

    this.addSql(
      `create table "sign_off" ("id" serial primary key, "job_id" int not null, "person_id" int not null, "person_name" varchar(120) not null, "role" varchar(40) not null, "statement" varchar(1000) not null, "at" timestamptz not null, "content_hash" varchar(64) not null, "content" jsonb not null);`,
    );
    this.addSql(
      `alter table "sign_off" add constraint "sign_off_job_person_unique" unique ("job_id", "person_id");`,
    );

    this.addSql(
      `create table "run" ("id" serial primary key, "job_id" int not null, "number" int not null, "purpose" text check ("purpose" in ('base', 'trial', 'check')) not null, "taken_at" timestamptz not null, "speed_rpm" double precision not null, "setup_id" int not null, "weights_state" jsonb not null, "state" text check ("state" in ('kept', 'held', 'lined through')) not null default 'kept', "state_reason" varchar(1000) null, "person_id" int not null, "created_at" timestamptz not null, constraint run_speed_check check (speed_rpm > 0));`,
    );
    this.addSql(
      `alter table "run" add constraint "run_job_number_unique" unique ("job_id", "number");`,
    );

    this.addSql(
      `create table "job_point" ("id" serial primary key, "job_id" int not null, "point_id" int not null, "point_order" int not null);`,
    );
    this.addSql(
      `alter table "job_point" add constraint "job_point_job_point_unique" unique ("job_id", "point_id");`,
    );
    this.addSql(
      `alter table "job_point" add constraint "job_point_job_order_unique" unique ("job_id", "point_order");`,
    );

    this.addSql(
      `create table "job_plane" ("id" serial primary key, "job_id" int not null, "plane_id" int not null, "plane_order" int not null);`,
    );
    this.addSql(
      `alter table "job_plane" add constraint "job_plane_job_plane_unique" unique ("job_id", "plane_id");`,
    );
    this.addSql(
      `alter table "job_plane" add constraint "job_plane_job_order_unique" unique ("job_id", "plane_order");`,
    );

    this.addSql(
      `create table "coefficient" ("id" serial primary key, "rotor_id" int not null, "plane_id" int not null, "point_id" int not null, "setup_id" int not null, "speed_rpm" double precision not null, "unit" text check ("unit" in ('mm/s rms', 'µm p-p')) not null, "re_per_gmm" double precision not null, "im_per_gmm" double precision not null, "source" text check ("source" in ('trial', 'fitted weight', 'fit over all runs')) not null, "job_id" int not null, "run_id" int null, "grade" text check ("grade" in ('good', 'with care', 'not for reuse')) not null, "made_at" timestamptz not null, constraint coefficient_speed_check check (speed_rpm > 0));`,
    );
    this.addSql(
      `create index "coefficient_rotor_index" on "coefficient" ("rotor_id", "plane_id", "point_id");`,
    );

    this.addSql(
      `create table "caution_shown" ("id" serial primary key, "job_id" int not null, "caution_id" varchar(20) not null, "version" int not null, "step" varchar(60) not null, "named_person" varchar(120) null, "person_id" int not null, "at" timestamptz not null);`,
    );
    this.addSql(`create index "caution_shown_job_index" on "caution_shown" ("job_id");`);

    this.addSql(
      `create table "answer" ("id" serial primary key, "job_id" int not null, "number" int not null, "kind" text check ("kind" in ('correction', 'trim')) not null, "method" varchar(60) not null, "inputs" jsonb not null, "result" jsonb not null, "accepted_by_id" int not null, "accepted_at" timestamptz not null);`,
    );
    this.addSql(
      `alter table "answer" add constraint "answer_job_number_unique" unique ("job_id", "number");`,
    );

    this.addSql(
      `create table "site_access" ("id" serial primary key, "person_id" int not null, "site_id" int not null);`,
    );
    this.addSql(
      `alter table "site_access" add constraint "site_access_person_site_unique" unique ("person_id", "site_id");`,
    );

    this.addSql(
      `create table "upload" ("id" serial primary key, "site_id" int not null, "file_name" varchar(200) not null, "sha256" varchar(64) not null, "size_bytes" int not null, "person_id" int not null, "at" timestamptz not null, "state" text check ("state" in ('waiting', 'kept', 'held', 'withdrawn')) not null default 'waiting', "point_id" int null, "column_layout_id" int null, "layout" jsonb null, constraint upload_size_check check (size_bytes > 0));`,
    );
    this.addSql(
      `alter table "upload" add constraint "upload_site_sha256_unique" unique ("site_id", "sha256");`,
    );

    this.addSql(
      `create table "measured_record" ("id" serial primary key, "point_id" int not null, "declared_point_id" int not null, "upload_id" int null, "source" text check ("source" in ('waveform', 'typed')) not null, "taken_at" timestamptz not null, "stated_speed_rpm" double precision null, "state" text check ("state" in ('kept', 'held', 'lined through')) not null, "hold_reasons" jsonb not null default '[]', "decision_reason" varchar(1000) null, "supersedes_id" int null, "person_id" int not null, "created_at" timestamptz not null, "note" varchar(1000) null);`,
    );
    this.addSql(
      `create index "measured_record_point_taken_index" on "measured_record" ("point_id", "taken_at");`,
    );

    this.addSql(
      `create table "run_vector" ("id" serial primary key, "run_id" int not null, "point_id" int not null, "amplitude" double precision not null, "lag_deg" double precision not null, "overall" double precision null, "entered" jsonb null, "record_id" int null, constraint run_vector_lag_check check (lag_deg >= 0 and lag_deg < 360), constraint run_vector_amplitude_check check (amplitude >= 0), constraint run_vector_overall_check check (overall is null or overall >= 0));`,
    );
    this.addSql(
      `alter table "run_vector" add constraint "run_vector_run_point_unique" unique ("run_id", "point_id");`,
    );

    this.addSql(
      `create table "reading" ("id" serial primary key, "record_id" int not null, "point_id" int not null, "taken_at" timestamptz not null, "kind" text check ("kind" in ('overall velocity', 'true peak acceleration', 'rms acceleration', 'crest factor', 'kurtosis', 'overall displacement')) not null, "value" double precision not null, "unit" varchar(20) not null, "band_low_hz" double precision null, "band_high_hz" double precision null, "speed_rpm" double precision null, "zone" text check ("zone" in ('A', 'B', 'C', 'D')) null, "limit_set_id" int null, "limits" jsonb null, "status" text check ("status" in ('kept', 'held', 'lined through')) not null default 'kept', constraint reading_value_check check (value >= 0 and value < 'Infinity'::float8), constraint reading_speed_check check (speed_rpm is null or speed_rpm > 0));`,
    );
    this.addSql(
      `create index "reading_point_kind_taken_index" on "reading" ("point_id", "kind", "taken_at");`,
    );
    this.addSql(
      `alter table "reading" add constraint "reading_record_kind_unique" unique ("record_id", "kind");`,
    );

    this.addSql(
      `create table "one_x_vector" ("id" serial primary key, "record_id" int not null, "point_id" int not null, "taken_at" timestamptz not null, "amplitude" double precision not null, "unit" varchar(20) not null default 'mm/s rms', "lag_deg" double precision null, "speed_rpm" double precision not null, "speed_source" text check ("speed_source" in ('tacho', 'stated', 'spectrum')) not null, "scatter" double precision null, "method" varchar(60) not null, "setup_id" int null, "status" text check ("status" in ('kept', 'held', 'lined through')) not null default 'kept', constraint one_x_vector_lag_check check (lag_deg is null or (lag_deg >= 0 and lag_deg < 360)), constraint one_x_vector_amplitude_check check (amplitude >= 0), constraint one_x_vector_speed_check check (speed_rpm > 0));`,
    );
    this.addSql(
      `create index "one_x_vector_point_taken_index" on "one_x_vector" ("point_id", "taken_at");`,
    );
    this.addSql(
      `alter table "one_x_vector" add constraint "one_x_vector_record_unique" unique ("record_id");`,
    );

    this.addSql(
      `create table "derived" ("id" serial primary key, "record_id" int not null, "method" varchar(60) not null, "settings" jsonb not null, "result" jsonb not null, "lines" bytea null, "made_at" timestamptz not null);`,
    );
    this.addSql(
      `alter table "derived" add constraint "derived_record_method_unique" unique ("record_id", "method");`,
    );

    this.addSql(
      `create table "waveform" ("id" serial primary key, "record_id" int not null, "sample_rate_hz" double precision not null, "sample_count" int not null, "quantity" text check ("quantity" in ('acceleration', 'velocity', 'displacement')) not null, "unit" varchar(20) not null, "scale" double precision not null, "sample_format" text check ("sample_format" in ('f32le', 'f64le')) not null, "samples" bytea not null, "tacho_format" text check ("tacho_format" in ('f32le', 'f64le')) null, "tacho" bytea null, constraint waveform_rate_check check (sample_rate_hz > 0), constraint waveform_count_check check (sample_count > 2), constraint waveform_bytes_check check (octet_length(samples) = sample_count * case sample_format when 'f32le' then 4 else 8 end));`,
    );
    this.addSql(
      `alter table "waveform" add constraint "waveform_record_unique" unique ("record_id");`,
    );

    this.addSql(
      `create table "weight" ("id" serial primary key, "rotor_id" int not null, "plane_id" int not null, "position_id" int null, "angle_deg" double precision not null, "radius_mm" double precision not null, "mass_g" double precision not null, "mass_source" text check ("mass_source" in ('scale', 'nominal')) not null, "purpose" text check ("purpose" in ('trial', 'correction', 'found')) not null, "fixing" varchar(200) not null, "permanent" boolean not null default false, "entered" jsonb not null, "fitted_at" timestamptz not null, "fitted_by_id" int not null, "job_id" int null, "stays" boolean null, "ended_at" timestamptz null, "ending" text check ("ending" in ('taken off', 'moved', 'found missing', 'found worn')) null, "ended_by_id" int null, "end_reason" varchar(400) null, "replaces_id" int null, constraint weight_angle_check check (angle_deg >= 0 and angle_deg < 360), constraint weight_mass_check check (mass_g > 0), constraint weight_radius_check check (radius_mm > 0), constraint weight_ended_with_ending_check check ((ended_at is null) = (ending is null)));`,
    );
    this.addSql(`create index "weight_rotor_index" on "weight" ("rotor_id");`);

    this.addSql(
      `alter table "session" add constraint "session_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "rotor" add constraint "rotor_site_id_foreign" foreign key ("site_id") references "site" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "plane" add constraint "plane_rotor_id_foreign" foreign key ("rotor_id") references "rotor" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "position" add constraint "position_plane_id_foreign" foreign key ("plane_id") references "plane" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "limit_set" add constraint "limit_set_site_id_foreign" foreign key ("site_id") references "site" ("id") on update cascade on delete set null;`,
    );
    this.addSql(
      `alter table "limit_set" add constraint "limit_set_entered_by_id_foreign" foreign key ("entered_by_id") references "person" ("id") on update cascade on delete set null;`,
    );

    this.addSql(
      `alter table "instrument" add constraint "instrument_site_id_foreign" foreign key ("site_id") references "site" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "column_layout" add constraint "column_layout_site_id_foreign" foreign key ("site_id") references "site" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "column_layout" add constraint "column_layout_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "audit_event" add constraint "audit_event_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade on delete set null;`,
    );
    this.addSql(
      `alter table "audit_event" add constraint "audit_event_site_id_foreign" foreign key ("site_id") references "site" ("id") on update cascade on delete set null;`,
    );

    this.addSql(
      `alter table "area" add constraint "area_site_id_foreign" foreign key ("site_id") references "site" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "area" add constraint "area_parent_id_foreign" foreign key ("parent_id") references "area" ("id") on update cascade on delete set null;`,
    );

    this.addSql(
      `alter table "machine" add constraint "machine_site_id_foreign" foreign key ("site_id") references "site" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "machine" add constraint "machine_area_id_foreign" foreign key ("area_id") references "area" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "setup" add constraint "setup_machine_id_foreign" foreign key ("machine_id") references "machine" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "setup" add constraint "setup_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "rotor_stay" add constraint "rotor_stay_rotor_id_foreign" foreign key ("rotor_id") references "rotor" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "rotor_stay" add constraint "rotor_stay_machine_id_foreign" foreign key ("machine_id") references "machine" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "machine_event" add constraint "machine_event_machine_id_foreign" foreign key ("machine_id") references "machine" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "machine_event" add constraint "machine_event_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "limit_use" add constraint "limit_use_machine_id_foreign" foreign key ("machine_id") references "machine" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "limit_use" add constraint "limit_use_limit_set_id_foreign" foreign key ("limit_set_id") references "limit_set" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "limit_use" add constraint "limit_use_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade on delete set null;`,
    );

    this.addSql(
      `alter table "bearing" add constraint "bearing_machine_id_foreign" foreign key ("machine_id") references "machine" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "point" add constraint "point_machine_id_foreign" foreign key ("machine_id") references "machine" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "point" add constraint "point_bearing_id_foreign" foreign key ("bearing_id") references "bearing" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "balance_job" add constraint "balance_job_site_id_foreign" foreign key ("site_id") references "site" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "balance_job" add constraint "balance_job_machine_id_foreign" foreign key ("machine_id") references "machine" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "balance_job" add constraint "balance_job_rotor_id_foreign" foreign key ("rotor_id") references "rotor" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "balance_job" add constraint "balance_job_setup_id_foreign" foreign key ("setup_id") references "setup" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "balance_job" add constraint "balance_job_opened_by_id_foreign" foreign key ("opened_by_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "sign_off" add constraint "sign_off_job_id_foreign" foreign key ("job_id") references "balance_job" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "sign_off" add constraint "sign_off_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "run" add constraint "run_job_id_foreign" foreign key ("job_id") references "balance_job" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "run" add constraint "run_setup_id_foreign" foreign key ("setup_id") references "setup" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "run" add constraint "run_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "job_point" add constraint "job_point_job_id_foreign" foreign key ("job_id") references "balance_job" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "job_point" add constraint "job_point_point_id_foreign" foreign key ("point_id") references "point" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "job_plane" add constraint "job_plane_job_id_foreign" foreign key ("job_id") references "balance_job" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "job_plane" add constraint "job_plane_plane_id_foreign" foreign key ("plane_id") references "plane" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "coefficient" add constraint "coefficient_rotor_id_foreign" foreign key ("rotor_id") references "rotor" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "coefficient" add constraint "coefficient_plane_id_foreign" foreign key ("plane_id") references "plane" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "coefficient" add constraint "coefficient_point_id_foreign" foreign key ("point_id") references "point" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "coefficient" add constraint "coefficient_setup_id_foreign" foreign key ("setup_id") references "setup" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "coefficient" add constraint "coefficient_job_id_foreign" foreign key ("job_id") references "balance_job" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "coefficient" add constraint "coefficient_run_id_foreign" foreign key ("run_id") references "run" ("id") on update cascade on delete set null;`,
    );

    this.addSql(
      `alter table "caution_shown" add constraint "caution_shown_job_id_foreign" foreign key ("job_id") references "balance_job" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "caution_shown" add constraint "caution_shown_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "answer" add constraint "answer_job_id_foreign" foreign key ("job_id") references "balance_job" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "answer" add constraint "answer_accepted_by_id_foreign" foreign key ("accepted_by_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "site_access" add constraint "site_access_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "site_access" add constraint "site_access_site_id_foreign" foreign key ("site_id") references "site" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "upload" add constraint "upload_site_id_foreign" foreign key ("site_id") references "site" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "upload" add constraint "upload_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "upload" add constraint "upload_point_id_foreign" foreign key ("point_id") references "point" ("id") on update cascade on delete set null;`,
    );
    this.addSql(
      `alter table "upload" add constraint "upload_column_layout_id_foreign" foreign key ("column_layout_id") references "column_layout" ("id") on update cascade on delete set null;`,
    );

    this.addSql(
      `alter table "measured_record" add constraint "measured_record_point_id_foreign" foreign key ("point_id") references "point" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "measured_record" add constraint "measured_record_declared_point_id_foreign" foreign key ("declared_point_id") references "point" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "measured_record" add constraint "measured_record_upload_id_foreign" foreign key ("upload_id") references "upload" ("id") on update cascade on delete set null;`,
    );
    this.addSql(
      `alter table "measured_record" add constraint "measured_record_supersedes_id_foreign" foreign key ("supersedes_id") references "measured_record" ("id") on update cascade on delete set null;`,
    );
    this.addSql(
      `alter table "measured_record" add constraint "measured_record_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "run_vector" add constraint "run_vector_run_id_foreign" foreign key ("run_id") references "run" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "run_vector" add constraint "run_vector_point_id_foreign" foreign key ("point_id") references "point" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "run_vector" add constraint "run_vector_record_id_foreign" foreign key ("record_id") references "measured_record" ("id") on update cascade on delete set null;`,
    );

    this.addSql(
      `alter table "reading" add constraint "reading_record_id_foreign" foreign key ("record_id") references "measured_record" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "reading" add constraint "reading_point_id_foreign" foreign key ("point_id") references "point" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "reading" add constraint "reading_limit_set_id_foreign" foreign key ("limit_set_id") references "limit_set" ("id") on update cascade on delete set null;`,
    );

    this.addSql(
      `alter table "one_x_vector" add constraint "one_x_vector_record_id_foreign" foreign key ("record_id") references "measured_record" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "one_x_vector" add constraint "one_x_vector_point_id_foreign" foreign key ("point_id") references "point" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "one_x_vector" add constraint "one_x_vector_setup_id_foreign" foreign key ("setup_id") references "setup" ("id") on update cascade on delete set null;`,
    );

    this.addSql(
      `alter table "derived" add constraint "derived_record_id_foreign" foreign key ("record_id") references "measured_record" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "waveform" add constraint "waveform_record_id_foreign" foreign key ("record_id") references "measured_record" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "weight" add constraint "weight_rotor_id_foreign" foreign key ("rotor_id") references "rotor" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "weight" add constraint "weight_plane_id_foreign" foreign key ("plane_id") references "plane" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "weight" add constraint "weight_position_id_foreign" foreign key ("position_id") references "position" ("id") on update cascade on delete set null;`,
    );
    this.addSql(
      `alter table "weight" add constraint "weight_fitted_by_id_foreign" foreign key ("fitted_by_id") references "person" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "weight" add constraint "weight_job_id_foreign" foreign key ("job_id") references "balance_job" ("id") on update cascade on delete set null;`,
    );
    this.addSql(
      `alter table "weight" add constraint "weight_ended_by_id_foreign" foreign key ("ended_by_id") references "person" ("id") on update cascade on delete set null;`,
    );
    this.addSql(
      `alter table "weight" add constraint "weight_replaces_id_foreign" foreign key ("replaces_id") references "weight" ("id") on update cascade on delete set null;`,
    );
  }
}
