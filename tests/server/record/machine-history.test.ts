import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Report, ReportTable } from '@/lib/schemas/report';
import { atTime } from '@/lib/server/clock';
import { reportPdf } from '@/lib/server/pdf/report-pdf';
import { machineHistory } from '@/lib/server/queries/machine-history';
import { openPlant } from '@/tests/support/open-plant';
import type { SmallPlant } from '@/tests/support/plant';
import { plainText, readPdf } from '@/tests/support/read-pdf';
import { stopJob } from '@/lib/server/commands/stop-job';
import { JobDriver, valueOf } from '../balance-job/job-driver';
import { signedJob } from './signed-job';

const DAY_MS = 86_400_000;
const FIRST = new Date('2026-02-01T09:00:00Z');
const onDay = <Value>(day: number, work: () => Promise<Value>) =>
  atTime(new Date(FIRST.getTime() + day * DAY_MS), work);

let plant: SmallPlant;
let close: () => Promise<void>;
let report: Report;

/** Signed on day 0, given up on day 40, signed again on day 90; told on day 121. */
beforeAll(async () => {
  ({ plant, close } = await openPlant());
  await onDay(0, () => signedJob(plant));
  await onDay(40, async () => {
    const { jobId } = await JobDriver.open(plant.at('technician'), plant.home, {
      kind: 'one-plane',
      speedRpm: 990,
      reason: 'A knock, no unbalance',
    });
    valueOf(
      await stopJob(plant.at('technician'), {
        jobId,
        outcome: 'not a balance job',
        reason: 'Loose bearing cap',
        rotorState: 'As before',
        safe: 'on',
      }),
    );
  });
  await onDay(90, () => signedJob(plant));
  const found = await onDay(121, () => machineHistory(plant.at('reader'), plant.home.machineId));
  if (!found) throw new Error('no history');
  ({ report } = found);
});

afterAll(() => close());

function tableOf(caption: string): string[][] {
  const blocks = report.sections.flatMap((section) => section.blocks);
  const found = blocks.find(
    (block): block is ReportTable => block.kind === 'table' && block.caption === caption,
  );
  if (!found) throw new Error(`no table ${caption}`);
  return found.rows.map(({ cells }) =>
    cells.map((cell) => plainText(typeof cell === 'string' ? cell : cell.text)),
  );
}

function fact(label: string): string {
  const [first] = report.sections.flatMap(({ blocks }) =>
    blocks
      .flatMap((block) => (block.kind === 'facts' ? block.facts : []))
      .filter((f) => f.label === label),
  );
  return plainText(first?.value ?? '');
}

// Readings, weights and sums of scenario S02 (see scenarios.json); days by hand.
describe('the history of a machine', () => {
  it('tells every job: why, before and after, runs, days until the next', () => {
    const [first, given, second] = tableOf('Jobs, oldest first');
    const s02 = 'A-H 3.97 → 0.220; B-H 3.23 → 0.400 mm/s rms';
    expect(first).toEqual([
      '1',
      '1 Feb 2026, technician home',
      '1x has grown into zone C',
      'two-plane',
      'signed',
      s02,
      '4',
      '90 d',
    ]);
    expect(given?.slice(2)).toEqual([
      'A knock, no unbalance',
      'one-plane',
      'not a balance job',
      'not measured',
      '0',
      'no balance',
    ]);
    expect(second?.slice(5)).toEqual([s02, '4', 'at least 31 d']);
    expect(fact('median balance life')).toBe('90 d');
    expect(fact('jobs')).toBe('2 signed of 3');
  });

  it('tells every weight, fitted and ended, in the order it happened, and what hangs now', () => {
    const lines = tableOf('Fitted and ended, oldest first');
    const what = lines.map(([, words]) => words?.split(/[,:]/)[0]);
    const oneJob = [
      ...['trial fitted', 'trial taken off', 'trial fitted', 'trial taken off'],
      ...['correction fitted', 'correction fitted'],
    ];
    expect([...what.slice(0, 6)].sort()).toEqual([...oneJob].sort());
    expect(what).toHaveLength(12);
    expect(lines.filter(([, , , mass]) => mass === '90.0 g').map((line) => line.at(-1))).toEqual([
      '1',
      '3',
    ]);
    // Twice 90 g and twice 75 g at 700 mm.
    expect(tableOf('Vector sum in each plane')).toEqual([
      ['L', '2', '126000', '124° against rotation', '180.0 g'],
      ['R', '2', '105000', '256° against rotation', '150.0 g'],
    ]);
  });

  it('tells the coefficients, one estimate a job, with spread and grade', () => {
    const book = tableOf('By plane and point');
    expect(book.map(([plane, point]) => `${plane} ${point}`)).toEqual([
      'L A-H',
      'L B-H',
      'R A-H',
      'R B-H',
    ]);
    for (const line of book)
      expect(line.slice(3, 4).concat(line.slice(6))).toEqual(['2', '0.0 %', 'good']);
    expect(tableOf('Estimates')).toHaveLength(8);
    for (const line of tableOf('Estimates')) expect(line[2]).toBe('fit over all runs');
  });

  it('leads to each job record', () => {
    const blocks = report.sections.flatMap((section) => section.blocks);
    const hrefs = blocks.flatMap((block) =>
      block.kind === 'table'
        ? block.rows.flatMap(({ cells }) =>
            cells.flatMap((cell) => (typeof cell === 'string' ? [] : [cell.href])),
          )
        : [],
    );
    expect(hrefs.length).toBeGreaterThan(10);
    for (const href of hrefs) expect(href).toMatch(/^\/balance-jobs\/\d+\/record$/);
  });

  it('is a PDF with the convention on every page', async () => {
    const pages = await readPdf(await reportPdf(report, 'A4'));
    for (const { text } of pages) {
      expect(text).toContain('degrees against rotation from the mark. Phase is lag');
      expect(text).toContain('KX-2 · balance history');
    }
    expect(pages.map(({ text }) => text).join(' ')).toContain('at least 31 d');
  });

  it('of a machine that was never balanced says so', async () => {
    const away = await machineHistory(plant.foreigner, plant.away.machineId);
    const texts = away?.report.sections.flatMap(({ blocks }) =>
      blocks.flatMap((block) => (block.kind === 'text' ? [block.text] : [])),
    );
    expect(texts).toContain('This machine was never balanced here.');
  });
});
