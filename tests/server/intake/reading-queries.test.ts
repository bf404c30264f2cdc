import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/schemas/actor';
import { layoutChoices } from '@/lib/schemas/upload-input';
import { receiveUpload } from '@/lib/server/commands/receive-upload';
import { getEntityManager } from '@/lib/server/db';
import { inTray } from '@/lib/server/queries/in-tray';
import { inTrayCount } from '@/lib/server/queries/in-tray-count';
import { spectrumData, waveformData } from '@/lib/server/queries/reading-data';
import { readingPage } from '@/lib/server/queries/reading-page';
import { uploadedFile, uploadPage, uploadPreview } from '@/lib/server/queries/upload-page';
import type { SmallPlant } from '@/tests/support/plant';
import { openPlant } from '@/tests/support/open-plant';
import {
  bytesOf,
  machineWith,
  scenarioFile,
  sineCsv,
  uploadAndConfirm,
  valueOf,
  withBallBearing,
} from './records-of-test';

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;
let reader: Actor;
let recordId: number;
let uploadId: number;

const all = { from: null, to: null, columns: 500 };

beforeAll(async () => {
  ({ plant, close } = await openPlant());
  em = await getEntityManager();
  reader = plant.at('reader');
  const place = { siteId: plant.home.siteId, limitSetId: plant.limitSetId };
  const fan = await machineWith(em, place, { tag: 'EF-101', speeds: [1480, 1480, 1480] });
  await withBallBearing(em, fan.bearingIds[1]);
  const kept = await uploadAndConfirm(plant.at('technician'), {
    name: 'EF101_B_H.csv',
    bytes: scenarioFile('S17_EF101_B_H_tacho.csv'),
    pointId: fan.pointIds[1],
    takenAt: new Date(Date.now() - 86_400_000).toISOString(),
    layout: {
      delimiter: 'comma',
      decimalMark: 'point',
      sampleRateHz: '',
      columns: [
        { role: 'time', unit: 's' },
        { role: 'signal', unit: 'm/s2' },
        { role: 'tacho', unit: '' },
      ],
    },
  });
  recordId = kept.recordId;
  const waiting = await receiveUpload(plant.at('technician'), {
    fileName: 'EF101 B-H next.csv',
    bytes: bytesOf(sineCsv({ hz: 24.7, rms: 0.05 })),
    siteId: null,
    pointId: null,
  });
  uploadId = valueOf(waiting).uploadId;
});

afterAll(() => close());

describe('the in-tray', () => {
  it('lists waiting before kept, with counts', async () => {
    const tray = await inTray(reader, { state: 'all' });
    expect(tray.counts).toEqual({ waiting: 1, held: 0, kept: 1, withdrawn: 0 });
    expect(tray.rows.map(({ state }) => state)).toEqual(['waiting', 'kept']);
    expect(tray.rows[1]).toMatchObject({
      point: { label: 'B-H', machineTag: 'EF-101' },
      record: { id: recordId, zone: 'C', reasons: [] },
    });
    const open = await inTray(reader, { state: 'open' });
    expect(open).toMatchObject({ found: 1, rows: [{ uploadId, state: 'waiting', record: null }] });
    expect(await inTrayCount(reader, undefined)).toBe(1);
  });
});

describe('a waiting file', () => {
  it('shows rows, plot and the point its name names', async () => {
    const page = await uploadPage(reader, uploadId);
    expect(page?.preview).toMatchObject({ problem: null, layout: { sampleRateHz: 2560 } });
    expect(page?.preview.rows).toHaveLength(20);
    expect(page?.preview.rows[0]?.row).toBe(3);
    expect(page?.preview.plot).toMatchObject({ sampleCount: 5120, unit: 'g', durationS: 2 });
    const named = page?.points.find(({ id }) => id === page.suggestedPointId);
    expect(named?.label).toBe('EF-101 B-H');
  });

  it('is shown as it reads with other choices', async () => {
    const choose = (change: object) =>
      layoutChoices.parse({
        delimiter: 'none',
        decimalMark: 'point',
        sampleRateHz: '5120',
        columns: [{ role: 'signal', unit: 'mm/s' }],
        ...change,
      });
    const other = await uploadPreview(reader, { uploadId, choices: choose({}) });
    expect(other?.plot).toMatchObject({ unit: 'mm/s', quantity: 'velocity', durationS: 1 });
    const wrong = await uploadPreview(reader, {
      uploadId,
      choices: choose({ decimalMark: 'comma' }),
    });
    expect(wrong?.plot).toBeNull();
    expect(wrong?.problem).toMatch(
      /^EF101 B-H next\.csv, row 3, column "acceleration_g": ".+" is not a number; expected one with a decimal comma, such as 0,25\.$/,
    );
  });

  it('is handed back byte for byte', async () => {
    const file = await uploadedFile(reader, uploadId);
    expect(file?.bytes.toString()).toBe(sineCsv({ hz: 24.7, rms: 0.05 }));
  });
});

describe('a record', () => {
  it('shows values, vector, how they were made, and its bearing', async () => {
    const page = await readingPage(reader, recordId);
    expect(page).toMatchObject({
      state: 'kept',
      place: { machineTag: 'EF-101', label: 'B-H' },
      declared: null,
      waveform: { shownUnit: 'm/s²', withTacho: true, durationS: 2 },
      vector: { setupNumber: 1, unit: 'mm/s rms' },
      made: { speedSource: 'tacho', turns: 48, averages: 1, blockLength: 20_480 },
      suggestions: [],
    });
    const bpfo = page?.marks.find(({ label }) => label === 'BPFO')?.frequencyHz ?? 0;
    expect(bpfo).toBeCloseTo((9 / 2) * (1480 / 60) * (1 - 22.2 / 103), 1);
  });

  it('is sent reduced with its extremes, and sample by sample when near enough', async () => {
    const whole = await waveformData(reader, { recordId, ...all });
    expect(whole).toMatchObject({ sampleCount: 20_480, unit: 'm/s²', durationS: 2 });
    expect(whole?.seconds).toHaveLength(1000);
    expect(whole?.turns).toHaveLength(49);
    const text = scenarioFile('S17_EF101_B_H_tacho.csv');
    const samples = new TextDecoder()
      .decode(text)
      .trim()
      .split('\n')
      .slice(1)
      .map((row) => Number(row.split(',')[1]));
    expect(Math.max(...whole!.values)).toBe(Math.max(...samples));
    expect(Math.min(...whole!.values)).toBe(Math.min(...samples));
    const near = await waveformData(reader, { recordId, from: 0.5, to: 0.51, columns: 500 });
    expect(near?.seconds[0]).toBe(0.5);
    expect(near?.sampleCount).toBe(104);
    expect(near!.values[0]).toBe(samples[5120]);
  });

  it('has a velocity spectrum whose lines are those of the overall, and others beside it', async () => {
    const velocity = (await spectrumData(reader, { recordId, kind: 'velocity', ...all }))!;
    expect(velocity).toMatchObject({ unit: 'mm/s rms', dfHz: 0.5 });
    const top = velocity.values.indexOf(Math.max(...velocity.values));
    expect(Math.abs(velocity.hz[top]! - 1480 / 60)).toBeLessThanOrEqual(0.5);
    expect(velocity.hz.at(-1)).toBeLessThanOrEqual(1000);
    const zoomed = await spectrumData(reader, {
      recordId,
      kind: 'acceleration',
      from: 100,
      to: 110,
      columns: 500,
    });
    expect([zoomed!.hz[0], zoomed!.hz.at(-1), zoomed!.hz.length]).toEqual([100, 110, 21]);
    const envelope = await spectrumData(reader, { recordId, kind: 'envelope', ...all });
    expect(envelope!.settings).toMatchObject({ highHz: 4608 });
    expect(envelope!.hz.at(-1)).toBeLessThanOrEqual(1000);
  });

  it('that does not exist is null', async () => {
    expect(await readingPage(reader, 999_999)).toBeNull();
    expect(await waveformData(reader, { recordId: 999_999, ...all })).toBeNull();
    expect(await spectrumData(reader, { recordId: 0, kind: 'velocity', ...all })).toBeNull();
  });
});
