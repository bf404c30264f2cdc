import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { ColumnLayout } from '@/lib/domain/intake/column-layout';
import type { IntakeFailure } from '@/lib/domain/intake/intake-failure';
import { proposeColumnLayout } from '@/lib/domain/intake/propose-column-layout';
import { readWaveformCsv, type WaveformRead } from '@/lib/domain/intake/read-waveform-csv';
import { scaled, signalScale } from '@/lib/domain/intake/signal-scale';
import type { Result } from '@/lib/domain/result';

const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);
const rows = (n: number, row: (i: number) => string): string =>
  Array.from({ length: n }, (_, i) => row(i)).join('\n');
const sample = (i: number): string => Math.sin(i).toFixed(4);

function read(
  text: string | Uint8Array,
  change: Partial<ColumnLayout> = {},
): Result<WaveformRead, IntakeFailure> {
  const bytes = typeof text === 'string' ? bytesOf(text) : text;
  const proposal = proposeColumnLayout(bytes, 'pump.csv');
  if (!proposal.ok) return proposal;
  return readWaveformCsv(bytes, { ...proposal.value.layout, ...change }, 'pump.csv');
}

function record(text: string | Uint8Array, change: Partial<ColumnLayout> = {}): WaveformRead {
  const result = read(text, change);
  if (!result.ok) throw new Error(result.failure.message);
  return result.value;
}

function failure(text: string, change: Partial<ColumnLayout> = {}): IntakeFailure | null {
  const result = read(text, change);
  return result.ok ? null : result.failure;
}

const timed = (times: (i: number) => string, n = 100): string =>
  `time_s,acceleration_m_s2\n${rows(n, (i) => `${times(i)},${sample(i)}`)}\n`;

describe('a waveform file', () => {
  it('keeps the samples as they came and says how to scale them', () => {
    const { samples, unit, quantity, scale, n, speedRpm, rateSource } = record(
      `# sample_rate_hz=1000\n# speed_r_min=1480\nvelocity_in_s\n${rows(50, sample)}\n`,
    );
    expect([...samples]).toEqual(Array.from({ length: 50 }, (_, i) => Number(sample(i))));
    expect({ unit, quantity, scale, n, speedRpm, rateSource }).toEqual({
      unit: 'in/s',
      quantity: 'velocity',
      scale: 25.4,
      n: 50,
      speedRpm: 1480,
      rateSource: 'stated',
    });
    expect([...scaled(Float64Array.of(1, 2), scale)]).toEqual([25.4, 50.8]);
  });

  it('is the same record in every encoding, delimiter and decimal mark', () => {
    const values = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), {
      minLength: 16,
      maxLength: 60,
    });
    fc.assert(
      fc.property(values, (list) => {
        const print = (x: number, mark: string): string => x.toFixed(7).replace('.', mark);
        const table = (delimiter: string, mark: string): string =>
          `time_s${delimiter}velocity_mm_s\n${list
            .map((x, i) => print(i / 1000, mark) + delimiter + print(x, mark))
            .join('\n')}\n`;
        const plain = record(table(',', '.'));
        const wide = Array.from(table(';', ',')).flatMap((c) => [c.charCodeAt(0), 0]);
        const quoted = table(',', '.').replaceAll(/^(\d[^,]*),(.*)$/gm, '"$1","$2"');
        expect(plain.sampleRateHz).toBe(1000);
        expect(record(table(';', ','))).toEqual(plain);
        expect(record(table('\t', ',').replaceAll('\n', '\r\n'))).toEqual(plain);
        expect(record(Uint8Array.from(wide))).toEqual(plain);
        expect(record(quoted)).toEqual(plain);
        expect(record(table(',', '.').replaceAll('\n', '\r'))).toEqual(plain);
      }),
      { numRuns: 40 },
    );
  });

  it('takes the tacho column along', () => {
    const text = `time_s,acceleration_g,tacho\n${rows(40, (i) => `${i / 100},${sample(i)},${i % 4 === 0 ? 1 : 0}`)}`;
    expect([...(record(text).tacho ?? [])].slice(0, 5)).toEqual([1, 0, 0, 0, 1]);
  });

  it.each([
    ['six decimals at 12.8 kHz', (i: number) => (i / 12_800).toFixed(6), 12_800],
    ['six digits at 10.24 kHz', (i: number) => (i / 10_240).toPrecision(6), 10_240],
    ['all digits', (i: number) => String(i / 5120), 5120],
    ['an epoch', (i: number) => (1_700_000_000 + i / 100).toFixed(2), 100],
    ['a rate that is not whole', (i: number) => (i / 1000.25).toFixed(9), 1000.25],
  ])('reads the rate from a time column printed with %s', (_, times, rateHz) => {
    expect(record(timed(times, 4000)).sampleRateHz).toBeCloseTo(rateHz, 4);
  });

  it('reads a time column in milliseconds', () => {
    const text = `time_ms,acceleration_m_s2\n${rows(50, (i) => `${i / 2},${sample(i)}`)}`;
    expect(record(text)).toMatchObject({ sampleRateHz: 2000, rateSource: 'time column' });
  });

  it('doubts a stated rate more than 0.1 % from the time column', () => {
    const times = (i: number): string => (i / 1000).toFixed(6);
    expect(record(timed(times), { sampleRateHz: 1000.5 }).doubts).toEqual([]);
    const { doubts, sampleRateHz } = record(`# sample_rate_hz=1002\n${timed(times)}`);
    expect(doubts).toMatchObject([{ code: 'RATE_DISAGREES' }]);
    expect(sampleRateHz).toBe(1000);
    const confirmed = record(`# sample_rate_hz=1000\nacceleration_g\n${rows(50, sample)}`, {
      sampleRateHz: 2000,
    });
    expect(confirmed).toMatchObject({ sampleRateHz: 2000, doubts: [{ code: 'RATE_DISAGREES' }] });
  });
});

describe('a waveform file that cannot be read', () => {
  const even = (i: number): string => (i / 1000).toFixed(6);

  it.each<[string, string, number | undefined]>([
    ['TOO_FEW_ROWS', timed(even, 2), undefined],
    ['NOT_A_NUMBER', timed(even).replace('0.050000,-0.2624', '0.050000,none'), 52],
    ['NOT_A_NUMBER', timed(even).replace('0.000000,', 'start,'), 2],
    ['EMPTY_CELL', timed(even).replace('0.050000,-0.2624', '0.050000,'), 52],
    ['NOT_FINITE', timed(even).replace('0.050000,-0.2624', '0.050000,NaN'), 52],
    ['ABSURD_VALUE', timed(even).replace('0.050000,-0.2624', '0.050000,1000000000'), 52],
    ['RAGGED_ROW', timed(even).replace('0.050000,-0.2624', '0.050000'), 52],
    ['EMPTY_ROW', timed(even).replace('0.050000,-0.2624', ''), 52],
    ['TIME_GAP', timed((i) => even(i < 60 ? i : i + 4)), 62],
    ['TIME_UNEVEN', timed((i) => even(i === 60 ? 60.2 : i)), 62],
    ['TIME_NOT_RISING', timed((i) => even(i < 60 ? i : i - 10)), 62],
    ['TIME_NOT_RISING', timed(() => '0'), 3],
  ])('%s names its row', (code, text, row) => {
    const found = failure(text);
    expect(found?.code).toBe(code);
    expect(found?.row).toBe(row);
    expect(found?.message).toMatch(/^pump\.csv/);
  });

  it('says what the cell held and what was expected', () => {
    const text = timed(even).replace('0.050000,-0.2624', '0.050000,abc');
    expect(failure(text)?.message).toBe(
      'pump.csv, row 52, column "acceleration_m_s2": "abc" is not a number; expected one such as 0.25.',
    );
  });

  it('waits for what a person must decide', () => {
    const untold = `acceleration_g\n${rows(50, sample)}`;
    expect(failure(untold)?.code).toBe('RATE_UNKNOWN');
    expect(failure(timed(even), { decimalMark: null })?.code).toBe('LAYOUT_UNDECIDED');
    expect(failure(timed(even), { columns: [] })?.code).toBe('LAYOUT_UNDECIDED');
  });

  it('is refused again when it is not text, whatever the layout says', () => {
    const layout = proposeColumnLayout(bytesOf(timed(even)), 'a.csv');
    const png = Uint8Array.of(0x89, 0x50, 0x4e, 0x47);
    expect(layout.ok && readWaveformCsv(png, layout.value.layout, 'a.csv')).toMatchObject({
      failure: { code: 'NOT_TEXT' },
    });
  });
});

describe('scales', () => {
  it('turn every unit into its kept one', () => {
    expect(signalScale('g')).toEqual({
      quantity: 'acceleration',
      scale: 9.80665,
      keptUnit: 'm/s2',
    });
    expect(signalScale('mil')).toEqual({ quantity: 'displacement', scale: 25.4, keptUnit: 'um' });
    expect(signalScale('mm/s').scale).toBe(1);
  });
});
