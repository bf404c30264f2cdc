import type { EntityManager } from '@mikro-orm/postgresql';
import { LimitSet } from '@/entities/limit-set';
import { chooseLimitSets } from '@/lib/domain/severity/choose-limit-sets';
import { SHIPPED_LIMIT_SETS } from '@/lib/domain/severity/shipped-limit-sets';
import type { MachineSpec } from './machine-spec';

/** Enters the shipped limit sets; hands back each by its key. */
export function seedLimitSets(em: EntityManager, enteredAt: Date): Map<string, LimitSet> {
  return new Map(
    SHIPPED_LIMIT_SETS.map(({ key, boundaries, ...set }) => [
      key,
      em.create(LimitSet, {
        title: set.title,
        edition: set.edition,
        quantity: set.quantity,
        unit: set.unit,
        bandLowHz: set.bandLowHz,
        bandHighHz: set.bandHighHz,
        bAb: boundaries.ab,
        bBc: boundaries.bc,
        bCd: boundaries.cd,
        speedMinRpm: set.speedMinRpm,
        speedMaxRpm: set.speedMaxRpm,
        powerMinKw: set.powerMinKw,
        powerMaxKw: set.powerMaxKw,
        support: set.support,
        citation: set.citation,
        enteredAt,
      }),
    ]),
  );
}

/** The shipped set that fits a machine. */
export function limitSetFor(spec: MachineSpec, sets: Map<string, LimitSet>): LimitSet {
  const { powerKw, speedRpm, support = 'rigid', limits } = spec;
  const fitting = chooseLimitSets({ powerKw, speedRpm, support }, limits, SHIPPED_LIMIT_SETS);
  const chosen = fitting.ok ? sets.get(fitting.value[0]?.key ?? '') : undefined;
  if (!chosen) throw new Error(`No shipped limit set fits ${spec.tag}`);
  return chosen;
}
