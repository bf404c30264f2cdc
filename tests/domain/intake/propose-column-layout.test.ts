import { describe, expect, it } from 'vitest';
import { layoutForFile } from '@/lib/domain/intake/column-layout';
import { columnMeaning } from '@/lib/domain/intake/column-name';
import {
  proposeColumnLayout,
  type ColumnLayoutProposal,
} from '@/lib/domain/intake/propose-column-layout';

const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);
const rows = (n: number, row: (i: number) => string): string =>
  Array.from({ length: n }, (_, i) => row(i)).join('\n');

function proposed(text: string | Uint8Array): ColumnLayoutProposal {
  const result = proposeColumnLayout(typeof text === 'string' ? bytesOf(text) : text, 'x.csv');
  if (!result.ok) throw new Error(result.failure.message);
  return result.value;
}

function refused(text: string | Uint8Array): { code: string; message: string } {
  const result = proposeColumnLayout(typeof text === 'string' ? bytesOf(text) : text, 'x.csv');
  return result.ok ? { code: 'none', message: '' } : result.failure;
}

const codes = (text: string): string[] => proposed(text).questions.map(({ code }) => code);

describe('proposed layout', () => {
  it('reads the plain layout without a question', () => {
    const { layout, confidence, previewRows } = proposed(
      `time_s,acceleration_m_s2,tacho\n${rows(30, (i) => `${i / 1000},0.5,${i % 2}`)}\n`,
    );
    expect(confidence).toBe('sure');
    expect(layout).toEqual({
      delimiter: ',',
      decimalMark: 'point',
      encoding: 'utf-8',
      headerRow: true,
      sampleRateHz: null,
      speedRpm: null,
      columns: [
        { index: 0, role: 'time', name: 'time_s', quantity: null, unit: 's' },
        {
          index: 1,
          role: 'signal',
          name: 'acceleration_m_s2',
          quantity: 'acceleration',
          unit: 'm/s2',
        },
        { index: 2, role: 'tacho', name: 'tacho', quantity: null, unit: null },
      ],
    });
    expect(previewRows).toHaveLength(20);
    expect(previewRows[0]).toEqual({ row: 2, cells: ['0', '0.5', '0'] });
  });

  it('takes rate and speed from comment lines', () => {
    const { layout, questions } = proposed(
      '# sample_rate_hz=12000\n# speed_r_min=1797\nacceleration_g\n-0.08\n0.25\n0.1\n',
    );
    expect(layout).toMatchObject({ delimiter: null, sampleRateHz: 12_000, speedRpm: 1797 });
    expect(layout.columns).toMatchObject([{ role: 'signal', unit: 'g' }]);
    expect(questions).toEqual([]);
  });

  it('takes rate and speed from lines without a hash, in other units', () => {
    const { layout } = proposed(
      'Sampling frequency: 12.8 kHz\nShaft speed: 24.7 Hz\nx (mm/s)\n-0.08\n0.25\n0.1\n',
    );
    expect(layout.sampleRateHz).toBe(12_800);
    expect(layout.speedRpm).toBeCloseTo(1482, 9);
    expect(layout.columns).toMatchObject([{ name: 'x (mm/s)', quantity: 'velocity' }]);
  });

  it('reads decimal commas with semicolons', () => {
    const { layout, questions } = proposed(
      `Zeit [ms];Beschleunigung [m/s²]\n${rows(9, (i) => `${i},5;-0,${i}1`)}`,
    );
    expect(layout).toMatchObject({ delimiter: ';', decimalMark: 'comma' });
    expect(layout.columns).toMatchObject([{ role: 'time', unit: 'ms' }, { unit: 'm/s2' }]);
    expect(questions).toEqual([]);
  });

  it('reads one column of decimal commas under one name', () => {
    const text = `# sample_rate_hz=1000\nacceleration_g\n${rows(9, (i) => `0,5${i}`)}`;
    expect(proposed(text).layout).toMatchObject({ delimiter: null, decimalMark: 'comma' });
  });

  it('asks rather than guesses where 1,234 reads both ways', () => {
    const grouped = `# sample_rate_hz=1000\nacceleration_g\n${rows(9, (i) => `${i + 1},234`)}`;
    expect(proposed(grouped).layout.decimalMark).toBeNull();
    expect(codes(grouped)).toEqual(['DECIMAL_MARK']);
    const pointed = grouped.replaceAll(',', '.');
    expect(proposed(pointed).layout.decimalMark).toBeNull();
    const settled = `${grouped}\n0,5`;
    expect(proposed(settled).layout.decimalMark).toBe('comma');
  });

  it('asks what a comma does in pairs of whole numbers without a header', () => {
    const text = rows(9, (i) => `${(i * 7) % 5},${i}`);
    expect(proposed(text).layout.decimalMark).toBeNull();
    expect(codes(text)[0]).toBe('COMMA_MEANING');
  });

  it('asks for unit and rate of a column that says nothing', () => {
    expect(codes(rows(9, (i) => `0.${i}1`))).toEqual(['SIGNAL_UNIT', 'SAMPLE_RATE']);
  });

  it('sees time and tacho in unnamed columns by their values', () => {
    const { layout } = proposed(rows(20, (i) => `${i * 0.5},${Math.sin(i)},${i % 2}`));
    expect(layout.columns.map(({ role }) => role)).toEqual(['time', 'signal', 'tacho']);
    expect(layout.headerRow).toBe(false);
  });

  it('reads the first of several signals and says so', () => {
    const text = `time_s,DE_H_mm_s,DE_V_mm_s\n${rows(9, (i) => `${i},0.5,0.7`)}`;
    expect(codes(text)).toEqual(['SEVERAL_SIGNALS']);
    expect(proposed(text).layout.columns.map(({ role }) => role)).toEqual([
      'time',
      'signal',
      'ignore',
    ]);
  });

  it('joins a row of units to the names above it', () => {
    const { layout } = proposed(`Time\tCh1\nms\tmm/s\n${rows(9, (i) => `${i}\t0.5`)}`);
    expect(layout.columns).toMatchObject([
      { role: 'time', unit: 'ms' },
      { role: 'signal', unit: 'mm/s', name: 'Ch1 [mm/s]' },
    ]);
  });

  it('does not count a delimiter at the end of the rows as a missing name', () => {
    const { layout } = proposed(`time_s,velocity_mm_s\n${rows(9, (i) => `${i},0.5,`)}`);
    expect(layout.columns.map(({ role }) => role)).toEqual(['time', 'signal', 'ignore']);
  });

  it('has one shape key for files that differ only in values, rate and comments', () => {
    const one = proposed('# sample_rate_hz=100\nacceleration_g\n0.5\n0.25\n');
    const two = proposed('# speed_r_min=9\n# other\nAcceleration_g\n1.5\n2.25\n3\n');
    const other = proposed('# sample_rate_hz=100\nvelocity_mm_s\n0.5\n0.25\n');
    expect(one.shapeKey).toBe(two.shapeKey);
    expect(one.shapeKey).not.toBe(other.shapeKey);
  });

  it('takes names from a kept layout and facts from the file', () => {
    const kept = { ...proposed('acceleration_g\n0.5\n').layout, sampleRateHz: 500, speedRpm: 900 };
    const silent = proposed('acceleration_g\n0.75\n').layout;
    expect(layoutForFile(kept, silent)).toMatchObject({ sampleRateHz: 500, speedRpm: null });
    const stating = proposed('# sample_rate_hz=100\nacceleration_g\n0.75\n').layout;
    expect(layoutForFile(kept, stating).sampleRateHz).toBe(100);
  });
});

describe('encodings', () => {
  const text = 'time_s;acceleration (m/s²)\n0,5;0,25\n1,5;0,75\n';
  const wide = (little: boolean, mark: boolean): Uint8Array => {
    const units = Array.from((mark ? '\ufeff' : '') + text, (c) => c.charCodeAt(0));
    return Uint8Array.from(units.flatMap((u) => (little ? [u & 255, u >> 8] : [u >> 8, u & 255])));
  };

  it.each([
    ['utf-8', bytesOf(text)],
    ['utf-8', bytesOf(`\ufeff${text}`)],
    ['utf-16le', wide(true, true)],
    ['utf-16be', wide(false, true)],
    ['utf-16le', wide(true, false)],
    ['latin-1', Uint8Array.from(Array.from(text, (c) => c.charCodeAt(0)))],
  ])('%s is found out', (encoding, bytes) => {
    const { layout } = proposed(bytes);
    expect(layout.encoding).toBe(encoding);
    expect(layout.columns[0]?.name).toBe('time_s');
    expect(layout.columns[1]?.unit).toBe('m/s2');
  });
});

describe('files that are refused in words', () => {
  it.each([
    ['EMPTY_FILE', ''],
    ['NO_NUMBERS', 'hello\nworld\n'],
    ['NOT_A_NUMBER', 'time_s,acceleration_g\nabc,def\nghi,jkl\n'],
    ['THOUSANDS_SEPARATORS', 'time_s;acceleration_g\n0,1;1.234,5\n'],
    ['MIXED_DECIMAL_MARKS', 'time_s;acceleration_g\n0,1;1.25\n'],
    ['COMMA_TWICE', 'time_s,acceleration_g\n0,0,1,5\n0,1,2,5\n'],
  ])('%s', (code, text) => {
    expect(refused(text).code).toBe(code);
    expect(refused(text).message).toMatch(/^x\.csv/);
  });

  it('a picture with the name of a table', () => {
    const png = Uint8Array.of(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13);
    expect(refused(png)).toMatchObject({ code: 'NOT_TEXT' });
    expect(refused(png).message).toContain('a PNG picture');
    expect(refused(Uint8Array.of(7, 1, 2, 3, 0, 9)).code).toBe('NOT_TEXT');
  });
});

describe('names of columns', () => {
  it.each([
    ['acceleration_g', 'acceleration', 'g'],
    ['velocity_mm_s', 'velocity', 'mm/s'],
    ['displacement_um', 'displacement', 'um'],
    ['Vibration (in/s)', 'velocity', 'in/s'],
    ['x in µm', 'displacement', 'um'],
    ['shaft [mil]', 'displacement', 'mil'],
    ['a / (m/s^2)', 'acceleration', 'm/s2'],
    ['Acc', 'acceleration', null],
    ['velocity_g', 'velocity', null],
  ])('%s', (name, quantity, unit) => {
    expect(columnMeaning(name)).toEqual({ role: 'signal', quantity, unit });
  });

  it('that say nothing mean nothing', () => {
    expect(columnMeaning('Channel 3')).toBeNull();
  });
});
