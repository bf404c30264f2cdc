import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { CautionShown } from '@/entities/caution';

/** Notes that cautions were ticked at a step, by whom, and who was named at the machine. */
export function recordCautions(
  em: EntityManager,
  at: { jobId: number; personId: number; now: Date; step: string },
  cautionIds: readonly string[],
  namedPerson: string | null,
): void {
  for (const cautionId of cautionIds) {
    em.create(CautionShown, {
      job: at.jobId,
      cautionId,
      version: 1,
      step: at.step,
      namedPerson,
      person: at.personId,
      at: at.now,
    });
  }
}
