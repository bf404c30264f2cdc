import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { Area, Site } from './site';
import { Person } from './person';

/** A machine of the register. Retired, never deleted. */
export const Machine = defineEntity({
  name: 'Machine',
  tableName: 'machine',
  uniques: [{ name: 'machine_site_tag_unique', properties: ['site', 'tagKey'] }],
  indexes: [{ name: 'machine_area_index', properties: ['area'] }],
  checks: [
    {
      name: 'machine_speed_range_check',
      expression:
        'speed_min_rpm > 0 and speed_max_rpm >= speed_min_rpm and nominal_speed_rpm between speed_min_rpm and speed_max_rpm',
    },
    { name: 'machine_power_check', expression: 'power_kw is null or power_kw > 0' },
  ],
  properties: {
    id: p.integer().primary(),
    site: () => p.manyToOne(Site).ref(),
    area: () => p.manyToOne(Area).ref(),
    tag: p.string().length(40),
    /** The tag without case and spaces: what uniqueness is judged by. */
    tagKey: p.string().length(40),
    name: p.string().length(120),
    aliases: p.array().$type<string[]>().default([]),
    kind: p.string().length(60),
    powerKw: p.double().$type<number>().nullable(),
    speedMinRpm: p.double().$type<number>(),
    speedMaxRpm: p.double().$type<number>(),
    nominalSpeedRpm: p.double().$type<number>(),
    drive: p.enum(['direct', 'belt', 'gear', 'variable speed'] as const).default('direct'),
    lineHz: p.double().$type<number>().default(50),
    criticality: p.enum(['A', 'B', 'C', 'D'] as const),
    support: p.enum(['rigid', 'flexible', 'unknown'] as const).default('unknown'),
    bladeCount: p.integer().nullable(),
    confinedSpace: p.boolean().default(false),
    state: p.enum(['active', 'retired'] as const).default('active'),
    retiredReason: p.string().length(400).nullable(),
    createdAt: p.datetime(),
  },
});
export type Machine = InferEntity<typeof Machine>;

/** Something that happened to a machine: cleaning, repair, balance, trip. */
export const MachineEvent = defineEntity({
  name: 'MachineEvent',
  tableName: 'machine_event',
  indexes: [{ name: 'machine_event_machine_at_index', properties: ['machine', 'at'] }],
  properties: {
    id: p.integer().primary(),
    machine: () => p.manyToOne(Machine).ref(),
    at: p.datetime(),
    kind: p.enum([
      'cleaning',
      'repair',
      'alignment',
      'balance',
      'trip',
      'process',
      'other',
    ] as const),
    text: p.string().length(1000),
    breaksTrend: p.boolean().default(false),
    balanceJobId: p.integer().nullable(),
    person: () => p.manyToOne(Person).ref(),
  },
});
export type MachineEvent = InferEntity<typeof MachineEvent>;
