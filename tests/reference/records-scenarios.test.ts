import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { proposeColumnLayout } from '@/lib/domain/intake/propose-column-layout';
import { readWaveformCsv, type WaveformRead } from '@/lib/domain/intake/read-waveform-csv';
import { scaled } from '@/lib/domain/intake/signal-scale';
import { amplitudeSpectrum } from '@/lib/domain/signal/amplitude-spectrum';
import { analyseWaveform, type WaveformAnalysis } from '@/lib/domain/signal/analyse-waveform';
import { bearingFrequencies } from '@/lib/domain/signal/bearing-frequencies';
import { checkWaveform } from '@/lib/domain/signal/check-waveform';
import { envelopeSpectrum, lineOverFloor } from '@/lib/domain/signal/envelope';
import { mainPeak } from '@/lib/domain/signal/main-peak';
import { lagAs } from '@/lib/domain/signal/quantity';
import { thirdOctaveDistanceDb } from '@/lib/domain/signal/third-octave';
import type { WaveformInput } from '@/lib/domain/signal/waveform-input';

// Scenarios S12, S15 and S17: invented records with expected values computed independently of this
// project (tests/reference/data).
const BAND = { lowHz: 10, highHz: 1000 };

function read(name: string): WaveformRead {
  const bytes = readFileSync(new URL(`./data/${name}`, import.meta.url));
  const proposal = proposeColumnLayout(bytes, name);
  if (!proposal.ok) throw new Error(proposal.failure.message);
  expect(proposal.value.questions).toEqual([]);
  const record = readWaveformCsv(bytes, proposal.value.layout, name);
  if (!record.ok) throw new Error(record.failure.message);
  expect(record.value.doubts).toEqual([]);
  return record.value;
}

function inputOf(record: WaveformRead, speedRpm?: number): WaveformInput {
  const { samples, scale, sampleRateHz, quantity, tacho } = record;
  return {
    samples: scaled(samples, scale),
    sampleRateHz,
    quantity,
    band: BAND,
    ...(tacho === null ? {} : { tacho: { samples: tacho } }),
    ...(speedRpm === undefined ? {} : { speedRpm }),
  };
}

function analysed(input: WaveformInput): WaveformAnalysis {
  const analysis = analyseWaveform(input);
  if (!analysis.ok) throw new Error(analysis.failure.message);
  return analysis.value;
}

describe('S12 a bearing defect, not unbalance', () => {
  const record = read('S12_PB3_DE_H.csv');
  const input = inputOf(record, 1482);
  const analysis = analysed(input);

  it('is read as 16384 samples of acceleration at 12800 Hz', () => {
    expect(record).toMatchObject({ n: 16_384, sampleRateHz: 12_800, quantity: 'acceleration' });
  });

  it('has the expected velocity, 1x and time statistics, and no doubts', () => {
    expect(Math.abs(analysis.overallVelocityRmsMmS - 3.06)).toBeLessThanOrEqual(0.03);
    expect(Math.abs((analysis.oneX?.amplitudeRmsMmS ?? 0) - 0.92)).toBeLessThanOrEqual(0.03);
    expect(Math.abs((analysis.oneXShare ?? 0) - 0.091)).toBeLessThanOrEqual(0.006);
    expect(analysis.oneX?.lagDeg).toBeNull();
    expect(Math.abs(analysis.stats.rms / 4.6 - 1)).toBeLessThanOrEqual(0.03);
    expect(Math.abs((analysis.stats.kurtosis ?? 0) / 9.3 - 1)).toBeLessThanOrEqual(0.03);
    expect(Math.abs((analysis.stats.crest ?? 0) / 6.5 - 1)).toBeLessThanOrEqual(0.03);
    expect(checkWaveform(input, analysis, { speedMinRpm: 1482, speedMaxRpm: 1482 })).toEqual([]);
  });

  it('shows the outer race in the envelope and no 1x', () => {
    const { bpfoHz } = bearingFrequencies(
      { rollers: 9, rollerDiameterMm: 22.2, pitchDiameterMm: 103, contactDeg: 0 },
      1482 / 60,
    );
    const spectrum = envelopeSpectrum(input.samples, input.sampleRateHz, {
      lowHz: 2000,
      highHz: 5000,
    });
    const outer = lineOverFloor(spectrum, bpfoHz);
    expect(Math.abs(bpfoHz - 87.19)).toBeLessThanOrEqual(0.02);
    expect(outer?.frequencyHz).toBe(87.5);
    expect(Math.abs((outer?.overFloor ?? 0) / 69.8 - 1)).toBeLessThanOrEqual(0.03);
    const second = lineOverFloor(spectrum, 2 * bpfoHz)?.overFloor ?? 0;
    expect(Math.abs(second / 60.6 - 1)).toBeLessThanOrEqual(0.03);
    expect(lineOverFloor(spectrum, 1482 / 60)?.overFloor).toBeLessThan(1.3);
  });
});

describe('S15 a record uploaded to the wrong point', () => {
  const names = ['declared_last', 'neighbour_last', 'upload'] as const;
  const [declared, neighbour, upload] = names.map((name) => inputOf(read(`S15_${name}.csv`)));

  it.each([
    [declared, 1.42],
    [neighbour, 2.29],
    [upload, 2.45],
  ])('has the expected overall velocity (%#)', (input, wanted) => {
    const overall = analysed(input!).overallVelocityRmsMmS;
    expect(Math.abs(overall - wanted)).toBeLessThanOrEqual(0.03);
  });

  it('is 9.9 dB from the declared point and 1.7 dB from its neighbour', () => {
    const spectrumOf = (input: WaveformInput | undefined) =>
      amplitudeSpectrum(input!.samples, input!.sampleRateHz);
    const toDeclared = thirdOctaveDistanceDb(spectrumOf(upload), spectrumOf(declared));
    const toNeighbour = thirdOctaveDistanceDb(spectrumOf(upload), spectrumOf(neighbour));
    expect(Math.abs((toDeclared ?? 0) - 9.9)).toBeLessThanOrEqual(0.5);
    expect(Math.abs((toNeighbour ?? 0) - 1.7)).toBeLessThanOrEqual(0.5);
  });

  it('is held, because its main peak lies outside the declared speed range', () => {
    const analysis = analysed(upload!);
    const velocity = {
      ...amplitudeSpectrum(upload!.samples, upload!.sampleRateHz),
      rms: analysis.spectrum.velocityRmsMmS,
    };
    const peak = mainPeak(velocity, BAND);
    expect(Math.abs((peak?.frequencyHz ?? 0) - 49.38)).toBeLessThanOrEqual(0.7);
    const atDeclared = checkWaveform(upload!, analysis, { speedMinRpm: 1465, speedMaxRpm: 1495 });
    expect(atDeclared.map(({ code }) => code)).toEqual(['SPEED_OUTSIDE_RANGE']);
    const atNeighbour = { speedMinRpm: 2950, speedMaxRpm: 2990 };
    expect(checkWaveform(upload!, analysis, atNeighbour)).toEqual([]);
  });
});

describe('S17 1x size and lag from a waveform with a tacho column', () => {
  const record = read('S17_EF101_B_H_tacho.csv');
  const input = inputOf(record);
  const analysis = analysed(input);

  it('is read as 20480 samples at 10240 Hz with a tacho', () => {
    expect(record).toMatchObject({ n: 20_480, sampleRateHz: 10_240 });
    expect(record.tacho).toHaveLength(20_480);
  });

  it('has 48 turns at 1480 r/min', () => {
    expect(analysis.turns).toBe(48);
    expect(Math.abs((analysis.speedRpm ?? 0) - 1480)).toBeLessThanOrEqual(1);
    expect(analysis.speedSpreadPct).toBeCloseTo(0.48, 1);
    expect(analysis.speedSource).toBe('tacho');
  });

  it('has 3.22 mm/s rms at 217.8 degrees lag', () => {
    const lag = analysis.oneX?.lagDeg ?? NaN;
    expect(Math.abs((analysis.oneX?.amplitudeRmsMmS ?? 0) - 3.221)).toBeLessThanOrEqual(0.05);
    expect(Math.abs(lag - 217.8)).toBeLessThanOrEqual(2);
    expect(Math.abs(lagAs(lag, 'velocity', 'acceleration') - 127.8)).toBeLessThanOrEqual(2);
    expect(Math.abs(analysis.overallVelocityRmsMmS - 3.4)).toBeLessThanOrEqual(0.05);
    expect(checkWaveform(input, analysis, { speedMinRpm: 1480, speedMaxRpm: 1480 })).toEqual([]);
  });

  it('is held when an edge is missing or doubled more than once', () => {
    const broken = record.tacho!.slice();
    broken.fill(0, 3000, 3500).fill(0, 9000, 9500);
    const doubtful = { ...input, tacho: { samples: broken } };
    const codes = checkWaveform(doubtful, analysed(doubtful)).map(({ code }) => code);
    expect(codes).toEqual(['TACHO_UNUSABLE']);
  });
});
