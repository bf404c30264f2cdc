import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { addAddendum } from '@/lib/server/commands/add-addendum';
import { readRecordFile, type KeptRecord } from '@/lib/server/balance-job/record-file';
import { checkedRecords } from '@/lib/server/queries/checked-records';
import { recordOfFile } from '@/lib/server/queries/record-of-file';
import { signedRecord } from '@/lib/server/queries/signed-record';
import { openPlant } from '@/tests/support/open-plant';
import type { SmallPlant } from '@/tests/support/plant';
import { valueOf } from '../balance-job/job-driver';
import { signedJob } from './signed-job';

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;
let jobId: number;
let text: string;
let file: KeptRecord;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
  ({ jobId } = await signedJob(plant));
  text = JSON.stringify(await signedRecord(plant.at('reader'), jobId));
  file = valueOf(readRecordFile(text));
});

afterAll(() => close());

/** The kept file with a text of it replaced, as somebody would edit it. */
function edited(from: string | RegExp, to: string): KeptRecord {
  const changed = text.replace(from, to);
  if (changed === text) throw new Error('nothing was edited');
  return valueOf(readRecordFile(changed));
}

describe('a record looked up by its code', () => {
  it('is as signed, by sixteen digits or by all of them', async () => {
    for (const digits of [file.contentHash.slice(0, 16), file.contentHash]) {
      const [found, ...more] = await checkedRecords(plant.at('reader'), digits);
      expect(more).toEqual([]);
      expect(found).toMatchObject({
        jobId,
        machine: 'KX-2 Kiln exhaust fan',
        intact: true,
        recomputedHash: file.contentHash,
        addendaIntact: true,
        differences: [],
      });
    }
  });

  it('is not found by another code, nor by what is no code', async () => {
    expect(await checkedRecords(plant.at('reader'), '0'.repeat(16))).toEqual([]);
    expect(await checkedRecords(plant.at('reader'), '%')).toEqual([]);
  });
});

describe('a kept file', () => {
  it('is the record that was signed', async () => {
    expect(await recordOfFile(plant.at('reader'), file)).toMatchObject({
      same: true,
      differences: [],
      newerAddenda: 0,
      record: { jobId, intact: true },
    });
  });

  it('that was edited is found out, and the place is named', async () => {
    const check = await recordOfFile(plant.at('reader'), edited('"massG":90', '"massG":95'));
    expect(check?.same).toBe(false);
    expect(check?.differences).toEqual([{ path: 'weights 3 › massG', one: '95', other: '90' }]);
  });

  it('is found out where the signature was edited, not only the content', async () => {
    const check = await recordOfFile(
      plant.at('reader'),
      edited('"statement":"Done as recorded."', '"statement":"All targets met."'),
    );
    expect(check?.same).toBe(true);
    expect(check?.differences).toEqual([
      { path: 'statement', one: 'All targets met.', other: 'Done as recorded.' },
    ]);
  });

  it('is found by its job where even its hash was rewritten', async () => {
    const forged = { ...edited('"massG":90', '"massG":95'), contentHash: 'f'.repeat(64) };
    const check = await recordOfFile(plant.at('reader'), forged);
    expect(check?.record.jobId).toBe(jobId);
    expect(check?.differences.map(({ path }) => path)).toEqual([
      'weights 3 › massG',
      'contentHash',
    ]);
  });

  it('older than an addendum is still good, and the addendum is counted', async () => {
    valueOf(await addAddendum(plant.at('engineer'), { jobId, text: 'Later.', reason: 'Seen.' }));
    expect(await recordOfFile(plant.at('reader'), file)).toMatchObject({
      same: true,
      differences: [],
      newerAddenda: 1,
    });
  });

  it.each([
    ['no JSON', 'hello', 'not-json', /no JSON/],
    ['a list', '[]', 'not-a-record', /no object|expected/],
    ['another thing', '{"kind":"x"}', 'not-a-record', /“kind”/],
  ])('that is %s is refused with what is wrong', (_what, given, code, words) => {
    const read = readRecordFile(given);
    expect(read).toMatchObject({ failure: { code } });
    expect(read.ok ? '' : read.failure.message).toMatch(words);
  });

  it('without its hash is refused, and the member is named', () => {
    const { contentHash: _taken, ...rest } = JSON.parse(text) as Record<string, unknown>;
    expect(readRecordFile(JSON.stringify(rest))).toMatchObject({
      failure: { message: expect.stringContaining('“contentHash”') as string },
    });
  });
});

describe('a stored record that somebody changed past the database’s guard', () => {
  it('is not as signed, and what differs from the job is named', async () => {
    const sql = em.getConnection();
    await sql.execute('alter table sign_off disable trigger sign_off_append_only');
    await sql.execute(
      `update sign_off set content = jsonb_set(content, '{weights,2,massG}', '120') where job_id = ${jobId}`,
    );
    await sql.execute('alter table sign_off enable trigger sign_off_append_only');
    const [found] = await checkedRecords(plant.at('reader'), file.contentHash);
    expect(found?.intact).toBe(false);
    expect(found?.recomputedHash).not.toBe(file.contentHash);
    expect(found?.differences).toEqual([{ path: 'weights 3 › massG', one: '120', other: '90' }]);
  });

  it('is found out where an addendum was changed', async () => {
    const sql = em.getConnection();
    await sql.execute('alter table addendum disable trigger addendum_append_only');
    await sql.execute(`update addendum set text = 'Never.' where job_id = ${jobId}`);
    await sql.execute('alter table addendum enable trigger addendum_append_only');
    const [found] = await checkedRecords(plant.at('reader'), file.contentHash);
    expect(found?.addendaIntact).toBe(false);
    expect(
      await addAddendum(plant.at('engineer'), { jobId, text: 'More.', reason: 'Seen.' }),
    ).toMatchObject({ failure: { code: 'chain-broken' } });
  });
});
