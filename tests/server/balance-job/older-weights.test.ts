import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { LimitSet } from '@/entities/limit-set';
import { Person } from '@/entities/person';
import { Site } from '@/entities/site';
import { Weight } from '@/entities/weight';
import { correctLedger, recordFoundWeight } from '@/lib/server/commands/correct-ledger';
import { takeOffWeight } from '@/lib/server/commands/settle-weight';
import { openPlant } from '@/tests/support/open-plant';
import { seedMachine, type SmallPlant } from '@/tests/support/plant';
import { JobDriver, valueOf } from './job-driver';

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;
let made = 0;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
});

afterAll(() => close());

/** A rotor that carries 20 g at 30° from an earlier year, and a job on it. */
async function jobWithOldWeight(): Promise<{ job: JobDriver; weightId: number }> {
  made += 1;
  const site = await em.findOneOrFail(Site, plant.home.siteId);
  const limits = await em.findOneOrFail(LimitSet, plant.limitSetId);
  const machine = await seedMachine(em, site, limits, `OLD-${made}`);
  const weight = em.create(Weight, {
    rotor: machine.rotorId,
    plane: machine.planeIds[0],
    angleDeg: 30,
    radiusMm: 700,
    massG: 20,
    massSource: 'nominal',
    purpose: 'found',
    fixing: 'weld',
    permanent: true,
    entered: { angleDeg: 30, angleSense: 'against' },
    fittedAt: new Date('2025-03-01T10:00:00Z'),
    fittedBy: em.getReference(Person, plant.at('technician').personId, { wrapped: true }),
  });
  await em.flush();
  const job = await JobDriver.open(plant.at('technician'), machine, {
    kind: 'one-plane',
    speedRpm: 990,
  });
  return { job, weightId: weight.id };
}

const still = { standingStill: 'on', namedPerson: 'Ida Berg' } as const;
const base = { amp: 4, deg: 100 };

describe('an older weight taken off as part of the job', () => {
  it('counts as the same weight on the opposite side, in the run, the fit and the check', async () => {
    const { job, weightId } = await jobWithOldWeight();
    valueOf(await job.run('base', [base]));
    await job.acceptBase('One base run.');
    await job.trial(
      0,
      { g: 20, radius_mm: 700, deg: 0 },
      { readings: [{ amp: 3, deg: 100 }], stays: 'taken off' },
    );
    // 20 g at 0° lower the reading by a quarter; taking 20 g off at 30° does what 20 g at 210° do.
    await job.accept();
    const { jobId, actor } = job;
    valueOf(await takeOffWeight(actor, { jobId, weightId, reason: 'In the way.', ...still }));
    const sheet = await job.sheet();
    expect(sheet.step).toMatchObject({ step: 'fit correction', planeIds: [] });
    expect(sheet.asFitted?.planes[0]).toMatchObject({ fittedG: 20, isFar: true });
    expect(sheet.asFitted?.planes[0]?.fittedDeg).toBeCloseTo(210, 9);
    // 4 + (−1)·e^{j210°} along the base's own direction: 4 + 0.866 and 0.5 across.
    expect(sheet.asFitted?.expected[0]?.amplitude).toBeCloseTo(Math.hypot(4 + 0.8660254, 0.5), 6);
    valueOf(await job.run('check', [{ amp: 4.892, deg: 105.87 }]));
    const checked = await job.sheet();
    expect(checked.check?.points[0]?.miss ?? 9).toBeLessThan(0.01);
    expect(checked.runs.at(-1)?.weightIds).toEqual([weightId]);
    expect(checked.olderWeights).toMatchObject([{ id: weightId, ending: 'taken off' }]);
    const [plane] = checked.answer?.planes ?? [];
    // What the base asked for (80 g at 0°), less what taking off did (20 g at 210°).
    const x = 80 - 20 * Math.cos((210 * Math.PI) / 180);
    const y = -20 * Math.sin((210 * Math.PI) / 180);
    expect(plane?.massG).toBeCloseTo(Math.hypot(x, y), 1);
    expect(plane?.totalMassG).toBeCloseTo(80, 1);
  });

  it('before the first run is no part of the arithmetic: every run was without it', async () => {
    const { job, weightId } = await jobWithOldWeight();
    const { jobId, actor } = job;
    valueOf(await takeOffWeight(actor, { jobId, weightId, reason: 'Loose.', ...still }));
    valueOf(await job.run('base', [base]));
    const { runs, olderWeights } = await job.sheet();
    expect(runs[0]?.weightIds).toEqual([]);
    expect(olderWeights).toMatchObject([{ id: weightId, ending: 'taken off' }]);
  });
});

describe('ledger check', () => {
  it('a worn weight is ended and goes on with the mass that is left', async () => {
    const { job, weightId } = await jobWithOldWeight();
    const { jobId, actor } = job;
    const worn = { jobId, weightId, found: 'worn', reason: 'Edges eaten away.', ...still } as const;
    expect(await correctLedger(actor, { ...worn, massG: '' })).toMatchObject({
      failure: { field: 'massG' },
    });
    valueOf(await correctLedger(actor, { ...worn, massG: '17.6' }));
    const { olderWeights } = await job.sheet();
    expect(olderWeights).toMatchObject([
      { massG: 17.6, purpose: 'found', endedAt: null },
      { id: weightId, ending: 'found worn' },
    ]);
    const kept = await em.fork().findOneOrFail(Weight, { replaces: weightId });
    expect(kept.angleDeg).toBe(30);
  });

  it('after a run a worn weight is refused, and a missing one counts as having come off', async () => {
    const { job, weightId } = await jobWithOldWeight();
    const { jobId, actor } = job;
    valueOf(await job.run('base', [base]));
    const gone = { jobId, weightId, reason: 'Weld is broken.', ...still };
    expect(await correctLedger(actor, { ...gone, found: 'worn', massG: '18' })).toMatchObject({
      failure: { code: 'runs-made' },
    });
    valueOf(await correctLedger(actor, { ...gone, found: 'missing', massG: '' }));
    valueOf(await job.run('base', [{ amp: 4.8, deg: 104 }]));
    expect((await job.sheet()).runs.map(({ weightIds }) => weightIds)).toEqual([[], [weightId]]);
  });

  it('a weight that no ledger lists goes on it and stays out of the arithmetic', async () => {
    const { job } = await jobWithOldWeight();
    const { jobId, actor, machine } = job;
    const place = { planeId: machine.planeIds[0], massG: '12', radiusMm: '690', arcMm: '' };
    const found = { ...place, angleDeg: '75', angleSense: 'with', fixing: 'rivet' } as const;
    valueOf(await recordFoundWeight(actor, { jobId, ...found, ...still }));
    valueOf(await job.run('base', [base]));
    const { olderWeights, runs } = await job.sheet();
    expect(olderWeights.at(-1)).toMatchObject({ massG: 12, angleDeg: 285, enteredSense: 'with' });
    expect(runs[0]?.weightIds).toEqual([]);
  });

  it('a weight recorded twice at one place is asked about', async () => {
    const { job } = await jobWithOldWeight();
    valueOf(await job.run('base', [base]));
    await job.acceptBase('One base run.');
    await job.trial(
      0,
      { g: 20, radius_mm: 700, deg: 0 },
      { readings: [{ amp: 3, deg: 100 }], stays: 'taken off' },
    );
    await job.accept();
    valueOf(await job.fit('correction', 0, { g: 50, radius_mm: 700, deg: 0 }));
    expect(await job.fit('correction', 0, { g: 50, radius_mm: 700, deg: 0 })).toMatchObject({
      failure: { code: 'recorded-already' },
    });
    valueOf(await job.fit('correction', 0, { g: 30, radius_mm: 700, deg: 5 }));
    expect((await job.sheet()).weights).toHaveLength(3);
  });
});
