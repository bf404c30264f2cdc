import { createHash } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AuditEvent } from '@/entities/audit-event';
import { addAddendum } from '@/lib/server/commands/add-addendum';
import { cosignRecord } from '@/lib/server/commands/cosign-record';
import { jobRecord } from '@/lib/server/queries/job-record';
import { signedRecord } from '@/lib/server/queries/signed-record';
import { reportPdf } from '@/lib/server/pdf/report-pdf';
import { openPlant } from '@/tests/support/open-plant';
import type { SmallPlant } from '@/tests/support/plant';
import { readPdf } from '@/tests/support/read-pdf';
import { JobDriver, valueOf } from '../balance-job/job-driver';
import { signedJob } from './signed-job';

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;
let jobId: number;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
  ({ jobId } = await signedJob(plant));
});

afterAll(() => close());

const remark = (text: string) => ({ jobId, text, reason: 'Seen a week later.' });

async function record() {
  const found = await jobRecord(plant.at('reader'), jobId);
  if (!found?.signed) throw new Error('not signed');
  return { ...found, signed: found.signed };
}

describe('an addendum', () => {
  it('is kept beside the signed content and changes none of it', async () => {
    const before = await record();
    valueOf(await addAddendum(plant.at('engineer'), remark('A clamp was found loose.')));
    valueOf(await addAddendum(plant.at('technician'), remark('It was tightened.')));
    const after = await record();
    expect(after.signed.contentHash).toBe(before.signed.contentHash);
    expect(after.job).toEqual(before.job);
    expect(after.signed.addenda).toMatchObject([
      {
        number: 1,
        text: 'A clamp was found loose.',
        personName: 'engineer home',
        role: 'engineer',
      },
      { number: 2, text: 'It was tightened.', personName: 'technician home' },
    ]);
    expect(after.signed.addendaIntact).toBe(true);
    expect(after.report.revision).toBe('revision 3');
  });

  it('carries a hash over its words and the hash before it, as the file says', async () => {
    const file = await signedRecord(plant.at('reader'), jobId);
    let previous = file?.contentHash ?? '';
    expect(file?.addenda).toHaveLength(2);
    for (const { hash, ...words } of file?.addenda ?? []) {
      const sorted = Object.entries(words).sort(([a], [b]) => (a < b ? -1 : 1));
      const text = `{${sorted.map(([key, value]) => `${JSON.stringify(key)}:${JSON.stringify(value)}`).join(',')}}`;
      expect(createHash('sha256').update(text, 'utf8').digest('hex')).toBe(hash);
      expect(words.previousHash).toBe(previous);
      previous = hash;
    }
  });

  it('stands in the PDF with person, reason and hash', async () => {
    const { report, signed } = await record();
    const text = (await readPdf(await reportPdf(report, 'A4'))).map((page) => page.text).join(' ');
    expect(text).toContain('Addendum 2, technician home, technician,');
    expect(text).toContain('A clamp was found loose.');
    expect(text).toContain('Reason: Seen a week later.');
    expect(text).toContain(signed.addenda[1]?.hash);
  });

  it('leaves an audit row with its reason', async () => {
    const rows = await em
      .fork()
      .find(AuditEvent, { action: 'addAddendum', entityId: jobId }, { orderBy: { id: 'asc' } });
    expect(rows).toHaveLength(2);
    expect(rows[0]).toMatchObject({
      reason: 'Seen a week later.',
      after: { addendum: 1, text: 'A clamp was found loose.' },
    });
  });

  it('is refused by a role that may not write it, empty, or longer than 2000 characters', async () => {
    for (const role of ['reader', 'planner'] as const)
      expect(await addAddendum(plant.at(role), remark('x'))).toMatchObject({
        failure: { code: 'forbidden' },
      });
    expect(await addAddendum(plant.at('technician'), remark('  '))).toMatchObject({
      failure: { field: 'text', message: 'Write the remark.' },
    });
    expect(await addAddendum(plant.at('technician'), remark('x'.repeat(2001)))).toMatchObject({
      failure: { field: 'text', message: 'Keep the remark within 2000 characters.' },
    });
    expect(await addAddendum(plant.at('technician'), { ...remark('x'), reason: '' })).toMatchObject(
      { failure: { field: 'reason' } },
    );
    valueOf(await addAddendum(plant.at('technician'), remark('x'.repeat(2000))));
  });

  it('belongs to a signed job only, in the command and in the database', async () => {
    const open = await JobDriver.open(plant.at('technician'), plant.home, {
      kind: 'one-plane',
      speedRpm: 990,
    });
    expect(
      await addAddendum(plant.at('technician'), { ...remark('x'), jobId: open.jobId }),
    ).toMatchObject({ failure: { code: 'not-signed' } });
    const { personId } = plant.at('technician');
    await expect(
      em.getConnection().execute(
        `insert into addendum (job_id, number, text, reason, person_id, person_name, role, at, previous_hash, hash)
         values (${open.jobId}, 1, 'x', 'x', ${personId}, 'x', 'x', now(), 'x', 'x')`,
      ),
    ).rejects.toThrow(/not signed/);
  });
});

describe('a further signature', () => {
  it('stands under the same content, with its capacity and statement', async () => {
    const before = await record();
    valueOf(
      await cosignRecord(plant.at('engineer'), {
        jobId,
        capacity: 'reliability engineer',
        statement: 'Read; the miss is small.',
      }),
    );
    valueOf(
      await cosignRecord(plant.at('planner'), {
        jobId,
        capacity: 'area owner',
        statement: 'Taken back, runs quietly.',
      }),
    );
    const after = await record();
    expect(after.job.signOffs).toMatchObject([
      { role: 'technician' },
      { role: 'reliability engineer', statement: 'Read; the miss is small.' },
      { role: 'area owner', personName: 'planner home' },
    ]);
    const hashes = new Set(after.job.signOffs.map(({ contentHash }) => contentHash));
    expect([...hashes]).toEqual([before.signed.contentHash]);
    const file = await signedRecord(plant.at('reader'), jobId);
    expect(file?.signatures.map(({ role }) => role)).toEqual([
      'technician',
      'reliability engineer',
      'area owner',
    ]);
    expect(await em.fork().count(AuditEvent, { action: 'cosignRecord', entityId: jobId })).toBe(2);
  });

  it('is refused twice by one person, by a reader, before the first, and in a capacity not held', async () => {
    const sign = { jobId, capacity: 'area owner', statement: 'x' } as const;
    for (const role of ['technician', 'engineer'] as const)
      expect(await cosignRecord(plant.at(role), sign)).toMatchObject({
        failure: { code: 'signed-already' },
      });
    expect(await cosignRecord(plant.at('reader'), sign)).toMatchObject({
      failure: { code: 'forbidden' },
    });
    const open = await em
      .getConnection()
      .execute<{ id: number }[]>(`select id from balance_job where closed_at is null limit 1`);
    expect(
      await cosignRecord(plant.at('administrator'), { ...sign, jobId: open[0]?.id ?? 0 }),
    ).toMatchObject({ failure: { code: 'not-signed' } });
    const { jobId: other } = await signedJob(plant, await secondMachine());
    expect(
      await cosignRecord(plant.at('planner'), {
        jobId: other,
        capacity: 'reliability engineer',
        statement: 'x',
      }),
    ).toMatchObject({ failure: { code: 'capacity', field: 'capacity' } });
  });
});

async function secondMachine() {
  const { seedMachine } = await import('@/tests/support/plant');
  const { Site } = await import('@/entities/site');
  const { LimitSet } = await import('@/entities/limit-set');
  const fork = em.fork();
  const site = await fork.findOneOrFail(Site, plant.home.siteId);
  return seedMachine(fork, site, await fork.findOneOrFail(LimitSet, plant.limitSetId), 'KX-9');
}

describe('what was signed', () => {
  it('cannot be changed: the database refuses', async () => {
    const refused = [
      `update sign_off set content = '{}' where job_id = ${jobId}`,
      `update sign_off set statement = 'x' where job_id = ${jobId}`,
      `delete from sign_off where job_id = ${jobId}`,
      `truncate sign_off`,
      `update addendum set text = 'x' where job_id = ${jobId}`,
      `delete from addendum where job_id = ${jobId}`,
      `truncate addendum`,
    ];
    for (const statement of refused)
      await expect(em.getConnection().execute(statement), statement).rejects.toThrow(/append-only/);
    await expect(
      em.getConnection().execute(
        `insert into sign_off (job_id, person_id, person_name, role, statement, at, content_hash, content)
         values (${jobId}, ${plant.at('administrator').personId}, 'x', 'x', 'x', now(), repeat('0', 64), '{}')`,
      ),
    ).rejects.toThrow(/content signed first/);
  });
});
