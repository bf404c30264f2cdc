import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { CautionShown } from '@/entities/caution';
import { LimitSet } from '@/entities/limit-set';
import { OneXVector } from '@/entities/measured-record';
import { Site } from '@/entities/site';
import { signJob } from '@/lib/server/commands/sign-job';
import { takeOffWeight } from '@/lib/server/commands/settle-weight';
import { recordRun } from '@/lib/server/commands/record-run';
import { near } from '@/tests/domain/balancing/near';
import { openPlant } from '@/tests/support/open-plant';
import { seedMachine, type SmallPlant } from '@/tests/support/plant';
import { BoardPlant } from '../due-board/board-plant';
import { JobDriver, valueOf } from './job-driver';

let em: EntityManager;
let plant: SmallPlant;
let book: BoardPlant;
let close: () => Promise<void>;
let made = 0;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
  book = await BoardPlant.at(em, plant.home.siteId, plant.at('engineer').personId);
});

afterAll(() => close());

async function openJob(): Promise<JobDriver> {
  made += 1;
  const site = await em.findOneOrFail(Site, plant.home.siteId);
  const limits = await em.findOneOrFail(LimitSet, plant.limitSetId);
  const machine = await seedMachine(em, site, limits, `START-${made}`);
  return JobDriver.open(plant.at('technician'), machine, { kind: 'one-plane', speedRpm: 990 });
}

const BASE = { amp: 3.4, deg: 120 };

/** A job whose trial of 20 g at the mark turned V by H·U, H 0.37 mm/s per kg·mm at 3° lag. */
async function answered(): Promise<JobDriver> {
  const job = await openJob();
  valueOf(await job.run('base', [BASE]));
  await job.acceptBase('One base run.');
  const [re, im] = [
    BASE.amp * Math.cos(rad(BASE.deg)) + 0.37 * 14 * Math.cos(rad(3)),
    BASE.amp * Math.sin(rad(BASE.deg)) + 0.37 * 14 * Math.sin(rad(3)),
  ];
  const run = { amp: Math.hypot(re, im), deg: (Math.atan2(im, re) * 180) / Math.PI };
  const weight = { g: 20, radius_mm: 700, deg: 0 };
  await job.trial(0, weight, { readings: [run], stays: 'taken off' });
  return job;
}

const rad = (deg: number) => (deg * Math.PI) / 180;

describe('between fitting and the check run', () => {
  it('a weight where the answer asks for it is near enough, and its reading small', async () => {
    const job = await answered();
    const { planes } = await job.accept();
    const { massG: g = 0, angleDeg: deg = 0 } = planes[0] ?? {};
    valueOf(await job.fit('correction', 0, { g, radius_mm: 700, deg }));
    const { asFitted } = await job.sheet();
    expect(asFitted?.planes).toMatchObject([{ isFar: false }]);
    near(asFitted?.expected[0]?.amplitude ?? NaN, 0, 1e-9);
  });

  it('a weight counted the other way is said to be far off, with what it would do', async () => {
    const job = await answered();
    const { planes } = await job.accept();
    const { massG: g = 0, angleDeg: deg = 0 } = planes[0] ?? {};
    valueOf(await job.fit('correction', 0, { g, radius_mm: 700, deg, sense: 'with' }));
    const { asFitted } = await job.sheet();
    expect(asFitted?.planes).toMatchObject([{ isFar: true, askedDeg: deg }]);
    near(asFitted?.planes[0]?.fittedDeg ?? NaN, 360 - deg, 1e-9);
    // |V0 + H·U|: two vectors of 3.4 whose angles are 180° + 2·(360 − deg) apart.
    const apart = rad(180 + 2 * (360 - deg));
    near(
      asFitted?.expected[0]?.amplitude ?? NaN,
      BASE.amp * 2 * Math.abs(Math.cos(apart / 2)),
      1e-6,
    );
  });
});

describe('signing', () => {
  const sign = (job: JobDriver, weightIds: number[], reason = '') =>
    signJob(job.actor, {
      jobId: job.jobId,
      statement: 'Done.',
      permanentWeightIds: weightIds,
      handBack: 'on',
      areaOwner: 'Marta Lind',
      reason,
    });

  it('asks for another check run where a weight came off after the last', async () => {
    const job = await answered();
    const { planes } = await job.accept();
    const { massG: g = 0, angleDeg: deg = 0 } = planes[0] ?? {};
    valueOf(await job.fit('correction', 0, { g, radius_mm: 700, deg }));
    valueOf(await job.run('check', [{ amp: 0.1, deg: 10 }]));
    const weightId = (await job.sheet()).weights.find(({ endedAt }) => endedAt === null)?.id ?? 0;
    valueOf(
      await takeOffWeight(job.actor, {
        jobId: job.jobId,
        weightId,
        reason: 'The clamp slipped.',
        standingStill: 'on',
        namedPerson: 'Ida Berg',
      }),
    );
    const failure = { ok: false, failure: { code: 'changed-since-check' } };
    expect(await sign(job, [])).toMatchObject(failure);
    valueOf(await job.run('check', [{ amp: 3.4, deg: 120 }]));
    expect(await sign(job, [], 'Left as found.')).toMatchObject({ ok: true });
  });

  it('asks why where it runs rougher than before', async () => {
    const job = await answered();
    const { planes } = await job.accept();
    const { massG: g = 0, angleDeg: deg = 0 } = planes[0] ?? {};
    valueOf(await job.fit('correction', 0, { g, radius_mm: 700, deg, sense: 'with' }));
    valueOf(await job.run('check', [{ amp: 6, deg: 30 }]));
    const on = (await job.sheet()).weights.flatMap(({ id, endedAt }) => (endedAt ? [] : [id]));
    const refused = await sign(job, on);
    expect(refused).toMatchObject({ failure: { code: 'reason-needed', field: 'reason' } });
    expect(refused.ok ? '' : refused.failure.message).toContain('rougher than before at A-H');
  });
});

describe('a run', () => {
  it('at a speed that is none of the machine is held, the first one too', async () => {
    const job = await openJob();
    const run = valueOf(await job.run('base', [BASE], 700));
    expect(run.held).toContain('this machine runs at 950 to 1010 r/min');
    expect((await job.sheet()).runs).toMatchObject([{ state: 'held' }]);
    expect(valueOf(await job.run('base', [BASE], 1015)).held).toBeNull();
  });

  it('puts on the record the cautions that its form shows, and no others', async () => {
    const job = await answered();
    const shown = await em
      .fork()
      .find(CautionShown, { job: job.jobId }, { orderBy: { id: 'asc' } });
    const at = (step: string) =>
      shown.filter((one) => one.step === step).map(({ cautionId }) => cautionId);
    expect(at('before run 1')).toEqual(['SAF-04']);
    expect(at('before run 2')).toEqual(['SAF-02', 'SAF-04']);
  });
});

describe('a record taken for a run', () => {
  async function recordAt(job: JobDriver, at: Date): Promise<number> {
    const [pointId] = job.machine.pointIds;
    await book.read(pointId, { at, value: 3.5, oneX: 3.4, lagDeg: 120, speedRpm: 990 });
    const vector = await em
      .fork()
      .findOneOrFail(OneXVector, { point: pointId }, { orderBy: { id: 'desc' } });
    return vector.record.id;
  }
  const take = (job: JobDriver, purpose: 'base' | 'trial', recordId: number) =>
    recordRun(job.actor, {
      jobId: job.jobId,
      purpose,
      speedRpm: '990',
      unit: 'mm/s rms',
      vectors: [{ pointId: job.machine.pointIds[0], recordId, overall: '' }],
      clearOfRotor: 'on',
      namedPerson: 'Ida Berg',
    });
  const minutes = (from: number) => new Date(Date.now() + from * 60_000);

  it('was taken with what hangs there now, and is offered only then', async () => {
    const job = await openJob();
    const early = await recordAt(job, minutes(-10));
    expect(await take(job, 'base', early)).toMatchObject({ ok: true });
    await job.acceptBase('One base run.');
    valueOf(await job.fit('trial', 0, { g: 20, radius_mm: 700, deg: 0 }));
    expect((await job.sheet()).choices[0]?.vectors).toEqual([]);
    const before = await recordAt(job, minutes(-5));
    expect(await take(job, 'trial', before)).toMatchObject({
      failure: { code: 'older-than-weights', field: 'vectors.0.recordId' },
    });
    const after = await recordAt(job, minutes(1));
    expect((await job.sheet()).choices[0]?.vectors.map(({ recordId }) => recordId)).toEqual([
      after,
    ]);
    expect(await take(job, 'trial', after)).toMatchObject({ ok: true });
  });

  it('belongs to one run', async () => {
    const job = await openJob();
    const recordId = await recordAt(job, minutes(-10));
    expect(await take(job, 'base', recordId)).toMatchObject({ ok: true });
    expect(await take(job, 'base', recordId)).toMatchObject({ failure: { code: 'used' } });
  });
});
