import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Plane, Position } from '@/entities/rotor';
import { placeOfWeight, type TypedPlace } from '@/lib/domain/balance-job/place-of-weight';
import { fail, ok, type Result } from '@/lib/domain/result';

type Typed = Omit<TypedPlace, 'position'> & { planeId: number; positionId: number | null };

/** The plane, position and rotor angle of a typed place. The plane must belong to the rotor in hand. */
export async function resolvePlace(
  em: EntityManager,
  typed: Typed,
): Promise<Result<{ plane: Plane; position: Position | null; angleDeg: number }>> {
  const plane = await em.findOneOrFail(Plane, { id: typed.planeId });
  const position =
    typed.positionId === null
      ? null
      : await em.findOne(Position, { id: typed.positionId, plane: plane.id });
  if (typed.positionId !== null && !position)
    return fail('other-plane', 'This position is not in that plane.', 'positionId');
  if (plane.kind === 'fixed positions' && !position)
    return fail('input', `Plane ${plane.name} has fixed positions: choose one.`, 'positionId');
  const angle = placeOfWeight({ ...typed, position });
  return angle.ok ? ok({ plane, position, angleDeg: angle.value }) : angle;
}
