import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { addPhoto } from '@/lib/server/commands/add-photo';
import { picturesOf } from '@/lib/server/pdf/pictures-of';
import { reportPdf } from '@/lib/server/pdf/report-pdf';
import { jobRecord } from '@/lib/server/queries/job-record';
import { openPlant } from '@/tests/support/open-plant';
import type { SmallPlant } from '@/tests/support/plant';
import { readPdf } from '@/tests/support/read-pdf';
import { valueOf } from '../balance-job/job-driver';
import { pngFile } from '../balance-job/photo-files';
import { checkedJob } from './signed-job';

let plant: SmallPlant;
let close: () => Promise<void>;

beforeAll(async () => {
  ({ plant, close } = await openPlant());
});

afterAll(() => close());

describe('photos of the weights', () => {
  it('are in the PDF with what they show, or said to be missing', async () => {
    const job = await checkedJob(plant);
    const weight = (await job.sheet()).weights.at(-1);
    const input = { jobId: job.jobId, weightId: weight?.id ?? 0 };
    const photo = await pngFile('clamp.png', 400, 300);
    valueOf(await addPhoto(plant.at('technician'), { ...input, photo }));
    const reader = plant.at('reader');
    const record = await jobRecord(reader, job.jobId);
    if (!record) throw new Error('no record');
    const pictures = await picturesOf(reader, record.report);
    expect(pictures.size).toBe(1);
    const pages = await readPdf(await reportPdf(record.report, 'A4', pictures));
    const holder = pages.find(({ images }) => images > 0);
    expect(pages.reduce((sum, { images }) => sum + images, 0)).toBe(1);
    expect(holder?.text).toContain('75.0 g in plane R at 256° against rotation. technician home');
    const without = await readPdf(await reportPdf(record.report, 'A4'));
    expect(without.map(({ text }) => text).join(' ')).toContain('This photo is missing');
    expect((await picturesOf(plant.foreigner, record.report)).size).toBe(0);
  });
});
