import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { BalanceJob } from './balance-job';
import { Person } from './person';

/**
 * A later remark to a signed job record. It stands outside the signed content; its hash covers its own
 * words and the hash before it, the signed one for the first.
 */
export const Addendum = defineEntity({
  name: 'Addendum',
  tableName: 'addendum',
  uniques: [{ name: 'addendum_job_number_unique', properties: ['job', 'number'] }],
  checks: [{ name: 'addendum_number_check', expression: 'number >= 1' }],
  properties: {
    id: p.integer().primary(),
    job: () => p.manyToOne(BalanceJob).ref(),
    number: p.integer(),
    text: p.string().length(2000),
    reason: p.string().length(400),
    person: () => p.manyToOne(Person).ref(),
    personName: p.string().length(120),
    role: p.string().length(40),
    at: p.datetime(),
    previousHash: p.string().length(64),
    hash: p.string().length(64),
  },
});
export type Addendum = InferEntity<typeof Addendum>;
