import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { Machine } from './machine';
import { Person } from './person';
import { Site } from './site';

/** Zone boundaries as data. Shipped sets have no site; a site may add its own. */
export const LimitSet = defineEntity({
  name: 'LimitSet',
  tableName: 'limit_set',
  checks: [
    { name: 'limit_set_order_check', expression: '0 < b_ab and b_ab < b_bc and b_bc < b_cd' },
    { name: 'limit_set_band_check', expression: '0 < band_low_hz and band_low_hz < band_high_hz' },
  ],
  properties: {
    id: p.integer().primary(),
    site: () => p.manyToOne(Site).ref().nullable(),
    title: p.string().length(160),
    edition: p.string().length(120),
    quantity: p.enum(['velocity', 'displacement'] as const).default('velocity'),
    unit: p.string().length(20).default('mm/s rms'),
    bandLowHz: p.double().$type<number>().default(10),
    bandHighHz: p.double().$type<number>().default(1000),
    bAb: p.double().$type<number>(),
    bBc: p.double().$type<number>(),
    bCd: p.double().$type<number>(),
    speedMinRpm: p.double().$type<number>().nullable(),
    speedMaxRpm: p.double().$type<number>().nullable(),
    powerMinKw: p.double().$type<number>().nullable(),
    powerMaxKw: p.double().$type<number>().nullable(),
    support: p.enum(['rigid', 'flexible', 'any'] as const).default('any'),
    citation: p.string().length(400),
    state: p.enum(['in use', 'retired'] as const).default('in use'),
    enteredBy: () => p.manyToOne(Person).ref().nullable(),
    enteredAt: p.datetime(),
  },
});
export type LimitSet = InferEntity<typeof LimitSet>;

/** Which limit set judges a machine, from when, and why. */
export const LimitUse = defineEntity({
  name: 'LimitUse',
  tableName: 'limit_use',
  properties: {
    id: p.integer().primary(),
    machine: () => p.manyToOne(Machine).ref(),
    limitSet: () => p.manyToOne(LimitSet).ref(),
    fromAt: p.datetime(),
    toAt: p.datetime().nullable(),
    reason: p.string().length(400),
    person: () => p.manyToOne(Person).ref().nullable(),
  },
});
export type LimitUse = InferEntity<typeof LimitUse>;
