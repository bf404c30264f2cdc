import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { LimitSet } from '@/entities/limit-set';
import { Machine } from '@/entities/machine';
import { Person } from '@/entities/person';
import { Plane, Position, Rotor } from '@/entities/rotor';
import { Site } from '@/entities/site';
import { Weight } from '@/entities/weight';
import { openPlant } from '@/tests/support/open-plant';
import { seedMachine, type SmallPlant } from '@/tests/support/plant';
import { JobDriver, valueOf } from './job-driver';
import scenarios from './scenarios.json';

/** Invented scenario with independently computed values: seven blades, two of them used already. */
const { machine: S04Machine, inputs, expected, tol } = scenarios.S04;
const [wheel] = S04Machine.planes;

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
});

afterAll(() => close());

it('S04: names blades, counts old weights against their limit, and leaves what was predicted', async () => {
  const { job, blades } = await ventFan();
  valueOf(await job.run('base', [inputs.base]));
  await job.acceptBase('One base run.');
  const { g, radius_mm: radius, run } = inputs.trial;
  const trial = { g, radius_mm: radius, deg: 0, positionId: blades.get('blade 1') };
  await job.trial(0, trial, { readings: [run], stays: 'taken off' });
  const { placements, answer } = await job.sheet();
  expect(answer?.planes[0]?.massG).toBeCloseTo(expected.free_angle_answer.g, 1);
  const [placement] = placements;
  const proposed = placement?.choices.find((choice) => choice.proposed);
  expect(proposed?.weights.map(({ label, massG }) => [label, massG])).toEqual(
    Object.entries(expected.proposal.weights_g),
  );
  expect(proposed?.expected[0]?.amplitude).toBeCloseTo(expected.proposal.predicted_mm_s, 2);
  expect(proposed).toMatchObject({ meetsTarget: true, proven: true, totalG: 110 });

  await job.accept();
  for (const [blade, massG] of Object.entries(inputs.installed)) {
    const hung = { g: massG, radius_mm: radius, deg: 0, positionId: blades.get(blade) };
    valueOf(await job.fit('correction', 0, hung));
    // The plan stands while it is fitted, weight by weight.
    const [standing] = (await job.sheet()).placements;
    expect(standing?.choices.find((choice) => choice.proposed)?.weights).toEqual(proposed?.weights);
  }
  const over = { g: 5, radius_mm: radius, deg: 0, positionId: blades.get('blade 4') };
  expect(await job.fit('correction', 0, over)).toMatchObject({ failure: { code: 'over-limit' } });
  const { asFitted } = await job.sheet();
  expect(asFitted?.planes[0]?.isFar).toBe(false);
  expect(asFitted?.expected[0]?.amplitude).toBeCloseTo(expected.proposal.predicted_mm_s, 2);
  valueOf(await job.run('check', [inputs.check_run]));
  const { tolerance } = await job.sheet();
  const residual = tolerance?.planes.reduce(
    (most, { residualGmm }) => Math.max(most, residualGmm),
    0,
  );
  expect(Math.abs((residual ?? 0) - expected.check_run_residual_g_mm)).toBeLessThan(10);
  expect(tolerance?.permissibleGmm).toBeCloseTo(expected.U_permissible_g_mm, 0);
  expect(tol.g).toBeGreaterThan(0);
});

async function ventFan() {
  const site = await em.findOneOrFail(Site, plant.home.siteId);
  const limits = await em.findOneOrFail(LimitSet, plant.limitSetId);
  const fan = await seedMachine(em, site, limits, S04Machine.id);
  const { speed_r_min: nominalSpeedRpm, rotor_mass_kg: massKg, balance_grade: grade } = S04Machine;
  em.assign(await em.findOneOrFail(Machine, fan.machineId), { nominalSpeedRpm });
  // One correction plane and no geometry: the residual is stated in that plane.
  const geometry = { bearingSpanM: null, centreOfMassFromAM: null };
  em.assign(await em.findOneOrFail(Rotor, fan.rotorId), {
    massKg,
    balanceGrade: grade,
    ...geometry,
  });
  const plane = await em.findOneOrFail(Plane, fan.planeIds[0]);
  em.assign(plane, {
    kind: 'fixed positions',
    radiusMm: wheel?.radius_mm ?? 0,
    pieceG: wheel?.piece_g ?? 0,
  });
  const count = wheel?.positions ?? 0;
  const made = Array.from({ length: count }, (_, k) =>
    em.create(Position, {
      plane,
      number: k + 1,
      label: `blade ${k + 1}`,
      angleDeg: (360 / count) * k,
      maxG: wheel?.max_g_per_pad ?? null,
    }),
  );
  await em.flush();
  const blades = new Map(made.map(({ label, id }) => [label, id]));
  for (const [label, massG] of Object.entries(S04Machine.ledger_before))
    em.create(Weight, {
      ...{ rotor: fan.rotorId, plane, massG, radiusMm: plane.radiusMm },
      position: made.find((position) => position.label === label) ?? null,
      angleDeg: made.find((position) => position.label === label)?.angleDeg ?? 0,
      massSource: 'nominal',
      purpose: 'found',
      fixing: 'bolt',
      permanent: true,
      entered: { angleDeg: 0, angleSense: 'against' },
      fittedAt: new Date('2025-01-01T10:00:00Z'),
      fittedBy: em.getReference(Person, plant.at('technician').personId, { wrapped: true }),
    });
  await em.flush();
  const options = { kind: 'one-plane', speedRpm: nominalSpeedRpm } as const;
  return { job: await JobDriver.open(plant.at('technician'), fan, options), blades };
}
