import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { CautionShown } from '@/entities/caution';
import { CAUTIONS } from '@/lib/domain/cautions';

/** A caution of the list, or the sentence that stands on every job. */
export type CautionId = keyof typeof CAUTIONS | 'standing sentence';

/** Notes that cautions were ticked at a step, by whom, and who was named at the machine. */
export function recordCautions(
  em: EntityManager,
  at: { jobId: number; personId: number; now: Date; step: string },
  cautionIds: readonly CautionId[],
  namedPerson: string | null,
): void {
  for (const cautionId of cautionIds) {
    em.create(CautionShown, {
      job: at.jobId,
      cautionId,
      version: cautionId === 'standing sentence' ? 1 : CAUTIONS[cautionId].version,
      step: at.step,
      namedPerson,
      person: at.personId,
      at: at.now,
    });
  }
}
