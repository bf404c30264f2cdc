import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Coefficient } from '@/entities/answer';
import { Plane, Rotor } from '@/entities/rotor';
import { LimitSet } from '@/entities/limit-set';
import { Machine } from '@/entities/machine';
import { Site } from '@/entities/site';
import { signJob } from '@/lib/server/commands/sign-job';
import { openPlant } from '@/tests/support/open-plant';
import { seedMachine, type SeededMachine, type SmallPlant } from '@/tests/support/plant';
import { JobDriver, valueOf } from './job-driver';
import scenarios from './scenarios.json';

// Numeric scenarios of simulated machines, computed apart from this project; expected values follow
// from the rounded inputs a person would type.
const { S01, S02, S03 } = scenarios;

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
});

afterAll(() => close());

type Change = {
  tag: string;
  speed: number;
  massKg: number;
  spanM?: number;
  centreM?: number;
  planes: { name: string; radius: number; fromAM?: number }[];
};

/** A machine of the scenario: the small plant's fan with the scenario's figures. */
async function machineOf(change: Change): Promise<SeededMachine> {
  const site = await em.findOneOrFail(Site, plant.home.siteId);
  const limits = await em.findOneOrFail(LimitSet, plant.limitSetId);
  const seeded = await seedMachine(em, site, limits, change.tag);
  const machine = await em.findOneOrFail(Machine, seeded.machineId);
  machine.speedMinRpm = change.speed - 20;
  machine.speedMaxRpm = change.speed + 20;
  machine.nominalSpeedRpm = change.speed;
  const rotor = await em.findOneOrFail(Rotor, seeded.rotorId);
  rotor.massKg = change.massKg;
  rotor.bearingSpanM = change.spanM ?? null;
  rotor.centreOfMassFromAM = change.centreM ?? null;
  for (const [index, to] of change.planes.entries()) {
    const plane = await em.findOneOrFail(Plane, seeded.planeIds[index] ?? 0);
    plane.name = to.name;
    plane.radiusMm = to.radius;
    plane.fromAM = to.fromAM ?? null;
  }
  await em.flush();
  return seeded;
}

const technician = () => plant.at('technician');

describe('S01: one plane, trial taken off, one trim', () => {
  it('gives the answer, the trim, the ledger and the coefficients', async () => {
    const machine = await machineOf({
      tag: 'EF-101',
      speed: 1480,
      massKg: 210,
      planes: [{ name: 'W', radius: 400 }],
    });
    const job = await JobDriver.open(technician(), machine, { kind: 'one-plane', speedRpm: 1480 });
    for (const base of S01.inputs.repeat_base_runs)
      valueOf(await job.run('base', [base], base.speed));
    const repeats = (await job.sheet()).repeats[0]?.test;
    expect(repeats?.meanAmplitude).toBeCloseTo(S01.expected.base_mean.amp, 2);
    expect(repeats?.scatter).toBeCloseTo(S01.expected.repeat_scatter_mm_s, 3);
    expect(repeats?.good).toBe(true);
    await job.acceptBase();
    const { trial, trial_run } = S01.inputs;
    await job.trial(0, trial, { readings: [trial_run], stays: 'taken off', speedRpm: 1479 });

    const first = await job.accept();
    expect(first.planes[0]?.massG).toBeCloseTo(S01.expected.correction.g, 1);
    expect(Math.abs((first.planes[0]?.angleDeg ?? 0) - S01.expected.correction.deg)).toBeLessThan(
      0.5,
    );
    expect(first.coefficients[0]?.sizePerKgMm).toBeCloseTo(
      S01.expected.coefficient.mm_s_rms_per_kg_mm,
      3,
    );

    valueOf(await job.fit('correction', 0, S01.inputs.installed_1));
    valueOf(await job.run('check', [S01.inputs.check_run_1], 1481));
    const checked = await job.sheet();
    const seen = checked.check?.points[0];
    expect(seen?.predicted?.amplitude).toBeCloseTo(S01.expected.predicted_after_installed_1.amp, 2);
    expect(
      Math.abs((seen?.predicted?.lagDeg ?? 0) - S01.expected.predicted_after_installed_1.deg),
    ).toBeLessThan(0.5);
    expect(seen?.miss).toBeGreaterThan(seen?.band ?? Infinity);

    const trim = await job.accept();
    expect(trim.kind).toBe('trim');
    expect(trim.planes[0]?.massG).toBeCloseTo(S01.expected.trim.g, 1);
    expect(Math.abs((trim.planes[0]?.angleDeg ?? 0) - S01.expected.trim.deg)).toBeLessThan(0.5);
    expect(trim.warnings.join(' ')).toMatch(/differ|check.*(angle|mass)/i);

    valueOf(await job.fit('correction', 0, S01.inputs.installed_2));
    valueOf(await job.run('check', [S01.inputs.check_run_2], 1480));
    const last = await job.sheet();
    expect(last.tolerance?.permissibleGmm).toBeCloseTo(S01.expected.U_permissible_g_mm, 0);
    const residual = last.tolerance?.planes[0]?.residualGmm ?? 0;
    expect(Math.abs(residual / S01.expected.residual_after_trim_g_mm - 1)).toBeLessThan(0.02);
    expect(last.check?.points[0]?.reductionPct).toBeCloseTo(S01.expected.reduction_pct, 0);

    const weightIds = last.weights.filter(({ endedAt }) => endedAt === null).map(({ id }) => id);
    const input = {
      jobId: job.jobId,
      statement: 'Done as recorded.',
      permanentWeightIds: weightIds,
      handBack: 'on' as const,
      areaOwner: 'Marta Lind',
    };
    const signed = valueOf(
      await signJob(technician(), { ...input, reason: 'Small remaining miss.' }),
    );
    expect(signed.contentHash).toMatch(/^[0-9a-f]{64}$/);
    const book = await em.fork().find(Coefficient, { rotor: machine.rotorId });
    expect(book.map(({ source }) => source)).toEqual(['trial', 'fit over all runs']);
    const all = book[1];
    expect(1000 * Math.hypot(all?.rePerGmm ?? 0, all?.imPerGmm ?? 0)).toBeCloseTo(
      S01.expected.all_runs_fit.coefficient.mm_s_rms_per_kg_mm,
      3,
    );
  });
});

describe('S02: two planes, both trials taken off', () => {
  it('gives answers, prediction, condition number and the moved residuals', async () => {
    const machine = await machineOf({
      tag: 'KX-22',
      speed: 990,
      massKg: 640,
      spanM: 1.9,
      centreM: 0.95,
      planes: [
        { name: 'L', radius: 700, fromAM: 0.4 },
        { name: 'R', radius: 700, fromAM: 1.5 },
      ],
    });
    const { inputs, expected } = S02;
    const job = await JobDriver.open(technician(), machine, { kind: 'two-plane', speedRpm: 990 });
    valueOf(await job.run('base', inputs.base, 990));
    await job.acceptBase('One base run: the stop is short.');
    for (const [plane, trial] of inputs.trial.entries())
      await job.trial(plane, trial, { readings: trial.run, stays: 'taken off' });
    const answer = await job.accept();
    expect(answer.condition.number).toBeCloseTo(expected.condition_number_scaled, 2);
    for (const [plane, wanted] of expected.correction.entries()) {
      expect(Math.abs((answer.planes[plane]?.massG ?? 0) - wanted.g)).toBeLessThan(0.1);
      expect(Math.abs((answer.planes[plane]?.angleDeg ?? 0) - wanted.deg)).toBeLessThan(0.5);
    }
    expect(answer.parts?.static.massG).toBeCloseTo(
      expected.correction_static_part_g.each_plane_g,
      1,
    );
    expect(answer.parts?.couple.massG).toBeCloseTo(expected.correction_couple_part_g.plane_L_g, 1);
    for (const [plane, weight] of inputs.installed.entries())
      valueOf(await job.fit('correction', plane, weight));
    valueOf(await job.run('check', inputs.check_run));
    const sheet = await job.sheet();
    for (const [index, wanted] of expected.predicted_after.entries()) {
      const point = sheet.check?.points[index];
      expect(point?.predicted?.amplitude).toBeCloseTo(wanted.amp, 2);
      expect(Math.abs((point?.predicted?.lagDeg ?? 0) - wanted.deg)).toBeLessThan(0.5);
      expect(point?.miss).toBeCloseTo(expected.check_vs_prediction_mm_s[index] ?? 0, 2);
      expect(point?.reductionPct).toBeCloseTo(expected.reduction_pct[index] ?? 0, 1);
    }
    const [a, b] = sheet.tolerance?.planes ?? [];
    expect(Math.abs((a?.residualGmm ?? 0) - 1915.9)).toBeLessThan(2);
    expect(Math.abs((b?.residualGmm ?? 0) - 3731.7)).toBeLessThan(2);
    expect(a?.permissibleGmm).toBeCloseTo(expected.U_permissible_g_mm_each_tolerance_plane, 0);
  });
});

describe('S03: both trial weights stay on', () => {
  it('says what to add to what is on it now, and the total from as found', async () => {
    const machine = await machineOf({
      tag: 'CB-7',
      speed: 1490,
      massKg: 420,
      spanM: 1.5,
      centreM: 0.7,
      planes: [
        { name: '1', radius: 280, fromAM: 0.3 },
        { name: '2', radius: 280, fromAM: 1.15 },
      ],
    });
    const { inputs, expected } = S03;
    const job = await JobDriver.open(technician(), machine, { kind: 'two-plane', speedRpm: 1490 });
    valueOf(await job.run('base', inputs.base));
    await job.acceptBase('One base run.');
    for (const [plane, trial] of inputs.trial.entries())
      await job.trial(plane, trial, { readings: trial.run, stays: 'stays on' });
    const answer = await job.accept();
    for (const plane of [0, 1]) {
      const got = answer.planes[plane];
      const add = expected.to_add_with_trials_staying[plane];
      const total = expected.total_from_as_found[plane];
      expect(Math.abs((got?.massG ?? 0) - (add?.g ?? 0))).toBeLessThan(0.1);
      expect(Math.abs((got?.angleDeg ?? 0) - (add?.deg ?? 0))).toBeLessThan(0.5);
      expect(Math.abs((got?.totalMassG ?? 0) - (total?.g ?? 0))).toBeLessThan(0.1);
      expect(Math.abs((got?.totalAngleDeg ?? 0) - (total?.deg ?? 0))).toBeLessThan(0.5);
    }
    for (const [plane, weight] of inputs.installed_in_addition.entries())
      valueOf(await job.fit('correction', plane, weight));
    valueOf(await job.run('check', inputs.check_run));
    const sheet = await job.sheet();
    expect(sheet.weights.filter(({ endedAt }) => endedAt === null)).toHaveLength(4);
    for (const [index, reduction] of expected.check_run_reduction_pct.entries())
      expect(sheet.check?.points[index]?.reductionPct).toBeCloseTo(reduction, 1);
  });
});
