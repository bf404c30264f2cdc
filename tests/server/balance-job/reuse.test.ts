import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Coefficient } from '@/entities/answer';
import { LimitSet } from '@/entities/limit-set';
import { Machine } from '@/entities/machine';
import { Rotor } from '@/entities/rotor';
import { Setup } from '@/entities/setup';
import { Site } from '@/entities/site';
import { add, angleDeg, fromPolar, size } from '@/lib/domain/complex';
import { reuseCoefficients, withdrawReuse } from '@/lib/server/commands/reuse-coefficients';
import { openPlant } from '@/tests/support/open-plant';
import { seedMachine, type SeededMachine, type SmallPlant } from '@/tests/support/plant';
import { JobDriver, valueOf } from './job-driver';
import scenarios from './scenarios.json';

/** Invented scenario with independently computed values: three past jobs, and one without a trial. */
const { S05, S07 } = scenarios;

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;
let made = 0;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
});

afterAll(() => close());

async function rawMillFan(): Promise<SeededMachine> {
  made += 1;
  const site = await em.findOneOrFail(Site, plant.home.siteId);
  const limits = await em.findOneOrFail(LimitSet, plant.limitSetId);
  const fan = await seedMachine(em, site, limits, `RM-${made}`);
  const machine = await em.findOneOrFail(Machine, fan.machineId);
  em.assign(machine, { speedMinRpm: 1465, speedMaxRpm: 1495, nominalSpeedRpm: 1485 });
  em.assign(await em.findOneOrFail(Rotor, fan.rotorId), { massKg: 300 });
  await em.flush();
  return fan;
}

type Past = (typeof S05.inputs.past_jobs)[number];

const open = (fan: SeededMachine, speedRpm = 1485) =>
  JobDriver.open(plant.at('technician'), fan, { kind: 'one-plane', speedRpm });

/** A past job whose check run is as its answer predicts, so that all its runs say what its trial said. */
async function pastJob(fan: SeededMachine, past: Past) {
  const job = await open(fan, past.speed);
  valueOf(await job.run('base', [past.base]));
  await job.acceptBase('One base run.');
  await job.trial(0, past.trial, { readings: [past.trial_run], stays: 'taken off' });
  const answer = await job.accept();
  const [plane] = answer.planes;
  valueOf(
    await job.fit('correction', 0, {
      g: plane?.massG ?? 0,
      radius_mm: plane?.radiusMm ?? 0,
      deg: plane?.angleDeg ?? 0,
    }),
  );
  valueOf(await job.run('check', [{ amp: 0, deg: 0 }]));
  valueOf(await job.sign());
}

const ticks = { sameSensors: 'on', sameMark: 'on', sameSupports: 'on', sameState: 'on' } as const;

async function jobWithBase(fan: SeededMachine, base = S05.inputs.base): Promise<JobDriver> {
  const job = await open(fan, base.speed);
  valueOf(await job.run('base', [base]));
  await job.acceptBase('One base run.');
  return job;
}

describe('S05: one stop with stored coefficients', () => {
  it('offers them graded, answers without a trial run, and learns from the check run', async () => {
    const fan = await rawMillFan();
    for (const past of S05.inputs.past_jobs) await pastJob(fan, past);
    const job = await jobWithBase(fan);
    const { book, trialProposal } = await job.sheet();
    if (!book || book.failure !== null) throw new Error('no book');
    expect(book.grade).toBe(S05.expected.grade);
    expect(book.lines[0]?.spreadPct).toBeCloseTo(S05.expected.spread_pct, 1);
    expect(book.lines[0]?.count).toBe(3);
    expect(book.lines[0]?.sizePerKgMm).toBeCloseTo(
      S05.expected.mean_coefficient.mm_s_rms_per_kg_mm,
      3,
    );
    expect(trialProposal?.loweringDeg).toBeCloseTo(S05.expected.correction.deg, 0);

    valueOf(await reuseCoefficients(plant.at('technician'), { jobId: job.jobId, ...ticks }));
    const sheet = await job.sheet();
    expect(sheet.step.step).toBe('answer');
    expect(sheet.reuse).toMatchObject({ grade: 'good', person: 'technician home' });
    const answer = await job.accept();
    const massAt450 = (answer.planes[0]?.unbalanceGmm ?? 0) / 450;
    expect(Math.abs(massAt450 - S05.expected.correction.g)).toBeLessThan(S05.tol.g);
    expect(answer.planes[0]?.angleDeg).toBeCloseTo(S05.expected.correction.deg, 0);

    valueOf(await job.fit('correction', 0, S05.inputs.installed));
    const { check_run: check } = S05.inputs;
    valueOf(await job.run('check', [check], check.speed));
    const checked = await job.sheet();
    const point = checked.check?.points[0];
    expect(point?.predicted?.amplitude).toBeCloseTo(S05.expected.predicted_after_installed.amp, 2);
    expect(point?.band).toBeCloseTo(S05.expected.expected_band_mm_s_95, 2);
    expect(point?.miss ?? 9).toBeLessThan(point?.band ?? 0);
    expect(checked.slips).toEqual([]);
    expect(checked.tolerance?.planes.map(({ verdict }) => verdict)).not.toContain('fail');

    valueOf(await job.sign());
    const learned = await em.fork().find(Coefficient, { job: job.jobId });
    expect(learned.map(({ source }) => source)).toEqual(['fit over all runs']);
    const [h] = learned;
    expect(1000 * Math.hypot(h?.rePerGmm ?? 0, h?.imPerGmm ?? 0)).toBeCloseTo(
      S05.expected.coefficient_from_this_job.mm_s_rms_per_kg_mm,
      3,
    );
  });
});

describe('the coefficient book', () => {
  const past = S05.inputs.past_jobs as [Past, Past, Past];

  it('is not offered without a signed job under this set-up, and says nothing then', async () => {
    const job = await jobWithBase(await rawMillFan());
    expect((await job.sheet()).book).toMatchObject({ empty: true });
    expect(
      await reuseCoefficients(plant.at('technician'), { jobId: job.jobId, ...ticks }),
    ).toMatchObject({ failure: { code: 'book-empty' } });
  });

  it('of one job is graded with care and needs a reason; every tick is needed', async () => {
    const fan = await rawMillFan();
    await pastJob(fan, past[0]);
    const job = await jobWithBase(fan);
    const { jobId } = job;
    const technician = plant.at('technician');
    expect(await reuseCoefficients(technician, { jobId, ...ticks })).toMatchObject({
      failure: { code: 'reason-needed', field: 'reason' },
    });
    expect(
      await reuseCoefficients(technician, { jobId, ...ticks, sameMark: undefined, reason: 'x' }),
    ).toMatchObject({ failure: { field: 'sameMark' } });
    expect(await reuseCoefficients(plant.at('reader'), { jobId, ...ticks })).toMatchObject({
      failure: { code: 'forbidden' },
    });
    valueOf(await reuseCoefficients(technician, { jobId, ...ticks, reason: 'Nothing changed.' }));
    expect(
      await reuseCoefficients(technician, { jobId, ...ticks, reason: 'Again.' }),
    ).toMatchObject({ failure: { code: 'out-of-order' } });
    valueOf(await withdrawReuse(technician, { jobId, reason: 'The isolators are new.' }));
    expect((await job.sheet()).step.step).toBe('fit trial');
  });

  it('is refused at another speed, in words', async () => {
    const fan = await rawMillFan();
    await pastJob(fan, past[0]);
    const job = await jobWithBase(fan, { ...S05.inputs.base, speed: 1467 });
    expect((await job.sheet()).book).toMatchObject({
      failure: expect.stringContaining('1486') as string,
    });
  });

  it('is refused where the estimates disagree by more than 20 %', async () => {
    const fan = await rawMillFan();
    await pastJob(fan, past[0]);
    await pastJob(fan, { ...past[1], trial_run: { amp: 6.9, deg: 130 } });
    const job = await jobWithBase(fan);
    expect((await job.sheet()).book).toMatchObject({
      failure: expect.stringContaining('spread over') as string,
    });
  });

  it('can be given up after a check run that missed: the job then learns from its own runs', async () => {
    const fan = await rawMillFan();
    await pastJob(fan, past[0]);
    const job = await jobWithBase(fan);
    const { jobId } = job;
    const technician = plant.at('technician');
    valueOf(await reuseCoefficients(technician, { jobId, ...ticks, reason: 'Nothing changed.' }));
    await job.accept();
    valueOf(await job.fit('correction', 0, S05.inputs.installed));
    expect(await withdrawReuse(technician, { jobId, reason: 'x' })).toMatchObject({
      failure: { code: 'out-of-order' },
    });
    valueOf(await job.run('check', [{ amp: 2.2, deg: 30 }]));
    valueOf(await withdrawReuse(technician, { jobId, reason: 'It answers quite differently.' }));
    const { answer, step } = await job.sheet();
    expect(step.step).toBe('decide');
    // The rotor's own answer: with base, fitted weight and check run known, the trim leaves nothing.
    expect(answer?.predicted[0]?.amplitude).toBeLessThan(1e-9);
  });

  it('measured before the tacho was moved is converted, and counts one grade less', async () => {
    const fan = await rawMillFan();
    for (const one of past) await pastJob(fan, one);
    const before = await em.findOneOrFail(Setup, { machine: fan.machineId, validTo: null });
    const now = new Date();
    const { machine, markDescription, rotationFromDriveEnd, sensorPlaces, person } = before;
    em.assign(before, { validTo: now });
    await em.flush();
    em.create(Setup, {
      ...{ machine, markDescription, rotationFromDriveEnd, sensorPlaces, person },
      number: before.number + 1,
      tachoDeg: before.tachoDeg + 30,
      reason: 'The bracket was in the way.',
      validFrom: now,
    });
    await em.flush();
    // The same unbalance is read 30° earlier now.
    const base = { ...S05.inputs.base, deg: S05.inputs.base.deg - 30 };
    const job = await jobWithBase(fan, base);
    const { book } = await job.sheet();
    if (!book || book.failure !== null) throw new Error('no book');
    expect(book).toMatchObject({ grade: 'with care', lines: [{ converted: true, count: 3 }] });
    const { jobId } = job;
    const technician = plant.at('technician');
    valueOf(await reuseCoefficients(technician, { jobId, ...ticks, reason: 'Only the tacho.' }));
    const answer = await job.accept();
    // The correction hangs where it hung: angles count from the mark, not from the tacho.
    expect(answer.planes[0]?.angleDeg).toBeCloseTo(S05.expected.correction.deg, 0);
    const other = await open(await rawMillFan());
    expect((await other.sheet()).book).toBeNull();
  });

  it('checks a new trial at once: S07’s trial answers like its mirror image', async () => {
    const fan = await rawMillFan();
    const stored = S07.machine.stored_coefficient;
    const base = { amp: 2, deg: 40 };
    const effect = fromPolar((stored.mm_s_rms_per_kg_mm / 1000) * 14 * 300, stored.deg);
    const trialRun = add(fromPolar(base.amp, base.deg), effect);
    await pastJob(fan, {
      ...past[0],
      speed: 1475,
      base,
      trial: { g: 14, radius_mm: 300, deg: 0 },
      trial_run: { amp: size(trialRun), deg: angleDeg(trialRun) },
    });
    const job = await jobWithBase(fan, { ...S07.inputs.base, speed: 1475 });
    const { g, radius_mm, deg_typed: deg } = S07.inputs.trial;
    valueOf(await job.fit('trial', 0, { g, radius_mm, deg }));
    valueOf(await job.run('trial', [S07.inputs.trial_run]));
    const { trialsAgainstBook, step } = await job.sheet();
    expect(step.step).toBe('settle trial');
    const [trial] = trialsAgainstBook;
    const { new_vs_stored_ratio: ratio, new_vs_stored_deg: turn } = S07.expected.test_1_stored;
    expect(trial?.ratio).toBeCloseTo(ratio, 2);
    expect(Math.abs((trial?.turnDeg ?? 0) - turn)).toBeLessThan(0.5);
    expect(trial).toMatchObject({ agrees: false, sensesSuspect: true });
  });
});
