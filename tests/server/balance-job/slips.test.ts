import { createHash } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AuditEvent } from '@/entities/audit-event';
import { RunVector } from '@/entities/balance-job';
import { LimitSet } from '@/entities/limit-set';
import { Site } from '@/entities/site';
import { Weight } from '@/entities/weight';
import { acceptAnswer } from '@/lib/server/commands/accept-answer';
import { lineThroughRun } from '@/lib/server/commands/settle-run';
import { signJob } from '@/lib/server/commands/sign-job';
import { stopJob } from '@/lib/server/commands/stop-job';
import { jobRecord } from '@/lib/server/queries/job-record';
import { signedRecord } from '@/lib/server/queries/signed-record';
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

async function openJob(
  over: Partial<Parameters<typeof JobDriver.open>[2]> = {},
): Promise<JobDriver> {
  made += 1;
  const site = await em.findOneOrFail(Site, plant.home.siteId);
  const limits = await em.findOneOrFail(LimitSet, plant.limitSetId);
  const machine = await seedMachine(em, site, limits, `SLIP-${made}`);
  return JobDriver.open(plant.at('technician'), machine, {
    kind: 'one-plane',
    speedRpm: 990,
    ...over,
  });
}

async function withBase(over: Parameters<typeof openJob>[0] = {}): Promise<JobDriver> {
  const job = await openJob(over);
  const readings = [
    { amp: 3.9, deg: 100 },
    { amp: 3.2, deg: 200 },
  ];
  valueOf(await job.run('base', readings.slice(0, (await job.sheet()).points.length)));
  await job.acceptBase('One base run.');
  return job;
}

describe('what cannot be recorded', () => {
  it('a speed of zero, an angle of 720 or −10, a mass of zero: each says what was typed', async () => {
    const job = await openJob();
    expect(await job.run('base', [{ amp: 3.9, deg: 100 }], 0)).toMatchObject({
      failure: {
        field: 'speedRpm',
        message: 'The speed is 0\u00a0r/min: it must be more than 0\u00a0r/min.',
      },
    });
    expect(await job.run('base', [{ amp: 3.9, deg: 720 }])).toMatchObject({
      failure: { field: 'vectors.0.phaseDeg', message: expect.stringContaining('720') as string },
    });
    valueOf(await job.run('base', [{ amp: 3.9, deg: 100 }]));
    await job.acceptBase('One base run.');
    for (const deg of [720, -10])
      expect(await job.fit('trial', 0, { g: 20, radius_mm: 700, deg })).toMatchObject({
        failure: { field: 'angleDeg', message: expect.stringContaining(String(deg)) as string },
      });
    expect(await job.fit('trial', 0, { g: 0, radius_mm: 700, deg: 0 })).toMatchObject({
      failure: { field: 'massG', message: 'The mass is 0\u00a0g: it must be more than 0\u00a0g.' },
    });
  });

  it('a weight beyond what the plane may carry', async () => {
    const job = await withBase();
    expect(await job.fit('trial', 0, { g: 251, radius_mm: 700, deg: 0 })).toMatchObject({
      failure: { code: 'over-limit', message: expect.stringContaining('250 g') as string },
    });
  });

  it('steps out of order, each with what to do', async () => {
    const job = await openJob();
    expect(await job.run('trial', [{ amp: 3, deg: 0 }])).toMatchObject({
      failure: { code: 'out-of-order' },
    });
    expect(await job.fit('correction', 0, { g: 5, radius_mm: 700, deg: 0 })).toMatchObject({
      failure: { code: 'out-of-order' },
    });
  });

  it('a base of one run without a reason', async () => {
    const job = await openJob();
    valueOf(await job.run('base', [{ amp: 3.9, deg: 100 }]));
    await expect(job.acceptBase()).rejects.toThrow(/1 of 3 base runs/);
  });

  it('anything by a reader', async () => {
    const job = await openJob();
    const reader = job.as(plant.at('reader'));
    expect(await reader.run('base', [{ amp: 1, deg: 1 }])).toMatchObject({
      failure: { code: 'forbidden' },
    });
  });
});

describe('no answer is shown', () => {
  it('where the trial changed nothing at all', async () => {
    const job = await withBase();
    await job.trial(
      0,
      { g: 20, radius_mm: 700, deg: 0 },
      { readings: [{ amp: 3.9, deg: 100 }], stays: 'taken off' },
    );
    const { answer, answerFailure } = await job.sheet();
    expect(answer).toBeNull();
    expect(answerFailure).toMatch(/trial weight/i);
  });

  it('where two planes act alike, and an equal pair is offered instead', async () => {
    const job = await withBase({ kind: 'two-plane' });
    const same = [
      { amp: 3.1, deg: 90 },
      { amp: 2.6, deg: 190 },
    ];
    for (const plane of [0, 1])
      await job.trial(
        plane,
        { g: 40, radius_mm: 700, deg: 0 },
        { readings: same, stays: 'taken off' },
      );
    const { answer } = await job.sheet();
    expect(answer?.staticPair).toBe(true);
    expect(answer?.warnings.join(' ')).toMatch(/act (the same|almost alike)/);
  });
});

describe('the way a person reads and counts', () => {
  it('is converted once and kept as typed', async () => {
    const job = await withBase({ phaseSense: 'lead' });
    const [vector] = await em.fork().find(RunVector, { run: { job: job.jobId } });
    // A lead of 100° is a lag of 260° (definition).
    expect(vector).toMatchObject({ lagDeg: 260, entered: { phaseDeg: 100, phaseSense: 'lead' } });
    valueOf(await job.fit('trial', 0, { g: 20, radius_mm: 700, deg: 75, sense: 'with' }));
    const [weight] = await em.fork().find(Weight, { job: job.jobId });
    expect(weight).toMatchObject({
      angleDeg: 285,
      entered: { angleDeg: 75, angleSense: 'with' },
    });
  });
});

describe('a run at another speed', () => {
  it('is saved, held and feeds nothing', async () => {
    const job = await openJob();
    valueOf(await job.run('base', [{ amp: 3.9, deg: 100 }], 990));
    const off = valueOf(await job.run('base', [{ amp: 4.4, deg: 110 }], 1010));
    expect(off.held).toMatch(/2\.02 %/);
    const sheet = await job.sheet();
    expect(sheet.runs[1]?.state).toBe('held');
    expect(sheet.repeats[0]?.test).toBeNull();
  });
});

describe('a job that ends', () => {
  it('cannot be signed while a trial weight is temporary, nor without a check run', async () => {
    const job = await withBase();
    const sign = {
      jobId: job.jobId,
      statement: 'Done.',
      permanentWeightIds: [],
      handBack: 'on' as const,
      areaOwner: 'Marta Lind',
      reason: 'Short stop.',
    };
    expect(await signJob(plant.at('technician'), sign)).toMatchObject({
      failure: { code: 'no-check' },
    });
    await job.trial(
      0,
      { g: 20, radius_mm: 700, deg: 0 },
      { readings: [{ amp: 3.2, deg: 130 }], stays: 'stays on' },
    );
    const { planes } = await job.accept();
    valueOf(
      await job.fit('correction', 0, {
        g: planes[0]?.massG ?? 0,
        radius_mm: 700,
        deg: planes[0]?.angleDeg ?? 0,
      }),
    );
    valueOf(await job.run('check', [{ amp: 0.3, deg: 10 }]));
    expect(await signJob(plant.at('technician'), sign)).toMatchObject({
      failure: { code: 'temporary', field: 'permanentWeightIds' },
    });
    const on = (await job.sheet()).weights.map(({ id }) => id);
    valueOf(await signJob(plant.at('technician'), { ...sign, permanentWeightIds: on }));
    const record = await jobRecord(plant.at('reader'), job.jobId);
    expect(record?.signed?.intact).toBe(true);
    const file = await signedRecord(plant.at('reader'), job.jobId);
    expect(file).toMatchObject({ contentHash: record?.signed?.contentHash, statement: 'Done.' });
    expect(hashAsTheFileSays(file?.content)).toBe(file?.contentHash);
    expect(await job.run('check', [{ amp: 0.3, deg: 10 }])).toMatchObject({
      failure: { code: 'closed' },
    });
  });

  it('keeps the ledger as it is when it is stopped', async () => {
    const job = await withBase();
    expect(await signedRecord(plant.at('reader'), job.jobId)).toBeNull();
    valueOf(await job.fit('trial', 0, { g: 20, radius_mm: 700, deg: 0 }));
    valueOf(
      await stopJob(plant.at('technician'), {
        jobId: job.jobId,
        outcome: 'not a balance job',
        reason: 'A foot is soft.',
        rotorState: '20 g trial weight in plane L',
        safe: 'on',
      }),
    );
    const sheet = await job.sheet();
    expect(sheet.state).toBe('not a balance job');
    expect(sheet.weights[0]?.endedAt).toBeNull();
    expect(sheet.step).toEqual({ step: 'closed' });
  });
});

/** The hash as the file's own words say it is made, written apart from the product's code. */
function hashAsTheFileSays(content: unknown): string {
  const sorted = (value: unknown): string => {
    if (Array.isArray(value)) return `[${value.map(sorted).join(',')}]`;
    if (value === null || typeof value !== 'object') return JSON.stringify(value);
    const entries = Object.entries(value).sort(([one], [other]) => (one < other ? -1 : 1));
    return `{${entries.map(([key, inner]) => `${JSON.stringify(key)}:${sorted(inner)}`).join(',')}}`;
  };
  return createHash('sha256').update(sorted(content), 'utf8').digest('hex');
}

describe('facts', () => {
  it('stay: the database refuses to change a reading, to delete a run, to edit the audit', async () => {
    const job = await withBase();
    const sql = em.getConnection();
    const refused = [
      `update run_vector set amplitude = 1 where run_id in (select id from run where job_id = ${job.jobId})`,
      `update run set speed_rpm = 1 where job_id = ${job.jobId}`,
      `delete from run where job_id = ${job.jobId}`,
      `update audit_event set reason = 'x'`,
      `delete from audit_event`,
      `truncate audit_event`,
    ];
    for (const statement of refused)
      await expect(sql.execute(statement), statement).rejects.toThrow(
        /append-only|keeps its facts/,
      );
  });

  it('are lined through with a reason and an audit row', async () => {
    const job = await openJob();
    const { runId } = valueOf(await job.run('base', [{ amp: 3.9, deg: 100 }]));
    const lined = { jobId: job.jobId, runId, reason: 'The sensor had come loose.' };
    valueOf(await lineThroughRun(plant.at('technician'), lined));
    const sheet = await job.sheet();
    expect(sheet.runs[0]).toMatchObject({ state: 'lined through', stateReason: lined.reason });
    const audit = await em
      .fork()
      .findOneOrFail(AuditEvent, { entity: 'Run', entityId: runId, action: 'lineThroughRun' });
    expect(audit).toMatchObject({ reason: lined.reason, before: { state: 'kept' } });
  });

  it('an answer that has changed since it was shown is not accepted', async () => {
    const job = await withBase();
    await job.trial(
      0,
      { g: 20, radius_mm: 700, deg: 0 },
      { readings: [{ amp: 3.2, deg: 130 }], stays: 'taken off' },
    );
    expect(
      await acceptAnswer(plant.at('technician'), { jobId: job.jobId, fingerprint: 'older' }),
    ).toMatchObject({ failure: { code: 'changed' } });
  });
});
