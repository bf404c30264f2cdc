import 'server-only';
import type { EntityManager, Loaded } from '@mikro-orm/postgresql';
import type { Coefficient } from '@/entities/answer';
import type { Plane } from '@/entities/rotor';
import { summariseCoefficient } from '@/lib/domain/balancing/coefficient-book';
import { onePerJob } from '@/lib/domain/balancing/reusable-coefficients';
import { ledgerSum } from '@/lib/domain/balancing/weights-ledger';
import { angleDeg, size } from '@/lib/domain/complex';
import type { CoefficientLine, LedgerPlane } from '@/lib/schemas/register';
import { planeDtos, weightDto, weightsOnRotor } from '../balance-job/places';

/** Each plane of a rotor with what hangs there now and the vector sum of it. */
export async function ledgerPlanes(
  em: EntityManager,
  rotorId: number,
  planes: readonly Plane[],
): Promise<LedgerPlane[]> {
  const weights = (await weightsOnRotor(em, rotorId)).map((weight) => weightDto(weight));
  const dtos = await planeDtos(em, planes);
  return dtos.map((plane) => {
    const own = weights.filter((weight) => weight.planeId === plane.id);
    const {
      unbalanceGmm,
      angleDeg: deg,
      equivalentMassG,
      cleanUp,
    } = ledgerSum(own, plane.radiusMm);
    const sum = { unbalanceGmm, angleDeg: deg, equivalentMassG, cleanUp };
    return { ...plane, weights: own, sum: own.length > 0 ? sum : null };
  });
}

type Estimate = Loaded<Coefficient, 'plane' | 'point'>;

/** Estimates of one plane, point, set-up and unit as one line with its spread and grade. */
export function coefficientLines(estimates: readonly Estimate[]): CoefficientLine[] {
  const groups = new Map<string, Estimate[]>();
  const known = estimates.map((estimate) => {
    const { job, plane, point, source } = estimate;
    return { jobId: job.id, planeId: plane.id, pointId: point.id, source, estimate };
  });
  for (const { estimate } of onePerJob(known)) {
    const { plane, point, setup, unit } = estimate;
    const key = [plane.id, point.id, setup.id, unit].join(' ');
    groups.set(key, [...(groups.get(key) ?? []), estimate]);
  }
  return [...groups.values()].flatMap(lineOf).sort((a, b) => nameOf(a).localeCompare(nameOf(b)));
}

function nameOf({ planeName, pointLabel }: CoefficientLine): string {
  return `${planeName} ${pointLabel}`;
}

function lineOf(group: readonly Estimate[]): CoefficientLine[] {
  const [first] = group;
  const entry = summariseCoefficient(
    group.map(({ rePerGmm, imPerGmm }) => ({ re: rePerGmm, im: imPerGmm })),
  );
  if (!first || !entry) return [];
  const mean = { re: entry.rePerGmm, im: entry.imPerGmm };
  return [
    {
      planeName: first.plane.$.name,
      pointLabel: first.point.$.label,
      unit: first.unit,
      speedRpm: first.speedRpm,
      sizePerKgMm: 1000 * size(mean),
      deg: angleDeg(mean),
      count: entry.count,
      spreadPct: entry.spreadPct,
      grade: entry.grade,
    },
  ];
}
