import 'server-only';
import type { UniqueConstraintViolationException } from '@mikro-orm/core';
import type { Failure } from '@/lib/domain/result';

/** Which field a unique constraint belongs to, and the sentence for a person. */
const BY_CONSTRAINT: Record<string, Failure> = {
  machine_site_tag_unique: {
    code: 'taken',
    message: 'Another machine of this site has this tag. Choose another tag or open that machine.',
    field: 'tag',
  },
  person_email_unique: {
    code: 'taken',
    message: 'Somebody with this e-mail address is already registered.',
    field: 'email',
  },
  photo_weight_sha256_unique: {
    code: 'duplicate',
    message: 'This photo is with this weight already.',
    field: 'photo',
  },
  upload_site_sha256_unique: {
    code: 'duplicate',
    message: 'This file is already in the register.',
    field: 'file',
  },
  column_layout_site_name_version_unique: {
    code: 'taken',
    message: 'A column layout of this name was saved a moment ago. Save again.',
    field: 'layoutName',
  },
  limit_set_site_title_edition_unique: {
    code: 'taken',
    message: 'A limit set with this title and edition exists. Change the title or the edition.',
    field: 'title',
  },
  area_site_parent_name_unique: {
    code: 'taken',
    message: 'An area of this name exists here.',
    field: 'area',
  },
  area_site_name_top_unique: {
    code: 'taken',
    message: 'An area of this name exists here.',
    field: 'area',
  },
  plane_rotor_name_unique: {
    code: 'taken',
    message: 'Two planes of this rotor have the same name. Name them apart.',
    field: 'planes',
  },
  point_machine_label_unique: {
    code: 'taken',
    message: 'Two points of this machine have the same name. Name them apart.',
    field: 'points',
  },
  balance_job_rotor_open_unique: {
    code: 'open-job',
    message: 'This rotor has an open balance job. Finish or stop that one first.',
  },
  reading_point_kind_taken_unique: {
    code: 'same-time',
    message:
      'This point already has a kept reading of that time. Correct the time, or hold this one.',
    field: 'takenAt',
  },
  one_x_vector_point_taken_unique: {
    code: 'same-time',
    message:
      'This point already has a kept vector of that time. Correct the time, or hold this one.',
    field: 'takenAt',
  },
  measured_record_supersedes_unique: {
    code: 'superseded',
    message: 'This record was corrected a moment ago. Open the newer one.',
  },
  sign_off_job_person_unique: {
    code: 'signed-already',
    message: 'You signed this record already. A second pair of eyes signs it.',
  },
  addendum_job_number_unique: {
    code: 'busy',
    message: 'Somebody added an addendum at the same moment. Read it, then add yours again.',
  },
  run_job_number_unique: {
    code: 'busy',
    message:
      'Somebody recorded a run of this job at the same moment. Look at it, then record again.',
  },
};

/** The failure that a violated unique constraint means, if it is one of ours. */
export function constraintFailure(error: UniqueConstraintViolationException): Failure | null {
  const named = error as { constraint?: unknown };
  const name = typeof named.constraint === 'string' ? named.constraint : '';
  return BY_CONSTRAINT[name] ?? null;
}
