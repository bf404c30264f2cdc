import 'server-only';
import type { EntityManager, Loaded } from '@mikro-orm/postgresql';
import type { Point } from '@/entities/bearing';
import { Position, type Plane } from '@/entities/rotor';
import type { Setup } from '@/entities/setup';
import { Weight } from '@/entities/weight';
import type { LedgerWeightDto, PlaneDto, PointDto, SetupDto } from '@/lib/schemas/balance-job';

/** Planes with their fixed positions, as screens see them. */
export async function planeDtos(em: EntityManager, planes: readonly Plane[]): Promise<PlaneDto[]> {
  const positions = await em.find(
    Position,
    { plane: { $in: planes.map((plane) => plane.id) } },
    { orderBy: { number: 'asc' } },
  );
  return planes.map((plane) => ({
    id: plane.id,
    name: plane.name,
    radiusMm: plane.radiusMm,
    fromAM: plane.fromAM ?? null,
    kind: plane.kind,
    maxGTotal: plane.maxGTotal ?? null,
    pieceG: plane.pieceG ?? null,
    positions: positions
      .filter((position) => position.plane.id === plane.id)
      .map(({ id, label, angleDeg, maxG }) => ({ id, label, angleDeg, maxG: maxG ?? null })),
  }));
}

const DIRECTIONS = { H: 'horizontal', V: 'vertical', A: 'axial' } as const;

/** A point in words: bearing and direction. The bearing must be loaded. */
export function pointDto(point: Loaded<Point, 'bearing'>): PointDto {
  const direction =
    point.direction === 'degrees'
      ? `${point.directionDeg ?? 0}° from top`
      : DIRECTIONS[point.direction];
  return { id: point.id, label: point.label, bearing: point.bearing.$.label, direction };
}

/** The set-up as a job shows it. */
export function setupDto(setup: Setup): SetupDto {
  return {
    number: setup.number,
    mark: setup.markDescription,
    tachoDeg: setup.tachoDeg,
    tachoEdge: setup.tachoEdge,
    rotationFromDriveEnd: setup.rotationFromDriveEnd,
  };
}

/** Weights of a ledger; plane, position and persons must be loaded. */
export function weightDto(
  weight: Loaded<Weight, 'plane' | 'position' | 'fittedBy' | 'endedBy'>,
): LedgerWeightDto {
  return {
    id: weight.id,
    planeId: weight.plane.id,
    planeName: weight.plane.$.name,
    positionLabel: weight.position?.$.label ?? null,
    massG: weight.massG,
    massSource: weight.massSource,
    radiusMm: weight.radiusMm,
    angleDeg: weight.angleDeg,
    purpose: weight.purpose,
    fixing: weight.fixing,
    permanent: weight.permanent,
    fittedAt: weight.fittedAt.toISOString(),
    fittedBy: weight.fittedBy.$.name,
    stays: weight.stays ?? null,
    endedAt: weight.endedAt?.toISOString() ?? null,
    ending: weight.ending ?? null,
    endReason: weight.endReason ?? null,
    endedBy: weight.endedBy?.$.name ?? null,
    enteredAngleDeg: weight.entered.angleDeg,
    enteredSense: weight.entered.angleSense,
  };
}

/** What hangs on a rotor, with what `weightDto` needs. */
export function weightsOnRotor(em: EntityManager, rotorId: number) {
  return em.find(
    Weight,
    { rotor: rotorId, endedAt: null },
    { orderBy: { id: 'asc' }, populate: ['plane', 'position', 'fittedBy', 'endedBy'] },
  );
}
