import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { BalanceJob } from './balance-job';
import { Person } from './person';

/** That a caution was shown and answered, at which step, by whom. */
export const CautionShown = defineEntity({
  name: 'CautionShown',
  tableName: 'caution_shown',
  indexes: [{ name: 'caution_shown_job_index', properties: ['job'] }],
  properties: {
    id: p.integer().primary(),
    job: () => p.manyToOne(BalanceJob).ref(),
    cautionId: p.string().length(20),
    version: p.integer(),
    step: p.string().length(60),
    /** The person named at the machine (lock holder, area owner), as typed. */
    namedPerson: p.string().length(120).nullable(),
    person: () => p.manyToOne(Person).ref(),
    at: p.datetime(),
  },
});
export type CautionShown = InferEntity<typeof CautionShown>;

/** A signature under a job record. The content is frozen with its hash. */
export const SignOff = defineEntity({
  name: 'SignOff',
  tableName: 'sign_off',
  uniques: [{ name: 'sign_off_job_person_unique', properties: ['job', 'person'] }],
  properties: {
    id: p.integer().primary(),
    job: () => p.manyToOne(BalanceJob).ref(),
    person: () => p.manyToOne(Person).ref(),
    personName: p.string().length(120),
    role: p.string().length(40),
    statement: p.string().length(1000),
    at: p.datetime(),
    contentHash: p.string().length(64),
    content: p.json<unknown>(),
  },
});
export type SignOff = InferEntity<typeof SignOff>;
