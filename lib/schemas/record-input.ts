import { z } from 'zod';
import { id, text } from './number';

/** In what capacity somebody signs beneath the first signature. */
export const CAPACITIES = ['reliability engineer', 'area owner'] as const;

export const addAddendumInput = z.object({
  jobId: id,
  text: text('the remark', 2000),
  reason: text('why it is added', 400),
});

export const cosignRecordInput = z.object({
  jobId: id,
  capacity: z.enum(CAPACITIES, { error: 'Say as what you sign.' }),
  statement: text('your statement', 1000),
});
