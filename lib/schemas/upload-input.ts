import { z } from 'zod';
import { id, optionalNumber, text } from './number';

/** Largest file one upload may have: the server takes 64 MB with everything around it. */
export const UPLOAD_BYTES_MAX = 60_000_000;

const optionalId = z
  .union([z.literal(''), z.null(), id])
  .default(null)
  .transform((value) => (typeof value === 'number' ? value : null));

export const receiveUploadInput = z.object({
  fileName: text('the name of the file', 200),
  bytes: z.instanceof(Uint8Array<ArrayBufferLike>),
  siteId: optionalId,
  pointId: optionalId,
});

const DELIMITERS = { comma: ',', semicolon: ';', tab: '\t', none: null } as const;
export type DelimiterName = keyof typeof DELIMITERS;

/** The word for a delimiter, as forms and addresses carry it. */
export function delimiterName(delimiter: ',' | ';' | '\t' | null): DelimiterName {
  if (delimiter === ',') return 'comma';
  if (delimiter === ';') return 'semicolon';
  return delimiter === '\t' ? 'tab' : 'none';
}

const columnChoice = z.object({
  role: z.enum(['time', 'signal', 'tacho', 'ignore'], {
    error: 'Choose what the column is read as.',
  }),
  unit: z
    .union([
      z.literal('').transform(() => null),
      z.enum(['g', 'm/s2', 'mm/s', 'in/s', 'um', 'mil', 's', 'ms', 'us']),
      z.null(),
    ])
    .default(null),
});

export const layoutChoices = z.object({
  delimiter: z
    .enum(['comma', 'semicolon', 'tab', 'none'], { error: 'Choose what separates the columns.' })
    .transform((name) => DELIMITERS[name]),
  decimalMark: z
    .union([z.literal('').transform(() => null), z.enum(['point', 'comma']), z.null()])
    .default(null),
  sampleRateHz: optionalNumber({ what: 'the sample rate', unit: 'Hz', above: 0, max: 1e7 }),
  columns: z.array(columnChoice).max(200).default([]),
});
export type LayoutChoicesInput = z.input<typeof layoutChoices>;

export const confirmUploadInput = z.object({
  uploadId: id,
  layout: layoutChoices,
  layoutName: z
    .string()
    .trim()
    .max(80, 'Keep the name of the column layout within 80 characters.')
    .default(''),
  pointId: z.coerce.number({ error: 'Choose the point.' }).int().positive('Choose the point.'),
  takenAt: z.string({ error: 'Write when the record was taken.' }).trim(),
  speedRpm: optionalNumber({ what: 'the speed', unit: 'r/min', above: 0, max: 500_000 }),
  note: z.string().trim().max(1000, 'Keep the note within 1000 characters.').default(''),
});

const reason = text('the reason', 1000);

export const settleUploadInput = z.object({ uploadId: id, reason });
export const settleRecordInput = z.object({ recordId: id, reason });
export const rehomeInput = z.object({
  recordId: id,
  pointId: z.coerce.number({ error: 'Choose the point.' }).int().positive('Choose the point.'),
  reason,
});
