import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { LimitSet } from '@/entities/limit-set';
import { Site } from '@/entities/site';
import { near } from '@/tests/domain/balancing/near';
import data from '@/tests/reference/data/balancing-scenarios.json';
import { openPlant } from '@/tests/support/open-plant';
import { seedMachine, type SmallPlant } from '@/tests/support/plant';
import { JobDriver, valueOf } from './job-driver';

// Scenario S07: invented machine; expected values computed by an independent implementation.
const { inputs, expected, tol } = data.scenarios.S07;

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;
let made = 0;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
});

afterAll(() => close());

/** S07 up to its check run: the trial's angle was counted with rotation and typed as against it. */
async function afterCheck(check: { amp: number; deg: number }): Promise<JobDriver> {
  made += 1;
  const site = await em.findOneOrFail(Site, plant.home.siteId);
  const limits = await em.findOneOrFail(LimitSet, plant.limitSetId);
  const machine = await seedMachine(em, site, limits, `S07-${made}`);
  const options = { kind: 'one-plane', speedRpm: 990 } as const;
  const job = await JobDriver.open(plant.at('technician'), machine, options);
  valueOf(await job.run('base', [inputs.base]));
  await job.acceptBase('One base run.');
  const { g, radius_mm: radius, deg_typed: deg } = inputs.trial;
  await job.trial(
    0,
    { g, radius_mm: radius, deg },
    { readings: [inputs.trial_run], stays: 'taken off' },
  );
  await job.accept();
  valueOf(await job.fit('correction', 0, inputs.installed_as_typed));
  valueOf(await job.run('check', [check]));
  return job;
}

describe('a check run that was not as predicted', () => {
  it('is explained by the slip that was made in S07, before everything else', async () => {
    const { slips } = await (await afterCheck(inputs.check_run)).sheet();
    const twins = slips.slice(0, 2).map(({ slip }) => slip);
    expect(twins.sort()).toEqual(['angles counted with rotation', 'lead read as lag']);
    const misses = new Map(slips.map(({ slip, miss }) => [slip, miss]));
    const wanted = expected.hypothesis_misses_mm_s;
    near(
      misses.get('angles counted with rotation') ?? NaN,
      wanted['all angles counted with rotation'],
      tol.mm_s,
    );
    near(misses.get('as entered') ?? NaN, wanted['as entered'], tol.mm_s);
    near(misses.get('fitted 180° off') ?? NaN, wanted['fitted weight 180 deg off'], tol.mm_s);
    near(misses.get('not fitted') ?? NaN, wanted['fitted weight never put on'], tol.mm_s);
    near(misses.get('trial left on') ?? NaN, wanted['trial weight left on as well'], tol.mm_s);
  });

  it('asks nothing where the run was as predicted', async () => {
    const { slips } = await (await afterCheck(expected.predicted)).sheet();
    expect(slips).toEqual([]);
  });
});
