import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/schemas/actor';
import { confirmUpload } from '@/lib/server/commands/confirm-upload';
import { receiveUpload } from '@/lib/server/commands/receive-upload';
import type { SmallPlant } from '@/tests/support/plant';
import { openPlant } from '@/tests/support/open-plant';
import { bytesOf, failureOf, ONE_COLUMN_G, sineCsv, valueOf } from './records-of-test';

let plant: SmallPlant;
let close: () => Promise<void>;
let technician: Actor;

beforeAll(async () => {
  ({ plant, close } = await openPlant());

  technician = plant.at('technician');
});

afterAll(() => close());

describe('what a person types beside a file', () => {
  it.each([
    [
      { speedRpm: '0' },
      'speedRpm',
      'The speed is 0\u00a0r/min: it must be more than 0\u00a0r/min.',
    ],
    [
      { speedRpm: 'fast' },
      'speedRpm',
      '“fast” is not a number. Write the speed in r/min as digits, for example 12.5.',
    ],
    [
      { takenAt: 'yesterday' },
      'takenAt',
      '“yesterday” is not a time: write it as 2026-02-03T14:05.',
    ],
    [{ takenAt: '' }, 'takenAt', 'The time is missing: write it as 2026-02-03T14:05.'],
    [
      { takenAt: '2026-03-29T02:30' },
      'takenAt',
      'The clock of Europe/Berlin skips 2026-03-29T02:30 (summer time begins): write the time with its zone, such as +01:00.',
    ],
    [{ pointId: 0 }, 'pointId', 'Choose the point.'],
    [
      { layout: { ...ONE_COLUMN_G, columns: [{ role: 'ignore' as const, unit: '' as const }] } },
      'layout.columns.0.role',
      'No column is the vibration: choose which one is read.',
    ],
    [
      { layout: { ...ONE_COLUMN_G, columns: [{ role: 'signal' as const, unit: '' as const }] } },
      'layout.columns.0.unit',
      'Column 1 has no unit yet: choose the unit of the vibration.',
    ],
    [
      { layout: { ...ONE_COLUMN_G, sampleRateHz: '' } },
      'layout.sampleRateHz',
      'There is no time column: write how many samples a second were taken.',
    ],
    [
      { layout: { ...ONE_COLUMN_G, sampleRateHz: '-5' } },
      'layout.sampleRateHz',
      'The sample rate is -5\u00a0Hz: it must be more than 0\u00a0Hz.',
    ],
  ])('%j', async (change, field, message) => {
    const name = `beside-${field}-${JSON.stringify(change)}.csv`.slice(0, 100);
    const text = sineCsv({ hz: 16.5, rms: 0.1, tag: `\n# ${name}` });
    const { uploadId } = valueOf(
      await receiveUpload(technician, {
        fileName: name,
        bytes: bytesOf(text),
        siteId: null,
        pointId: null,
      }),
    );
    const confirmed = await confirmUpload(technician, {
      uploadId,
      pointId: plant.home.pointIds[0],
      takenAt: '2026-02-03T14:05',
      speedRpm: '990',
      layout: ONE_COLUMN_G,
      ...change,
    });
    expect(failureOf(confirmed)).toMatchObject({ field, message });
  });
});
