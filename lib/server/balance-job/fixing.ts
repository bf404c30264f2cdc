import 'server-only';
import type { BalanceJob } from '@/entities/balance-job';
import { WeightFixing } from '@/entities/photo';
import type { Weight } from '@/entities/weight';
import { fail, ok, type Result } from '@/lib/domain/result';
import type { FixingKind } from '@/lib/schemas/photo-input';
import type { CommandContext } from '../command';
import { keepPhoto } from '../photo/keep-photo';
import { preparePhoto, type PreparedPhoto } from '../photo/prepare-photo';
import { recordCautions } from './record-cautions';

type FixingInput = {
  fixingKind: FixingKind;
  secured: boolean;
  earthClamp: boolean;
  photo: File | null;
  noPhoto: string;
  noPhotoOther: string;
};

type Fixing = {
  kind: FixingKind;
  secured: boolean | null;
  photo: PreparedPhoto | null;
  photoName: string | null;
  noPhotoReason: string | null;
};

/** What must be so before a weight with this fixing is recorded, and its photo made ready. */
export async function readFixing(input: FixingInput): Promise<Result<Fixing>> {
  const { fixingKind: kind } = input;
  const loose = notHeld(input);
  if (loose) return loose;
  const facts = { kind, secured: kind === 'temporary' ? null : input.secured };
  if (!input.photo) {
    const noPhotoReason = reasonOf(input);
    if (!noPhotoReason.ok) return noPhotoReason;
    return ok({ ...facts, photo: null, photoName: null, noPhotoReason: noPhotoReason.value });
  }
  const prepared = await preparePhoto(input.photo);
  if (!prepared.ok) return prepared;
  const photo = prepared.value;
  return ok({ ...facts, photo, photoName: photo.fileName, noPhotoReason: null });
}

function notHeld({ fixingKind: kind, secured, earthClamp }: FixingInput): Result<never> | null {
  if (kind === 'weld' && !earthClamp)
    return fail(
      'caution',
      'Earth clamp on the rotor next to the weld, never through the bearings: tick it when it was so.',
      'earthClamp',
    );
  if (kind === 'temporary' || secured) return null;
  return fail('not-secured', `${SECURED[kind]} Tick it when it is so.`, 'secured');
}

function reasonOf({ noPhoto, noPhotoOther }: FixingInput): Result<string> {
  if (noPhoto === '')
    return fail(
      'photo-needed',
      'Take a photo of the weight with the mark in it, or say why there is none.',
      'photo',
    );
  if (noPhoto !== 'other') return ok(noPhoto);
  if (noPhotoOther !== '') return ok(noPhotoOther);
  return fail('reason-needed', 'Write why there is no photo.', 'noPhotoOther');
}

/** Writes how a weight was fixed, the caution of a weld, and its photo. */
export async function keepFixing(
  context: CommandContext,
  job: BalanceJob,
  weight: Weight,
  fixing: Fixing,
): Promise<void> {
  const { em, actor, now } = context;
  const { kind, secured, noPhotoReason, photo } = fixing;
  em.create(WeightFixing, { weight, kind, secured, noPhotoReason });
  if (kind === 'weld') {
    const at = { jobId: job.id, personId: actor.personId, now, step: `fit weight ${weight.id}` };
    recordCautions(em, at, ['SAF-10'], null);
  }
  if (photo) await keepPhoto(context, job.site, weight, photo);
}

/** What a permanent fixing needs before it carries. */
const SECURED: Readonly<Record<Exclude<FixingKind, 'temporary'>, string>> = {
  weld: 'The weld must be looked at and free of cracks.',
  bolt: 'The bolt must be torqued and locked.',
  rivet: 'The rivet must sit tight.',
  'set screw': 'The set screw must be torqued and locked.',
  clip: 'The clip must be locked where turning seats it.',
};
