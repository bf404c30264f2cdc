import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { proposeColumnLayout } from '@/lib/domain/intake/propose-column-layout';
import { readWaveformCsv } from '@/lib/domain/intake/read-waveform-csv';
import { scaled } from '@/lib/domain/intake/signal-scale';
import { analyseWaveform } from '@/lib/domain/signal/analyse-waveform';
import { bearingFrequencies } from '@/lib/domain/signal/bearing-frequencies';
import { checkWaveform } from '@/lib/domain/signal/check-waveform';
import { envelopeSpectrum, lineOverFloor } from '@/lib/domain/signal/envelope';

// Measured records of the Case Western Reserve University Bearing Data Center. They state no
// licence, so they are read from the folder EVENRUN_RECORDS names and never copied here. Expected
// features: computed from the whole records with independent arithmetic (RB-03, RB-04); the files
// hold the first 120 000 samples, hence the tolerances of a few percent.
const folder = process.env.EVENRUN_RECORDS ?? '';
const present = folder !== '' && existsSync(join(folder, 'normal_de_48k.csv'));
if (!present) {
  console.info('Skipped: EVENRUN_RECORDS does not name a folder with the measured records.');
}

function loadRecord(name: string) {
  const bytes = readFileSync(join(folder, name));
  const proposal = proposeColumnLayout(bytes, name);
  if (!proposal.ok) throw new Error(proposal.failure.message);
  const record = readWaveformCsv(bytes, proposal.value.layout, name);
  if (!record.ok) throw new Error(record.failure.message);
  const { samples, scale, sampleRateHz, speedRpm, quantity } = record.value;
  const input = {
    samples: scaled(samples, scale),
    sampleRateHz,
    quantity,
    speedRpm: speedRpm ?? undefined,
    band: { lowHz: 10, highHz: 1000 },
  };
  const analysis = analyseWaveform(input);
  if (!analysis.ok) throw new Error(analysis.failure.message);
  return { record: record.value, input, analysis: analysis.value };
}

describe.skipIf(!present)('measured records', () => {
  it.each([
    ['normal_de_48k.csv', 48_000, 1796, 2.764, 4.116, 0.0726871, 0.147416],
    ['inner_race_de_12k.csv', 12_000, 1797, 5.396, 5.925, 0.291216, 0.226115],
    ['outer_race_de_12k.csv', 12_000, 1796, 7.649, 5.391, 0.669104, 0.187196],
  ])('%s is read and has its known features', (name, rate, speed, kurtosis, crest, rms, v) => {
    const { record, input, analysis } = loadRecord(name);
    expect(record).toMatchObject({ n: 120_000, sampleRateHz: rate, speedRpm: speed, unit: 'g' });
    expect(Math.abs((analysis.stats.kurtosis ?? 0) / kurtosis - 1)).toBeLessThan(0.05);
    expect(Math.abs((analysis.stats.crest ?? 0) / crest - 1)).toBeLessThan(0.08);
    expect(Math.abs(analysis.stats.rms / record.scale / rms - 1)).toBeLessThan(0.05);
    expect(Math.abs(analysis.overallVelocityRmsMmS / v - 1)).toBeLessThan(0.05);
    expect(Math.abs((analysis.speedRpm ?? 0) / speed - 1)).toBeLessThan(0.02);
    const machine = { speedMinRpm: 1750, speedMaxRpm: 1800 };
    expect(checkWaveform(input, analysis, machine)).toEqual([]);
  });

  it.each([
    ['inner_race_de_12k.csv', 'bpfiHz', 1797],
    ['outer_race_de_12k.csv', 'bpfoHz', 1796],
  ] as const)('%s shows its fault in the envelope', (name, race, speedRpm) => {
    const { input } = loadRecord(name);
    const geometry = {
      rollers: 9,
      rollerDiameterMm: 0.3126,
      pitchDiameterMm: 1.537,
      contactDeg: 0,
    };
    const calculated = bearingFrequencies(geometry, speedRpm / 60)[race];
    const band = { lowHz: 2500, highHz: 4500 };
    const spectrum = envelopeSpectrum(input.samples, input.sampleRateHz, band);
    const line = lineOverFloor(spectrum, calculated, 0.02);
    expect(Math.abs((line?.frequencyHz ?? 0) / calculated - 1)).toBeLessThan(0.02);
    expect(line?.overFloor).toBeGreaterThan(100);
  });
});
