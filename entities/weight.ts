import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { BalanceJob } from './balance-job';
import { Person } from './person';
import { Plane, Position, Rotor } from './rotor';

export type EnteredAngle = { angleDeg: number; angleSense: 'against' | 'with' };

/** One weight in a rotor's ledger. Written the moment it is fitted; ended, never deleted. */
export const Weight = defineEntity({
  name: 'Weight',
  tableName: 'weight',
  indexes: [{ name: 'weight_rotor_index', properties: ['rotor'] }],
  checks: [
    { name: 'weight_angle_check', expression: 'angle_deg >= 0 and angle_deg < 360' },
    { name: 'weight_mass_check', expression: 'mass_g > 0' },
    { name: 'weight_radius_check', expression: 'radius_mm > 0' },
    {
      name: 'weight_ended_with_ending_check',
      expression: '(ended_at is null) = (ending is null)',
    },
  ],
  properties: {
    id: p.integer().primary(),
    rotor: () => p.manyToOne(Rotor).ref(),
    plane: () => p.manyToOne(Plane).ref(),
    position: () => p.manyToOne(Position).ref().nullable(),
    /** Degrees against rotation from the mark. */
    angleDeg: p.double().$type<number>(),
    radiusMm: p.double().$type<number>(),
    massG: p.double().$type<number>(),
    massSource: p.enum(['scale', 'nominal'] as const),
    purpose: p.enum(['trial', 'correction', 'found'] as const),
    /** The answer this weight follows; null for trials and old weights. */
    answerNumber: p.integer().nullable(),
    fixing: p.string().length(200),
    permanent: p.boolean().default(false),
    entered: p.json<EnteredAngle>(),
    fittedAt: p.datetime(),
    fittedBy: () => p.manyToOne(Person).ref(),
    job: () => p.manyToOne(BalanceJob).ref().nullable(),
    /** After its run: does the trial weight stay? Null until somebody has said. */
    stays: p.boolean().nullable(),
    endedAt: p.datetime().nullable(),
    ending: p
      .enum(['taken off', 'moved', 'found missing', 'found worn', 'recorded wrongly'] as const)
      .nullable(),
    /** The job in which a weight of an earlier job was taken off. */
    endedInJob: () => p.manyToOne(BalanceJob).ref().nullable(),
    endedBy: () => p.manyToOne(Person).ref().nullable(),
    endReason: p.string().length(400).nullable(),
    replaces: () => p.manyToOne(Weight).ref().nullable(),
  },
});
export type Weight = InferEntity<typeof Weight>;
