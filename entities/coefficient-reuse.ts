import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import type { StoredCoefficient } from '@/lib/domain/balancing/job-input';
import { BalanceJob } from './balance-job';
import { Person } from './person';

/** Coefficients of the book that a job uses instead of trial runs, kept by value as they were then. */
export const CoefficientReuse = defineEntity({
  name: 'CoefficientReuse',
  tableName: 'coefficient_reuse',
  indexes: [{ name: 'coefficient_reuse_job_index', properties: ['job'] }],
  checks: [{ name: 'coefficient_reuse_speed_check', expression: 'speed_rpm > 0' }],
  properties: {
    id: p.integer().primary(),
    job: () => p.manyToOne(BalanceJob).ref(),
    speedRpm: p.double().$type<number>(),
    coefficients: p.json<StoredCoefficient[]>(),
    /** The worst grade among them. */
    grade: p.enum(['good', 'with care'] as const),
    /** What the person said is the same as when they were measured. */
    confirmed: p.json<string[]>(),
    reason: p.string().length(1000).nullable(),
    person: () => p.manyToOne(Person).ref(),
    at: p.datetime(),
    withdrawnAt: p.datetime().nullable(),
    withdrawnBy: () => p.manyToOne(Person).ref().nullable(),
    withdrawReason: p.string().length(1000).nullable(),
  },
});
export type CoefficientReuse = InferEntity<typeof CoefficientReuse>;
