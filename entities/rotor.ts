import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { Machine } from './machine';
import { Site } from './site';

/** A rotor has an identity of its own: a spare brings its ledger and coefficients along. */
export const Rotor = defineEntity({
  name: 'Rotor',
  tableName: 'rotor',
  uniques: [{ name: 'rotor_site_serial_unique', properties: ['site', 'serial'] }],
  checks: [
    { name: 'rotor_mass_check', expression: 'mass_kg is null or mass_kg > 0' },
    { name: 'rotor_grade_check', expression: 'balance_grade is null or balance_grade > 0' },
  ],
  properties: {
    id: p.integer().primary(),
    site: () => p.manyToOne(Site).ref(),
    serial: p.string().length(60),
    name: p.string().length(120),
    massKg: p.double().$type<number>().nullable(),
    massSource: p.enum(['known', 'estimated'] as const).default('estimated'),
    behaviour: p.enum(['rigid', 'flexible', 'unknown'] as const).default('unknown'),
    /** Balance quality grade G in mm/s (ISO 21940-11). */
    balanceGrade: p.double().$type<number>().nullable(),
    bearingSpanM: p.double().$type<number>().nullable(),
    centreOfMassFromAM: p.double().fieldName('centre_of_mass_from_a_m').$type<number>().nullable(),
    overhung: p.boolean().default(false),
  },
});
export type Rotor = InferEntity<typeof Rotor>;

/** Which rotor runs in which machine, from when to when. */
export const RotorStay = defineEntity({
  name: 'RotorStay',
  tableName: 'rotor_stay',
  properties: {
    id: p.integer().primary(),
    rotor: () => p.manyToOne(Rotor).ref(),
    machine: () => p.manyToOne(Machine).ref(),
    fromAt: p.datetime(),
    toAt: p.datetime().nullable(),
  },
});
export type RotorStay = InferEntity<typeof RotorStay>;

/** A correction plane of a rotor. */
export const Plane = defineEntity({
  name: 'Plane',
  tableName: 'plane',
  uniques: [{ name: 'plane_rotor_name_unique', properties: ['rotor', 'name'] }],
  checks: [
    { name: 'plane_radius_check', expression: 'radius_mm > 0' },
    { name: 'plane_limit_check', expression: 'max_g_total is null or max_g_total > 0' },
  ],
  properties: {
    id: p.integer().primary(),
    rotor: () => p.manyToOne(Rotor).ref(),
    name: p.string().length(40),
    order: p.integer().fieldName('plane_order'),
    fromAM: p.double().fieldName('from_a_m').$type<number>().nullable(),
    radiusMm: p.double().$type<number>(),
    kind: p.enum(['free', 'fixed positions'] as const).default('free'),
    maxGTotal: p.double().fieldName('max_g_total').$type<number>().nullable(),
    pieceG: p.double().$type<number>().nullable(),
    maxTipSpeedMS: p.double().fieldName('max_tip_speed_m_s').$type<number>().nullable(),
  },
});
export type Plane = InferEntity<typeof Plane>;

/** A fixed place in a plane that can take a weight. */
export const Position = defineEntity({
  name: 'Position',
  tableName: 'position',
  uniques: [
    { name: 'position_plane_number_unique', properties: ['plane', 'number'] },
    { name: 'position_plane_label_unique', properties: ['plane', 'label'] },
  ],
  checks: [
    { name: 'position_angle_check', expression: 'angle_deg >= 0 and angle_deg < 360' },
    { name: 'position_limit_check', expression: 'max_g is null or max_g > 0' },
  ],
  properties: {
    id: p.integer().primary(),
    plane: () => p.manyToOne(Plane).ref(),
    number: p.integer(),
    label: p.string().length(40),
    /** Degrees against rotation from the mark. */
    angleDeg: p.double().$type<number>(),
    maxG: p.double().$type<number>().nullable(),
  },
});
export type Position = InferEntity<typeof Position>;
