import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import type { JobInput } from '@/lib/domain/balancing/job-input';
import type { JobSolution } from '@/lib/domain/balancing/job-solution';
import { BalanceJob, Run } from './balance-job';
import { Person } from './person';
import { Plane, Rotor } from './rotor';
import { Point } from './bearing';
import { Setup } from './setup';

/** An answer somebody accepted: inputs by value, method and result, so that it recomputes. */
export const Answer = defineEntity({
  name: 'Answer',
  tableName: 'answer',
  uniques: [{ name: 'answer_job_number_unique', properties: ['job', 'number'] }],
  properties: {
    id: p.integer().primary(),
    job: () => p.manyToOne(BalanceJob).ref(),
    number: p.integer(),
    kind: p.enum(['correction', 'trim'] as const),
    /** The newest run the answer was computed from. */
    afterRunNumber: p.integer(),
    method: p.string().length(60),
    inputs: p.json<JobInput>(),
    result: p.json<JobSolution>(),
    acceptedBy: () => p.manyToOne(Person).ref(),
    acceptedAt: p.datetime(),
  },
});
export type Answer = InferEntity<typeof Answer>;

/** One estimate of an influence coefficient, per g·mm, in the coefficient book. */
export const Coefficient = defineEntity({
  name: 'Coefficient',
  tableName: 'coefficient',
  indexes: [{ name: 'coefficient_rotor_index', properties: ['rotor', 'plane', 'point'] }],
  checks: [{ name: 'coefficient_speed_check', expression: 'speed_rpm > 0' }],
  properties: {
    id: p.integer().primary(),
    rotor: () => p.manyToOne(Rotor).ref(),
    plane: () => p.manyToOne(Plane).ref(),
    point: () => p.manyToOne(Point).ref(),
    setup: () => p.manyToOne(Setup).ref(),
    speedRpm: p.double().$type<number>(),
    unit: p.enum(['mm/s rms', 'µm p-p'] as const),
    rePerGmm: p.double().$type<number>(),
    imPerGmm: p.double().$type<number>(),
    source: p.enum(['trial', 'fitted weight', 'fit over all runs'] as const),
    job: () => p.manyToOne(BalanceJob).ref(),
    run: () => p.manyToOne(Run).ref().nullable(),
    grade: p.enum(['good', 'with care', 'not for reuse'] as const),
    madeAt: p.datetime(),
  },
});
export type Coefficient = InferEntity<typeof Coefficient>;
