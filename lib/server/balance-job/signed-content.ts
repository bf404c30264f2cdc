import 'server-only';
import { z } from 'zod';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import type { RecordExtras } from './record-extras';

/**
 * What a signature freezes: the job as its record shows it, and who took the machine back. Records
 * signed early hold no equipment and no cautions; those are facts of their own.
 */
export type SignedJob = BalanceJobDto & { areaOwner: string } & Partial<RecordExtras>;

const outline = z.looseObject({
  id: z.number(),
  number: z.number(),
  areaOwner: z.string(),
  runs: z.array(z.unknown()),
  weights: z.array(z.unknown()),
});

/** Reads frozen content back; throws where it is not what `signJob` writes. */
export function signedContent(content: unknown): SignedJob {
  outline.parse(content);
  return content as SignedJob;
}
