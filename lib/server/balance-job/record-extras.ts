import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { CautionShown } from '@/entities/caution';
import type { CautionLine, EquipmentDto } from '@/lib/schemas/job-record';
import type { VisibleJob } from './load-job';

/** What a job record holds beyond the run sheet. */
export type RecordExtras = { equipment: EquipmentDto; cautions: CautionLine[] };

/** Measuring equipment as the set-up of the job describes it, and the cautions confirmed. */
export async function recordExtras(em: EntityManager, job: VisibleJob): Promise<RecordExtras> {
  const { pulsesPerTurn, supportNote, sensorPlaces } = job.setup.$;
  const shown = await em.find(
    CautionShown,
    { job: job.id },
    { orderBy: { id: 'asc' }, populate: ['person'] },
  );
  return {
    equipment: { pulsesPerTurn, supportNote: supportNote ?? null, sensors: sensorPlaces },
    cautions: shown.map(({ cautionId, step, namedPerson, person, at }) => ({
      cautionId,
      step,
      namedPerson: namedPerson ?? null,
      person: person.$.name,
      at: at.toISOString(),
    })),
  };
}
