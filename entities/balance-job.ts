import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { JOB_KINDS } from '@/lib/domain/balance-job/job-kinds';
import { Machine } from './machine';
import { MeasuredRecord } from './measured-record';
import { Person } from './person';
import { Plane, Rotor } from './rotor';
import { Point } from './bearing';
import { Setup } from './setup';
import { Site } from './site';

export type JobTargets = {
  /** 1x below this at every point, in the job's unit. */
  oneX: number | null;
  /** Overall velocity zone to reach. */
  zone: 'A' | 'B' | null;
  /** Whether the ISO 21940-11 estimate in place must pass. */
  grade: boolean;
};

/** A balance job: base, trials, answer, fit, check, trim, sign. */
export const BalanceJob = defineEntity({
  name: 'BalanceJob',
  tableName: 'balance_job',
  uniques: [{ name: 'balance_job_site_number_unique', properties: ['site', 'number'] }],
  properties: {
    id: p.integer().primary(),
    site: () => p.manyToOne(Site).ref(),
    number: p.integer(),
    machine: () => p.manyToOne(Machine).ref(),
    rotor: () => p.manyToOne(Rotor).ref(),
    setup: () => p.manyToOne(Setup).ref(),
    kind: p.enum([...JOB_KINDS]),
    reason: p.string().length(1000),
    unit: p.enum(['mm/s rms', 'µm p-p'] as const),
    /** How this job's people read phase and count angles; converted once, at the edge. */
    phaseSense: p.enum(['lag', 'lead'] as const),
    angleSense: p.enum(['against', 'with'] as const),
    targets: p.json<JobTargets>(),
    startsAllowed: p.integer().nullable(),
    /** Whether the rotor was cleaned and looked at before; null for jobs from before it was asked. */
    cleaned: p.enum(['yes', 'no', 'cannot be'] as const).nullable(),
    state: p.enum([
      'opened',
      'base taken',
      'answered',
      'signed',
      'stopped safe',
      'not a balance job',
    ] as const),
    openedBy: () => p.manyToOne(Person).ref(),
    openedAt: p.datetime(),
    closedAt: p.datetime().nullable(),
    closingNote: p.string().length(2000).nullable(),
  },
});
export type BalanceJob = InferEntity<typeof BalanceJob>;

/** The correction planes of a job, in the order their trials are run. */
export const JobPlane = defineEntity({
  name: 'JobPlane',
  tableName: 'job_plane',
  uniques: [
    { name: 'job_plane_job_plane_unique', properties: ['job', 'plane'] },
    { name: 'job_plane_job_order_unique', properties: ['job', 'order'] },
  ],
  properties: {
    id: p.integer().primary(),
    job: () => p.manyToOne(BalanceJob).ref(),
    plane: () => p.manyToOne(Plane).ref(),
    order: p.integer().fieldName('plane_order'),
  },
});
export type JobPlane = InferEntity<typeof JobPlane>;

/** The points read in every run of a job. */
export const JobPoint = defineEntity({
  name: 'JobPoint',
  tableName: 'job_point',
  uniques: [
    { name: 'job_point_job_point_unique', properties: ['job', 'point'] },
    { name: 'job_point_job_order_unique', properties: ['job', 'order'] },
  ],
  properties: {
    id: p.integer().primary(),
    job: () => p.manyToOne(BalanceJob).ref(),
    point: () => p.manyToOne(Point).ref(),
    order: p.integer().fieldName('point_order'),
  },
});
export type JobPoint = InferEntity<typeof JobPoint>;

/**
 * One weight as it was on the rotor during a run, copied from the ledger by value. An older weight that the
 * job took off stands here as the same weight on the opposite side, which does the same.
 */
export type WeightOnRotor = {
  weightId: number;
  planeId: number;
  massG: number;
  radiusMm: number;
  angleDeg: number;
  takenOff?: true;
};

/** A run of a job. Immutable; a slip is lined through and run again. */
export const Run = defineEntity({
  name: 'Run',
  tableName: 'run',
  uniques: [{ name: 'run_job_number_unique', properties: ['job', 'number'] }],
  checks: [{ name: 'run_speed_check', expression: 'speed_rpm > 0' }],
  properties: {
    id: p.integer().primary(),
    job: () => p.manyToOne(BalanceJob).ref(),
    number: p.integer(),
    purpose: p.enum(['base', 'trial', 'check'] as const),
    takenAt: p.datetime(),
    speedRpm: p.double().$type<number>(),
    setup: () => p.manyToOne(Setup).ref(),
    /** Weights fitted since the job was opened that were on the rotor in this run. */
    weightsState: p.json<WeightOnRotor[]>(),
    state: p.enum(['kept', 'held', 'lined through'] as const).default('kept'),
    stateReason: p.string().length(1000).nullable(),
    /** The run that this one corrects: the same run as it really was. */
    replaces: () => p.manyToOne(Run).ref().nullable(),
    person: () => p.manyToOne(Person).ref(),
    createdAt: p.datetime(),
  },
});
export type Run = InferEntity<typeof Run>;

export type EnteredVector = {
  amplitude: number;
  unit: string;
  phaseDeg: number;
  phaseSense: 'lag' | 'lead';
};

/** One point's reading in a run: converted, and as it was typed. */
export const RunVector = defineEntity({
  name: 'RunVector',
  tableName: 'run_vector',
  uniques: [{ name: 'run_vector_run_point_unique', properties: ['run', 'point'] }],
  checks: [
    { name: 'run_vector_lag_check', expression: 'lag_deg >= 0 and lag_deg < 360' },
    { name: 'run_vector_amplitude_check', expression: 'amplitude >= 0' },
    { name: 'run_vector_overall_check', expression: 'overall is null or overall >= 0' },
  ],
  properties: {
    id: p.integer().primary(),
    run: () => p.manyToOne(Run).ref(),
    point: () => p.manyToOne(Point).ref(),
    amplitude: p.double().$type<number>(),
    lagDeg: p.double().$type<number>(),
    overall: p.double().$type<number>().nullable(),
    /** As typed; null where the vector came from an uploaded waveform. */
    entered: p.json<EnteredVector>().nullable(),
    record: () => p.manyToOne(MeasuredRecord).ref().nullable(),
  },
});
export type RunVector = InferEntity<typeof RunVector>;
