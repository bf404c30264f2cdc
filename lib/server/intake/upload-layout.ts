import 'server-only';
import { z } from 'zod';
import type { ColumnLayout } from '@/lib/domain/intake/column-layout';
import type { ColumnLayoutProposal } from '@/lib/domain/intake/propose-column-layout';

const column = z.object({
  index: z.number().int(),
  role: z.enum(['time', 'signal', 'tacho', 'ignore']),
  name: z.string(),
  quantity: z.enum(['acceleration', 'velocity', 'displacement']).nullable(),
  unit: z.enum(['g', 'm/s2', 'mm/s', 'in/s', 'um', 'mil', 's', 'ms', 'us']).nullable(),
});

const layout = z.object({
  delimiter: z.enum([',', ';', '\t']).nullable(),
  decimalMark: z.enum(['point', 'comma']).nullable(),
  encoding: z.enum(['utf-8', 'utf-16le', 'utf-16be', 'latin-1']),
  headerRow: z.boolean(),
  columns: z.array(column).readonly(),
  sampleRateHz: z.number().nullable(),
  speedRpm: z.number().nullable(),
});

const uploadLayout = z.object({
  layout,
  shapeKey: z.string(),
  questions: z
    .array(
      z.object({
        code: z.string(),
        message: z.string(),
        field: z.string(),
        blocking: z.boolean(),
      }),
    )
    .readonly(),
  /** Why the file cannot be read as proposed, if it cannot. */
  problem: z.string().nullable(),
});

/** What an upload keeps of how it is read, by value. */
export type UploadLayout = z.infer<typeof uploadLayout>;

/** Reads back what an upload keeps; null where it keeps nothing. */
export function readUploadLayout(stored: unknown): UploadLayout | null {
  const read = uploadLayout.safeParse(stored);
  return read.success ? read.data : null;
}

/** Reads back the layout a saved column layout holds. */
export function readColumnLayout(stored: unknown): ColumnLayout | null {
  const read = layout.safeParse(stored);
  return read.success ? read.data : null;
}

/** Fits the fingerprint of a file's shape into its column. */
export function keyOfShape({ shapeKey }: Pick<ColumnLayoutProposal, 'shapeKey'>): string {
  return shapeKey.slice(0, 400);
}
