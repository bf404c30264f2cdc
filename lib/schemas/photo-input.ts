import { z } from 'zod';
import { id, tick } from './number';

/** Largest photo that is taken, bytes. */
export const PHOTO_BYTES_MAX = 50_000_000;

/** How a weight is held: everything but `temporary` is meant to stay. */
export const FIXING_KINDS = ['temporary', 'weld', 'bolt', 'rivet', 'set screw', 'clip'] as const;
export type FixingKind = (typeof FIXING_KINDS)[number];

/** Why a weight is recorded without a photo; `other` is written out. */
export const NO_PHOTO_REASONS = [
  'no camera allowed here',
  'too dark',
  'out of reach of the camera',
  'later',
  'other',
] as const;

/** A chosen file; an empty file box sends a file of no bytes, with no name or with “undefined”. */
const chosenFile = z
  .union([z.instanceof(File), z.literal(''), z.null()], { error: 'Choose a photo.' })
  .default(null)
  .transform((file) => (file instanceof File && file.size > 0 ? file : null));

/** What a fit card says of fixing and photo, beside mass and place. */
export const fixingFields = {
  fixingKind: z.enum(FIXING_KINDS, { error: 'Say how the weight is held.' }),
  secured: tick,
  earthClamp: tick,
  photo: chosenFile,
  noPhoto: z.enum([...NO_PHOTO_REASONS, '']).default(''),
  noPhotoOther: z.string().trim().max(180, 'Keep the reason within 180 characters.').default(''),
};

export const addPhotoInput = z.object({ jobId: id, weightId: id, photo: chosenFile });
