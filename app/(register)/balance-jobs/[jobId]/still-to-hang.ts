import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import type { PlacementDto } from '@/lib/schemas/balance-job-parts';

type Planned = PlacementDto['choices'][number]['weights'][number];

/**
 * Weights of the plan for a plane's positions that are not on the ledger yet: what is hung at a position
 * since the answer was accepted counts, whatever its mass. Empty without a plan.
 */
export function stillToHang(job: BalanceJobDto, planeId: number): Planned[] {
  const plan = job.placements
    .find((placement) => placement.planeId === planeId)
    ?.choices.find(({ proposed }) => proposed);
  if (!plan) return [];
  if (job.step.step !== 'fit correction') return plan.weights;
  const since = job.accepted.at(-1)?.acceptedAt ?? '';
  const hung = job.weights.filter(
    (weight) =>
      weight.planeId === planeId &&
      weight.purpose === 'correction' &&
      weight.endedAt === null &&
      weight.fittedAt >= since,
  );
  return plan.weights.filter(
    ({ label }) => !hung.some(({ positionLabel }) => positionLabel === label),
  );
}
