import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { Machine } from './machine';
import { Person } from './person';
import { Site } from './site';

export type SensorPlace = { pointLabel: string; place: string; turnedOver: boolean };

/** Versioned geometry of mark, tacho and sensors. Coefficients and vectors cite a set-up. */
export const Setup = defineEntity({
  name: 'Setup',
  tableName: 'setup',
  uniques: [{ name: 'setup_machine_number_unique', properties: ['machine', 'number'] }],
  checks: [
    { name: 'setup_tacho_check', expression: 'tacho_deg >= 0 and tacho_deg < 360' },
    { name: 'setup_pulses_check', expression: 'pulses_per_turn >= 1' },
  ],
  properties: {
    id: p.integer().primary(),
    machine: () => p.manyToOne(Machine).ref(),
    number: p.integer(),
    markDescription: p.string().length(300),
    /** Tacho place, degrees from top in the direction of rotation. */
    tachoDeg: p.double().$type<number>(),
    tachoEdge: p.enum(['rising', 'falling'] as const).default('rising'),
    pulsesPerTurn: p.integer().default(1),
    /** Sense of rotation seen from the drive end. */
    rotationFromDriveEnd: p.enum(['clockwise', 'counter-clockwise'] as const),
    sensorPlaces: p.json<SensorPlace[]>().default('[]'),
    supportNote: p.string().length(400).nullable(),
    reason: p.string().length(400),
    validFrom: p.datetime(),
    validTo: p.datetime().nullable(),
    person: () => p.manyToOne(Person).ref(),
  },
});
export type Setup = InferEntity<typeof Setup>;

/** A measuring instrument with its phase convention. */
export const Instrument = defineEntity({
  name: 'Instrument',
  tableName: 'instrument',
  uniques: [{ name: 'instrument_site_serial_unique', properties: ['site', 'serial'] }],
  properties: {
    id: p.integer().primary(),
    site: () => p.manyToOne(Site).ref(),
    name: p.string().length(80),
    serial: p.string().length(60),
    calibrationDue: p.date().nullable(),
    phaseSense: p.enum(['lag', 'lead'] as const),
    phaseReference: p
      .enum(['positive peak', 'negative peak', 'zero crossing'] as const)
      .default('positive peak'),
  },
});
export type Instrument = InferEntity<typeof Instrument>;
