import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Upload } from '@/entities/upload';
import { MeasuredRecord, Waveform } from '@/entities/measured-record';
import type { Actor } from '@/lib/schemas/actor';
import { UPLOAD_BYTES_MAX } from '@/lib/schemas/upload-input';
import { confirmUpload } from '@/lib/server/commands/confirm-upload';
import { receiveUpload } from '@/lib/server/commands/receive-upload';
import { getEntityManager } from '@/lib/server/db';
import type { SmallPlant } from '@/tests/support/plant';
import { openPlant } from '@/tests/support/open-plant';
import { bytesOf, failureOf, ONE_COLUMN_G, sineCsv, valueOf } from './records-of-test';

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;
let technician: Actor;

beforeAll(async () => {
  ({ plant, close } = await openPlant());
  em = await getEntityManager();
  technician = plant.at('technician');
});

afterAll(() => close());

const receive = (fileName: string, content: string | Uint8Array) =>
  receiveUpload(technician, {
    fileName,
    bytes: typeof content === 'string' ? bytesOf(content) : content,
    siteId: null,
    pointId: null,
  });

const COLUMN = '# sample_rate_hz=1000\nacceleration_g\n';
const TIMED = 'time_s,acceleration_g\n';
const rows = (row: (i: number) => string) =>
  Array.from({ length: 40 }, (_, i) => row(i)).join('\n');
const odd = (at: number, text: string) => COLUMN + rows((i) => (i === at ? text : `0.${i}`));
const timed = (time: (i: number) => number) =>
  TIMED + rows((i) => `${(time(i) / 1000).toFixed(4)},0.${i}`);

describe('files that are refused at the door', () => {
  it.each([
    ['empty.csv', '', 'empty.csv: the file is empty; export it again.'],
    ['words.csv', 'hello\nworld\n', 'words.csv: there are no numbers; export the samples.'],
    [
      'picture.csv',
      Uint8Array.of(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13),
      'picture.csv: this is a PNG picture; export the record as CSV text and upload that.',
    ],
    [
      'twice.csv',
      `${TIMED}0,0,1,5\n0,1,2,5\n`,
      'twice.csv: the comma separates both columns and decimals; export with semicolons between columns.',
    ],
    [
      'groups.csv',
      'time_s;acceleration_g\n0,1;1.234,5\n',
      'groups.csv: "1.234,5" holds more than one point or comma; export numbers without thousands separators.',
    ],
  ])('%s', async (fileName, content, message) => {
    const failure = failureOf(await receive(fileName, content));
    expect(failure).toMatchObject({ message, field: 'file' });
    expect(await em.count(Upload, { fileName })).toBe(0);
  });

  it('a file that is too large, with both sizes', async () => {
    const failure = failureOf(await receive('long.csv', new Uint8Array(UPLOAD_BYTES_MAX + 1)));
    expect(failure.message).toBe(
      'long.csv has 60.0 MB and one file may have 60.0 MB: export a shorter record.'.replaceAll(
        / MB/g,
        '\u00a0MB',
      ),
    );
    expect(await em.count(Upload, { fileName: 'long.csv' })).toBe(0);
  });

  it('the same bytes again, with a link to the first', async () => {
    const first = valueOf(await receive('first.csv', sineCsv({ hz: 16.5, rms: 0.1 })));
    const failure = failureOf(await receive('again.csv', sineCsv({ hz: 16.5, rms: 0.1 })));
    expect(failure).toMatchObject({
      code: 'duplicate',
      message:
        'again.csv is in the register already, as first.csv (waiting): open that one instead.',
      link: `/in-tray/${first.uploadId}`,
    });
  });
});

describe('files that wait with what is wrong with them', () => {
  it.each([
    [
      'text.csv',
      odd(20, 'abc'),
      'row 23, column "acceleration_g": "abc" is not a number; expected one such as 0.25.',
    ],
    [
      'ragged.csv',
      TIMED + rows((i) => (i === 20 ? '0.02' : `${i / 1000},0.${i}`)),
      'row 22: the row has 1 cells and the others 2; export the file again.',
    ],
    [
      'nan.csv',
      odd(7, 'NaN'),
      'row 10, column "acceleration_g": "NaN" is not a sample; record again or export without such rows.',
    ],
    [
      'infinite.csv',
      odd(7, '-inf'),
      'row 10, column "acceleration_g": "-inf" is not a sample; record again or export without such rows.',
    ],
    [
      'huge.csv',
      odd(7, '1e9'),
      'row 10, column "acceleration_g": 1e9 is absurdly large; check the unit and the export.',
    ],
    [
      'hole.csv',
      odd(7, ''),
      'row 10: the row is empty and samples follow; export the file without gaps.',
    ],
    [
      'cell.csv',
      TIMED + rows((i) => (i === 12 ? '0.012,' : `${(i / 1000).toFixed(3)},0.${i}`)),
      'row 14, column "acceleration_g": the cell is empty; every row needs a number here.',
    ],
    [
      'uneven.csv',
      timed((i) => i + (i === 9 ? 0.3 : 0)),
      'row 11, column "time_s": the step from the row before is 0.0013 where 0.001 is usual; export the record at an even sample rate.',
    ],
    [
      'gap.csv',
      timed((i) => (i > 9 ? i + 5 : i)),
      'row 12, column "time_s": the step from the row before is 0.006 where 0.001 is usual: samples are missing; record again.',
    ],
    [
      'back.csv',
      timed((i) => (i === 9 ? 2 : i)),
      'row 11, column "time_s": the time does not rise from the row before; sort or export the file again.',
    ],
  ])('%s', async (fileName, content, sentence) => {
    const { uploadId, problem } = valueOf(await receive(fileName, content));
    expect(problem).toBe(`${fileName}, ${sentence}`);
    const confirmed = await confirmUpload(technician, {
      uploadId,
      pointId: plant.home.pointIds[0],
      takenAt: new Date().toISOString(),
      speedRpm: '',
      layout: content.startsWith(TIMED)
        ? {
            ...ONE_COLUMN_G,
            delimiter: 'comma',
            sampleRateHz: '',
            columns: [
              { role: 'time', unit: 's' },
              { role: 'signal', unit: 'g' },
            ],
          }
        : ONE_COLUMN_G,
    });
    expect(failureOf(confirmed)).toMatchObject({ message: problem, field: 'file' });
    expect(await em.count(MeasuredRecord, { upload: uploadId })).toBe(0);
  });

  it('a record of two samples', async () => {
    const { problem } = valueOf(await receive('two.csv', `${COLUMN}0.1\n0.2\n`));
    expect(problem).toBe(
      'two.csv: the file holds 2 samples and at least 16 are needed; record for longer.',
    );
  });
});

describe('files that ask', () => {
  it('what 1,234 means is asked, and answered it is read so', async () => {
    const text = COLUMN + rows((i) => `${i + 1},234`);
    const { uploadId, questions } = valueOf(await receive('ask.csv', text));
    expect(questions).toEqual([
      'Every number has three digits after its mark, so 1,234 may be 1.234 or 1234: which decimal mark does this file use?',
    ]);
    const input = {
      uploadId,
      pointId: plant.home.pointIds[0],
      takenAt: new Date().toISOString(),
      speedRpm: '',
    };
    const open = { ...ONE_COLUMN_G, decimalMark: '' as const };
    expect(failureOf(await confirmUpload(technician, { ...input, layout: open }))).toMatchObject({
      field: 'layout.decimalMark',
    });
    const answered = { ...ONE_COLUMN_G, decimalMark: 'comma' as const };
    const { recordId } = valueOf(await confirmUpload(technician, { ...input, layout: answered }));
    const { samples } = await em.findOneOrFail(Waveform, { record: recordId });
    expect(Buffer.from(samples).readDoubleLE(0)).toBe(1.234);
  });

  it('in which unit, and how many samples a second', async () => {
    const text = rows((i) => `0.${i}1`);
    const { questions } = valueOf(await receive('silent.csv', text));
    expect(questions).toEqual([
      'In which unit is column 1?',
      'How many samples a second were taken?',
    ]);
  });
});

describe('files that are read as they are meant', () => {
  it('decimal commas with semicolons', async () => {
    const text = `time_s;acceleration_g\n${rows((i) => `0,${String(i).padStart(3, '0')};-0,${i}1`)}`;
    const { questions, problem } = valueOf(await receive('comma.csv', text));
    expect({ questions, problem }).toEqual({ questions: [], problem: null });
  });

  it('UTF-16 with and without its mark', async () => {
    const text = timed((i) => i);
    for (const [name, mark] of [
      ['marked.csv', '\ufeff'],
      ['bare.csv', ''],
    ] as const) {
      const bytes = new Uint8Array(Buffer.from(mark + text, 'utf16le'));
      const { questions, problem } = valueOf(await receive(name, bytes));
      expect({ questions, problem }).toEqual({ questions: [], problem: null });
    }
  });

  it('a file of 30 MB', async () => {
    const lines = [TIMED.trim()];
    for (let i = 0; i < 1_400_000; i++) {
      lines.push(
        `${(i / 10_000).toFixed(4)},${(Math.sin(i / 90) * 0.4 + (i % 7) / 50).toFixed(9)}`,
      );
    }
    const bytes = bytesOf(`${lines.join('\n')}\n`);
    expect(bytes.byteLength).toBeGreaterThan(28_000_000);
    const before = performance.now();
    const { uploadId, problem } = valueOf(await receive('large.csv', bytes));
    const received = performance.now();
    expect(problem).toBeNull();
    const { recordId } = valueOf(
      await confirmUpload(technician, {
        uploadId,
        pointId: plant.home.pointIds[1],
        takenAt: new Date().toISOString(),
        speedRpm: '',
        layout: {
          ...ONE_COLUMN_G,
          delimiter: 'comma',
          sampleRateHz: '',
          columns: [
            { role: 'time', unit: 's' },
            { role: 'signal', unit: 'g' },
          ],
        },
      }),
    );
    const kept = performance.now();
    console.info(
      `30 MB: received in ${Math.round(received - before)} ms, confirmed in ${Math.round(kept - received)} ms`,
    );
    const { sampleCount } = await em.findOneOrFail(
      Waveform,
      { record: recordId },
      { fields: ['sampleCount'] },
    );
    expect(sampleCount).toBe(1_400_000);
  });
});
