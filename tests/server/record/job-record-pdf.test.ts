import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { shortCode } from '@/lib/domain/balance-job/record-code';
import type { JobRecordDto } from '@/lib/schemas/job-record';
import { reportPdf } from '@/lib/server/pdf/report-pdf';
import { jobRecord } from '@/lib/server/queries/job-record';
import { openPlant } from '@/tests/support/open-plant';
import type { SmallPlant } from '@/tests/support/plant';
import { plainText, readPdf, type ReadPage } from '@/tests/support/read-pdf';
import { JobDriver, valueOf } from '../balance-job/job-driver';
import { signedJob } from './signed-job';

// Sizes of paper in points of 1/72 inch. Sources: ISO 216 (A4, 210 mm × 297 mm); ANSI Y14.1 (Letter, 8.5 in × 11 in).
const A4 = { widthPt: (210 / 25.4) * 72, heightPt: (297 / 25.4) * 72 };
const LETTER = { widthPt: 8.5 * 72, heightPt: 11 * 72 };

const CONVENTION = 'degrees against rotation from the mark. Phase is lag';

let plant: SmallPlant;
let close: () => Promise<void>;
let record: JobRecordDto;
let pages: ReadPage[];

async function recordOf(jobId: number): Promise<JobRecordDto> {
  const found = await jobRecord(plant.at('reader'), jobId);
  if (!found) throw new Error('no record');
  return found;
}

beforeAll(async () => {
  ({ plant, close } = await openPlant());
  const { jobId } = await signedJob(plant);
  record = await recordOf(jobId);
  pages = await readPdf(await reportPdf(record.report, 'A4'));
});

afterAll(() => close());

const all = (read: readonly ReadPage[]) => read.map(({ text }) => text).join(' ');

describe('the PDF of a signed job', () => {
  // Values of scenario S02, computed apart from this project; see scenarios.json.
  it.each([
    ['base reading at A-H', '3.97 at 314° lag'],
    ['check reading at B-H', '0.400 at 354° lag'],
    ['reduction at A-H', '94.5 %'],
    ['reduction at B-H', '87.6 %'],
    ['answer in L', '92.2 g 124° against rotation'],
    ['answer in R', '72.5 g 256° against rotation'],
    ['what is on in L, g·mm', '63000'],
    ['what is on in R, g·mm', '52500'],
    ['coefficient of L at A-H', '0.0757'],
    ['what became of a trial weight', '40.0 g in plane L at 90° against rotation: taken off.'],
    ['permissible unbalance', '19446'],
    ['mark', 'Punch mark on the hub'],
    ['rotation', 'clockwise'],
    ['a caution', 'SAF-01, SAF-03, SAF-06'],
    ['which weight it was for', 'fit 90.0 g in L'],
    ['who was named', 'Ida Berg'],
    ['signature', 'technician home technician'],
    ['statement', 'Done as recorded.'],
    ['hand-back', 'Handed back to Marta Lowe.'],
  ])('says %s', (_what, said) => {
    expect(all(pages)).toContain(said);
  });

  it('says on every page what it is, its revision, page, convention, hash and code', () => {
    const hash = record.signed?.contentHash ?? '';
    expect(hash).toMatch(/^[0-9a-f]{64}$/);
    pages.forEach(({ text }, index) => {
      expect(text).toContain('KX-2 · job 1');
      expect(text).toContain(`revision 1 · page ${index + 1} of ${pages.length}`);
      expect(text).toContain(CONVENTION);
      expect(text).toContain(hash);
      expect(text).toContain(shortCode(hash));
      expect(text).not.toContain('draft');
    });
  });

  it('has nothing but what its report has: each cell of it can be read', () => {
    const printed = all(pages).replace(/ /g, '');
    const tables = record.report.sections
      .flatMap(({ blocks }) => blocks)
      .flatMap((block) => (block.kind === 'table' ? [block] : []));
    expect(tables.length).toBeGreaterThan(7);
    for (const { rows } of tables)
      for (const cell of rows.flatMap(({ cells }) => cells))
        expect(printed).toContain(
          plainText(typeof cell === 'string' ? cell : cell.text).replace(/ /g, ''),
        );
  });

  it('is A4 or Letter, and says the same on both', async () => {
    const letter = await readPdf(await reportPdf(record.report, 'LETTER'));
    expect(pages.length).toBeLessThanOrEqual(6);
    for (const page of pages) {
      expect(page.widthPt).toBeCloseTo(A4.widthPt, 0);
      expect(page.heightPt).toBeCloseTo(A4.heightPt, 0);
    }
    for (const page of letter) expect(page).toMatchObject(LETTER);
    for (const { text } of letter) expect(text).toContain(CONVENTION);
    expect(all(letter)).toContain('94.5 %');
  });
});

describe('the PDF of a job that nobody signed', () => {
  it('says so on every page', async () => {
    const job = await JobDriver.open(plant.at('technician'), plant.home, {
      kind: 'one-plane',
      speedRpm: 990,
    });
    valueOf(await job.run('base', [{ amp: 3.9, deg: 100 }]));
    const draft = await readPdf(await reportPdf((await recordOf(job.jobId)).report, 'A4'));
    for (const { text } of draft) {
      expect(text).toContain('not signed – draft');
      expect(text).toContain(CONVENTION);
      expect(text).not.toContain('content ');
    }
    expect(all(draft)).toContain('3.90 at 100° lag');
  });
});

describe('a long table', () => {
  it('repeats its head on every page it reaches', async () => {
    const rows = Array.from({ length: 160 }, (_, i) => ({ cells: [`row ${i}.`, 'x'.repeat(30)] }));
    const columns = [{ label: 'first column' }, { label: 'second column' }];
    const blocks = [{ kind: 'table' as const, caption: 'Many rows', columns, rows }];
    const long = { ...record.report, sections: [{ title: 'Long', blocks }] };
    const read = await readPdf(await reportPdf(long, 'A4'));
    expect(read.length).toBeGreaterThan(2);
    for (const { text } of read) expect(text).toContain('first column second column');
    for (const { cells } of rows) expect(all(read)).toContain(cells[0]);
    expect(all(read).match(/Many rows, continued/g)).toHaveLength(read.length - 1);
  });

  it('never leaves a heading alone at the foot of a page', async () => {
    const filler = (lines: number) => ({
      title: 'Filler',
      blocks: Array.from({ length: lines }, () => ({
        kind: 'text' as const,
        text: 'A line.',
        look: 'plain' as const,
      })),
    });
    const last = {
      title: 'HEADING',
      blocks: [{ kind: 'text' as const, text: 'BODY', look: 'plain' as const }],
    };
    for (let lines = 35; lines < 50; lines++) {
      const report = { ...record.report, sections: [filler(lines), last] };
      const read = await readPdf(await reportPdf(report, 'A4'));
      const holder = read.find(({ text }) => text.includes('HEADING'));
      expect(holder?.text, `${lines} lines`).toContain('BODY');
    }
  });
});
