import 'server-only';
import type { EntityManager, Loaded } from '@mikro-orm/postgresql';
import { Point } from '@/entities/bearing';
import { LimitUse, type LimitSet } from '@/entities/limit-set';
import { Setup } from '@/entities/setup';
import type { Band } from '@/lib/domain/signal/band';

/** A point with all that a record taken there is judged by. */
export type PointContext = {
  readonly point: Loaded<Point, 'machine' | 'bearing'>;
  /** The limits in use at the time, if the machine has any. */
  readonly limitSet: LimitSet | null;
  /** The set-up valid at the time. */
  readonly setup: Setup | null;
};

/** Loads what judges a record of a point taken at a time. */
export async function loadPointContext(
  em: EntityManager,
  pointId: number,
  takenAt: Date,
): Promise<PointContext> {
  const point = await em.findOneOrFail(
    Point,
    { id: pointId },
    { populate: ['machine', 'bearing'] },
  );
  const machine = point.machine.id;
  const uses = await em.find(
    LimitUse,
    { machine },
    { populate: ['limitSet'], orderBy: { fromAt: 'desc' } },
  );
  // Records from before the first use are judged by it: there is nothing older to judge them by.
  const use = uses.find(({ fromAt }) => fromAt <= takenAt) ?? uses.at(-1);
  const setup = await em.findOne(
    Setup,
    {
      machine,
      validFrom: { $lte: takenAt },
      $or: [{ validTo: null }, { validTo: { $gt: takenAt } }],
    },
    { orderBy: { number: 'desc' } },
  );
  return { point, limitSet: use?.limitSet.$ ?? null, setup };
}

/** The band of the limits; without limits for velocity 10–1000 Hz, from 2 Hz for slow machines. */
export function bandOf({ limitSet, point }: PointContext): Band {
  if (limitSet?.quantity === 'velocity')
    return { lowHz: limitSet.bandLowHz, highHz: limitSet.bandHighHz };
  return { lowHz: point.machine.$.nominalSpeedRpm <= 600 ? 2 : 10, highHz: 1000 };
}
