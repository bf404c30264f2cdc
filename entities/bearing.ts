import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { Machine } from './machine';

/** A bearing of a machine, lettered from the driver's outboard end to the driven end. */
export const Bearing = defineEntity({
  name: 'Bearing',
  tableName: 'bearing',
  uniques: [{ name: 'bearing_machine_label_unique', properties: ['machine', 'label'] }],
  properties: {
    id: p.integer().primary(),
    machine: () => p.manyToOne(Machine).ref(),
    label: p.string().length(20),
    order: p.integer().fieldName('bearing_order'),
    place: p.enum(['driver', 'driven', 'gear'] as const).default('driven'),
    fromAM: p.double().fieldName('from_a_m').$type<number>().nullable(),
    type: p.string().length(60).nullable(),
    ballCount: p.integer().nullable(),
    ballDiameterMm: p.double().$type<number>().nullable(),
    pitchDiameterMm: p.double().$type<number>().nullable(),
    contactDeg: p.double().$type<number>().nullable(),
    staticLoadN: p.double().fieldName('static_load_n').$type<number>().nullable(),
  },
});
export type Bearing = InferEntity<typeof Bearing>;

/** A measuring point on a bearing. */
export const Point = defineEntity({
  name: 'Point',
  tableName: 'point',
  uniques: [{ name: 'point_machine_label_unique', properties: ['machine', 'label'] }],
  indexes: [{ name: 'point_bearing_index', properties: ['bearing'] }],
  checks: [
    {
      name: 'point_direction_deg_check',
      expression: 'direction_deg is null or (direction_deg >= 0 and direction_deg < 360)',
    },
  ],
  properties: {
    id: p.integer().primary(),
    machine: () => p.manyToOne(Machine).ref(),
    bearing: () => p.manyToOne(Bearing).ref(),
    label: p.string().length(40),
    direction: p.enum(['H', 'V', 'A', 'degrees'] as const),
    directionDeg: p.double().$type<number>().nullable(),
    sensorKind: p.enum(['housing', 'shaft'] as const).default('housing'),
    mounting: p.string().length(80).nullable(),
    order: p.integer().fieldName('point_order'),
  },
});
export type Point = InferEntity<typeof Point>;
