import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { compare } from 'bcryptjs';
import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Answer, Coefficient } from '@/entities/answer';
import { AuditEvent } from '@/entities/audit-event';
import { BalanceJob } from '@/entities/balance-job';
import { SignOff } from '@/entities/caution';
import { Machine } from '@/entities/machine';
import { MeasuredRecord, OneXVector, Reading } from '@/entities/measured-record';
import { Person } from '@/entities/person';
import { Upload } from '@/entities/upload';
import { Weight } from '@/entities/weight';
import { subtract, size } from '@/lib/domain/complex';
import { influenceOf } from '@/lib/domain/plant-model/influence';
import type { Actor } from '@/lib/schemas/actor';
import { confirmUpload } from '@/lib/server/commands/confirm-upload';
import { closeDatabase, getEntityManager } from '@/lib/server/db';
import { balanceJob } from '@/lib/server/queries/balance-job';
import { modelOf } from '@/seeders/machine-spec';
import signIns from '@/seeders/demo-sign-ins.json';
import { NORTHBANK_FANS } from '@/seeders/northbank-fans';
import { SUNDVIK_MACHINES } from '@/seeders/sundvik-machines';
import { freshDatabase } from '@/tests/support/fresh-database';
import { actorOf } from '@/lib/server/actor';
import { dueCardOf } from './due-cards';
import { ask, countOf, READINGS_SUM, seed, WEIGHTS_SUM, type Ran } from './seeding';

const leftBehind = new Map<string, unknown>();
let em: EntityManager;
let folder: string;
let plant: { url: string; close: () => Promise<void> };
let broken: { url: string; close: () => Promise<void> };
let first: Ran;
let failed: Ran;
let repeated: Ran;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'evenrun-demo-'));
  [plant, broken] = [await freshDatabase(), await freshDatabase()];
  // The second refuses records with samples: it fails when people, machines and jobs are written.
  await ask(broken.url, `alter table waveform add constraint no_samples check (sample_count < 3)`);
  [first] = await Promise.all([seed(plant.url, join(folder, 'files')), seedBroken()]);
  process.env.DATABASE_URL = plant.url;
  process.env.EVENRUN_DATA_DIR = join(folder, 'files');
  em = await getEntityManager();
}, 180_000);

afterAll(async () => {
  await closeDatabase();
  await Promise.all([plant.close(), broken.close()]);
  await rm(folder, { recursive: true });
});

async function seedBroken(): Promise<void> {
  const files = join(folder, 'broken');
  failed = await seed(broken.url, files);
  for (const table of ['person', 'site', 'machine', 'weight', 'audit_event'])
    leftBehind.set(table, await countOf(broken.url, table));
  await ask(broken.url, 'alter table waveform drop constraint no_samples');
  repeated = await seed(broken.url, files);
}

describe('the seeding', () => {
  it('says in one line what it made, in time', () => {
    expect(first.code).toBe(0);
    expect(first.output).toMatch(
      /^Seeded the demo plant: 29 machines, \d{4} readings, 9 balance jobs in [\d.]+ s\n$/,
    );
    expect(first.seconds).toBeLessThan(60);
    process.stdout.write(first.output);
  });

  it('changes nothing where people are registered already', async () => {
    const tables = ['person', 'reading', 'audit_event', 'upload'];
    const before = await Promise.all(tables.map((table) => countOf(plant.url, table)));
    expect(await seed(plant.url, join(folder, 'files'))).toMatchObject({ code: 0, output: '' });
    const after = await Promise.all(tables.map((table) => countOf(plant.url, table)));
    expect(after).toEqual(before);
  });

  it('leaves the database empty when it fails half-way, and says why in a line', () => {
    expect(failed.code).toBe(1);
    expect(failed.output).toMatch(/^error: new row .* violates check constraint "no_samples"\n$/);
    expect(leftBehind.size).toBe(5);
    for (const [table, count] of leftBehind) expect(count, table).toBe(0);
  });

  it('makes the same plant again at the next start, to the last digit', async () => {
    expect(repeated).toMatchObject({ code: 0 });
    for (const sql of [READINGS_SUM, WEIGHTS_SUM]) {
      const [once, again] = [await ask(plant.url, sql), await ask(broken.url, sql)];
      expect(once[0]?.sum).toMatch(/^[0-9a-f]{32}$/);
      expect(again).toEqual(once);
    }
  });
});

describe('the plant', () => {
  it('has two sites, machines of many kinds, and people of every role', async () => {
    const machines = await em.find(Machine, {});
    expect(machines.length).toBeGreaterThanOrEqual(24);
    expect(new Set(machines.map(({ site }) => site.id)).size).toBe(2);
    expect(new Set(machines.map(({ kind }) => kind)).size).toBeGreaterThanOrEqual(8);
    const people = await em.find(Person, {});
    expect(new Set(people.map(({ role }) => role)).size).toBe(5);
    for (const { email, password, role } of signIns) {
      const person = people.find((one) => one.email === email);
      expect(person?.role).toBe(role);
      expect(await compare(password, person?.passwordHash ?? '')).toBe(true);
    }
  });

  it('has more than 13 months of readings up to yesterday', async () => {
    const [oldest] = await em.find(Reading, {}, { orderBy: { takenAt: 'asc' }, limit: 1 });
    const [newest] = await em.find(Reading, {}, { orderBy: { takenAt: 'desc' }, limit: 1 });
    const days = (at?: Date) => (Date.now() - (at?.getTime() ?? NaN)) / 86_400_000;
    expect(days(oldest?.takenAt)).toBeGreaterThan(396);
    expect(days(newest?.takenAt)).toBeGreaterThan(0);
    expect(days(newest?.takenAt)).toBeLessThan(5);
  });
});

describe('the product finds what was put in', () => {
  it.each(['EF-101', 'RM-1', 'WF-6', 'ID-1', 'VF-12'])('%s drifts out of balance', async (tag) => {
    const card = await dueCardOf(em, tag);
    expect(card.standing.trend?.perDay).toBeGreaterThan(0.003);
    expect(card.lane).toBe('rebalance');
    expect(card.mark).toBe('fresh');
  });

  it('KX-2 lost a weight: a jump of the 1x, the ledger knows it', async () => {
    const card = await dueCardOf(em, 'KX-2');
    expect(card.lane).toBe('rebalance');
    expect(card.standing.zone).toBe('C');
    const [lost] = await em.find(Weight, { ending: 'found missing' });
    const vectors = await em.find(
      OneXVector,
      { point: { label: 'B-H', machine: { tag: 'KX-2' } } },
      { orderBy: { takenAt: 'asc' } },
    );
    const lostAt = lost?.endedAt?.getTime() ?? NaN;
    const before = vectors.findLast(({ takenAt }) => takenAt.getTime() < lostAt);
    const after = vectors.find(({ takenAt }) => takenAt.getTime() > lostAt);
    expect(after!.amplitude - before!.amplitude).toBeGreaterThan(2);
  });

  it('CB-7 grows, but nobody has read it lately', async () => {
    const card = await dueCardOf(em, 'CB-7');
    expect(card.mark).toBe('old reading');
    expect(card.standing.trend?.perDay).toBeGreaterThan(0.003);
  });

  it.each([
    ['AV-3', 'a soft foot', 'direction'],
    ['SB-2', 'a resonance', 'direction'],
    ['P-31', 'misalignment', 'share'],
    ['P-B3', 'a bearing defect', 'share'],
  ])('%s has %s: find the cause', async (tag, _fault, key) => {
    const card = await dueCardOf(em, tag);
    expect(card.lane).toBe('find the cause');
    expect(card.likelihood).toBeLessThan(0.4);
    expect(card.parts.find((part) => part.key === key)?.value).toBeLessThan(0.2);
  });

  it.each(['P-B3', 'FP-2'])('%s knocks where its bearing fails', async (tag) => {
    const of = { point: { machine: { tag } } };
    const [kurtosis] = await em.find(
      Reading,
      { ...of, kind: 'kurtosis' },
      { orderBy: { takenAt: 'desc' }, limit: 1 },
    );
    expect(kurtosis!.value).toBeGreaterThan(5);
    const record = kurtosis!.record.id;
    const overall = await em.findOneOrFail(Reading, { record, kind: 'overall velocity' });
    const oneX = await em.findOneOrFail(OneXVector, { record });
    expect((oneX.amplitude / overall.value) ** 2).toBeLessThan(0.5);
  });

  it('leaves the majority in zones A and B', async () => {
    const rows = await em.getConnection().execute<{ tag: string; zone: string }[]>(
      `select m.tag, max(l.zone) as zone from machine m join point p on p.machine_id = m.id
         join lateral (select zone from reading where point_id = p.id and kind = 'overall velocity'
           and status = 'kept' order by taken_at desc limit 1) l on true
        group by m.tag`,
    );
    const sound = rows.filter(({ zone }) => zone <= 'B');
    expect(sound.length).toBeGreaterThan(rows.length / 2);
    expect(rows.filter(({ zone }) => zone === 'C').length).toBeGreaterThanOrEqual(5);
  });

  it('keeps the samples of the last round in order', async () => {
    const records = await em.find(MeasuredRecord, { source: 'waveform', state: 'kept' });
    expect(records.length).toBeGreaterThan(60);
    expect(records.every(({ holdReasons }) => holdReasons.length === 0)).toBe(true);
  });
});

describe('balance jobs', () => {
  it('are signed on at least three machines, with nothing temporary left on', async () => {
    const jobs = await em.find(BalanceJob, { state: 'signed' });
    expect(jobs.length).toBeGreaterThanOrEqual(5);
    expect(new Set(jobs.map(({ machine }) => machine.id)).size).toBeGreaterThanOrEqual(3);
    expect(new Set(jobs.map(({ kind }) => kind)).size).toBe(2);
    const ids = jobs.map(({ id }) => id);
    const ofJobs = { job: { $in: ids } };
    expect(await em.count(Weight, { ...ofJobs, endedAt: null, permanent: false })).toBe(0);
    expect(await em.count(Weight, { ...ofJobs, purpose: 'trial', stays: true })).toBe(2);
    expect(await em.count(Answer, ofJobs)).toBeGreaterThanOrEqual(jobs.length);
    expect(await em.count(SignOff, ofJobs)).toBe(jobs.length);
    expect(await em.count(AuditEvent, { action: 'signJob' })).toBe(jobs.length);
    for (const { openedAt, closedAt } of jobs) {
      const hours = ((closedAt?.getTime() ?? NaN) - openedAt.getTime()) / 3_600_000;
      expect(hours).toBeGreaterThan(1);
      expect(hours).toBeLessThan(10);
    }
  });

  it('estimate the coefficients the machines were made with', async () => {
    const book = await em.find(
      Coefficient,
      { source: 'fit over all runs' },
      { populate: ['plane', 'point', 'job.machine'] },
    );
    expect(book.length).toBeGreaterThanOrEqual(16);
    for (const estimate of book) {
      const { tag } = estimate.job.$.machine.$;
      const spec = [...NORTHBANK_FANS, ...SUNDVIK_MACHINES].find((one) => one.tag === tag);
      const model = modelOf(spec!);
      const plane = model.planes.findIndex(({ name }) => name === estimate.plane.$.name);
      const at = (label: string) =>
        influenceOf(
          model.points.find(({ name }) => name === label)!,
          plane,
          estimate.speedRpm,
        );
      const made = at(estimate.point.$.label);
      const most = Math.max(size(at('A-H')), size(at('B-H')));
      const off = size(subtract(made, { re: estimate.rePerGmm, im: estimate.imPerGmm })) / most;
      expect(off, `${tag} ${estimate.plane.$.name} ${estimate.point.$.label}`).toBeLessThan(0.05);
    }
  });

  it('bring the 1x down to a quarter or less', async () => {
    const jobs = await em.find(BalanceJob, { state: 'signed' }, { populate: ['openedBy'] });
    for (const { id } of jobs) {
      const sheet = await balanceJob(await engineer(), id);
      expect(sheet?.check?.points).toHaveLength(2);
      for (const { reductionPct } of sheet?.check?.points ?? [])
        expect(reductionPct).toBeGreaterThan(75);
    }
  });

  it('has one half-way, waiting at the trial weight', async () => {
    const job = await em.findOneOrFail(BalanceJob, { closedAt: null });
    const sheet = await balanceJob(await engineer(), job.id);
    expect(sheet?.machine.tag).toBe('VF-12');
    expect(sheet?.step.step).toBe('settle trial');
  });
});

describe('the in-tray', () => {
  it('holds a file of the neighbour with its reasons', async () => {
    const upload = await em.findOneOrFail(Upload, { state: 'held' });
    const { holdReasons } = await em.findOneOrFail(MeasuredRecord, { upload: upload.id });
    expect(holdReasons.map(({ code }) => code)).toEqual(['SPEED_OUTSIDE_RANGE', 'UNLIKE_POINT']);
    expect(holdReasons[1]?.message).toContain('P-205 A-H');
  });

  it('has files waiting, which are kept once confirmed', async () => {
    const waiting = await em.find(Upload, { state: 'waiting' }, { orderBy: { id: 'asc' } });
    expect(waiting).toHaveLength(2);
    const [upload] = waiting;
    const confirmed = await confirmUpload(await engineer(), {
      uploadId: upload!.id,
      layout: {
        delimiter: 'comma',
        decimalMark: 'point',
        sampleRateHz: 2560,
        columns: [{ role: 'signal', unit: 'm/s2' }, { role: 'tacho' }],
      },
      pointId: upload!.point!.id,
      takenAt: new Date(Date.now() - 3_600_000).toISOString(),
      speedRpm: '',
    });
    expect(confirmed).toMatchObject({ ok: true, value: { state: 'kept', reasons: [] } });
  });
});

async function engineer(): Promise<Actor> {
  const person = await em.findOneOrFail(Person, { email: 'aldo.marsh@both.example' });
  return actorOf(em, person);
}
