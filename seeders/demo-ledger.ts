import type { EntityManager } from '@mikro-orm/postgresql';
import { Weight } from '@/entities/weight';
import type { ModelledWeight } from '@/lib/domain/plant-model/unbalance-at';
import type { DemoMachine } from './demo-machine';

/** The ledger's weights of a machine as the model sees them, with the time they were on the rotor. */
export type DemoLedger = readonly (ModelledWeight & { fittedAt: Date; endedAt: Date | null })[];

/** Reads a machine's ledger. Weights from before the register are part of the model's own unbalance. */
export async function ledgerOf(em: EntityManager, machine: DemoMachine): Promise<DemoLedger> {
  const weights = await em.find(Weight, { rotor: machine.rotorId, job: { $ne: null } });
  return weights.map(({ plane, massG, radiusMm, angleDeg, fittedAt, endedAt }) => ({
    plane: machine.planeIds.indexOf(plane.id),
    massG,
    radiusMm,
    angleDeg,
    fittedAt,
    endedAt: endedAt ?? null,
  }));
}

/** What hung on the rotor at a time. */
export function weightsOn(ledger: DemoLedger, at: Date): ModelledWeight[] {
  return ledger.filter(
    ({ fittedAt, endedAt }) => fittedAt <= at && (endedAt === null || endedAt > at),
  );
}
