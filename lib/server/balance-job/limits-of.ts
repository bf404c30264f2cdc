import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { LimitUse } from '@/entities/limit-set';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';

/** The limit set that judges a machine now; null where none is in use. */
export async function limitsOf(
  em: EntityManager,
  machineId: number,
): Promise<BalanceJobDto['limits']> {
  const use = await em.findOne(
    LimitUse,
    { machine: machineId, toAt: null },
    { populate: ['limitSet'] },
  );
  if (!use) return null;
  const { title, edition, unit, bAb, bBc, bCd } = use.limitSet.$;
  return { title, edition, unit, bAb, bBc, bCd };
}
