import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { Plane, Position } from '@/entities/rotor';
import { Weight } from '@/entities/weight';
import { fail, type Result } from '@/lib/domain/result';

/** Refuses a weight that exceeds what its plane or position may carry, with what hangs there now. */
export async function roomFailure(
  em: EntityManager,
  plane: Plane,
  position: Position | null,
  massG: number,
): Promise<Result<never> | null> {
  const on = await em.find(Weight, { plane: plane.id, endedAt: null });
  const total = on.reduce((sum, weight) => sum + weight.massG, 0);
  if (plane.maxGTotal && total + massG > plane.maxGTotal)
    return over(`plane ${plane.name}`, total, massG, plane.maxGTotal);
  if (!position?.maxG) return null;
  const here = on
    .filter((weight) => weight.position?.id === position.id)
    .reduce((sum, weight) => sum + weight.massG, 0);
  return here + massG > position.maxG ? over(position.label, here, massG, position.maxG) : null;
}

function over(where: string, now: number, more: number, limit: number) {
  return fail(
    'over-limit',
    `With ${more} g more, ${where} would carry ${(now + more).toFixed(1)} g; its limit is ${limit} g ` +
      `and ${now.toFixed(1)} g hang there now. Use a smaller weight or another place.`,
    'massG',
  );
}
