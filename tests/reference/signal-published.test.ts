import { describe, expect, it } from 'vitest';
import {
  amplitudeSpectrum,
  averagedSpectrum,
  peakLines,
  powerDensity,
} from '@/lib/domain/signal/amplitude-spectrum';
import { bandRms } from '@/lib/domain/signal/band';
import { bearingFrequencies } from '@/lib/domain/signal/bearing-frequencies';
import { fft, realFft } from '@/lib/domain/signal/fft';
import { mainPeak } from '@/lib/domain/signal/main-peak';
import { orderVectors } from '@/lib/domain/signal/order-vectors';
import { sizeFactor } from '@/lib/domain/signal/quantity';
import {
  displacementPpUm,
  peakFromRms,
  rmsFromPeak,
  velocityRmsFromDisplacementPp,
} from '@/lib/domain/signal/sinusoid';
import { waveformStats } from '@/lib/domain/signal/waveform-stats';
import { coherentGain, enbwBins, windowOf, type WindowKind } from '@/lib/domain/signal/window';
import { STANDARD_GRAVITY_M_S2 } from '@/lib/domain/units';

const made = (n: number, at: (i: number) => number): Float64Array =>
  Float64Array.from({ length: n }, (_, i) => at(i));
const sine = (cycles: number, n: number) => (i: number) => Math.sin((2 * Math.PI * cycles * i) / n);
const decibels = (ratio: number): number => 20 * Math.log10(ratio);

// SG-01: F. J. Harris, Proc. IEEE 66(1), 1978 (from memory) and G. Heinzel et al., 2002 (partly
// read, partly from memory); half-bin loss and the flat-top row computed for N = 1024, periodic.
describe('SG-01 window properties', () => {
  it.each<[WindowKind, number, number, number]>([
    ['rectangular', 1, 1, -3.9224],
    ['hann', 0.5, 1.5, -1.4236],
    ['hamming', 0.54, 1.3628, -1.7514],
    ['blackman', 0.42, 1.7268, -1.0989],
    ['flat-top', 0.21558, 3.7702, -0.0098],
  ])('%s', (kind, gain, enbw, halfBinDb) => {
    const w = windowOf(kind, 1024);
    expect(coherentGain(w)).toBeCloseTo(gain, 5);
    expect(Math.abs(enbwBins(w) - enbw)).toBeLessThanOrEqual(0.00005);
    const { re, im } = fft(
      w.map((v, i) => v * Math.cos((Math.PI * i) / 1024)),
      w.map((v, i) => v * Math.sin((Math.PI * i) / 1024)),
    );
    const atHalfBin = Math.hypot(re[0] ?? 0, im[0] ?? 0) / (1024 * coherentGain(w));
    expect(Math.abs(decibels(atHalfBin) - halfBinDb)).toBeLessThanOrEqual(0.00006);
  });
});

// SG-02: definition; standard gravity exact.
describe('SG-02 one tone in three quantities', () => {
  it.each([
    [15.9155, 98.0665, 980.665, 282.843],
    [25, 62.4311, 397.449, 180.063],
    [50, 31.2155, 99.3621, 90.0316],
    [100, 15.6078, 24.8405, 45.0158],
    [159.155, 9.80665, 9.80665, 28.2843],
    [1000, 1.56078, 0.248405, 4.50158],
  ])('%d Hz', (frequencyHz, velocity, displacement, ppOfTenMmS) => {
    const toVelocity = sizeFactor('acceleration', 'velocity', frequencyHz);
    const toDisplacement = sizeFactor('acceleration', 'displacement', frequencyHz);
    expect((STANDARD_GRAVITY_M_S2 * toVelocity) / velocity).toBeCloseTo(1, 4);
    expect((STANDARD_GRAVITY_M_S2 * toDisplacement) / displacement).toBeCloseTo(1, 4);
    expect(displacementPpUm(10, frequencyHz) / ppOfTenMmS).toBeCloseTo(1, 4);
  });
});

// SG-03: definition.
describe('SG-03 Parseval on four points', () => {
  it('is exact', () => {
    const { re, im } = fft(Float64Array.of(1, 2, 3, 4), new Float64Array(4));
    expect([...re]).toEqual([10, -2, -2, -2]);
    [0, 2, 0, -2].forEach((wanted, k) => expect(im[k]).toBeCloseTo(wanted, 15));
    expect(re.reduce((s, x, k) => s + x * x + (im[k] ?? 0) ** 2, 0) / 4).toBe(30);
  });
});

// SG-04: scipy 1.10.1's own tests, signal/tests/test_spectral.py, TestWelch (read).
describe('SG-04 Welch conventions of scipy.signal', () => {
  const samples = made(16, (i) => (i === 0 || i === 8 ? 1 : 0));
  const spectrum = (blockLength: number) =>
    averagedSpectrum(samples, 1, { window: 'hann', blockLength, overlap: 0.5 });

  it.each([
    [8, [0.08333333, 0.15277778, 0.22222222, 0.22222222, 0.11111111]],
    [9, [0.12477455, 0.23430933, 0.17072113, 0.17072113, 0.17072113]],
  ])('density with blocks of %d', (blockLength, wanted) => {
    const density = powerDensity(spectrum(blockLength));
    wanted.forEach((value, k) => expect(Math.abs((density[k] ?? 0) - value)).toBeLessThan(1e-7));
  });

  it('line power with blocks of 8', () => {
    const wanted = [0.015625, 0.02864583, 0.04166667, 0.04166667, 0.02083333];
    const { rms } = spectrum(8);
    wanted.forEach((value, k) => expect(Math.abs((rms[k] ?? 0) ** 2 - value)).toBeLessThan(1e-7));
  });
});

// SG-05: definition.
describe('SG-05 overall from a Hann spectrum', () => {
  const samples = made(1024, (i) => 3 * sine(50, 1024)(i) + sine(120, 1024)(i));
  const spectrum = amplitudeSpectrum(samples, 1024);

  it('reads both lines and the overall', () => {
    const peaks = peakLines(spectrum);
    expect(peaks[50]).toBeCloseTo(3, 9);
    expect(peaks[49]).toBeCloseTo(1.5, 9);
    expect(peaks[120]).toBeCloseTo(1, 9);
    expect(bandRms(spectrum, { lowHz: 10, highHz: 400 })).toBeCloseTo(2.23606797749979, 9);
  });

  it('loses 1.42 dB half-way between lines, which the main peak gives back', () => {
    const between = amplitudeSpectrum(
      made(1024, (i) => 3 * sine(50.5, 1024)(i)),
      1024,
    );
    const highest = Math.max(...peakLines(between));
    expect(highest / 3).toBeCloseTo(0.8488266673956018, 9);
    const peak = mainPeak(between, { lowHz: 10, highHz: 400 });
    expect(peakFromRms(peak?.rms ?? 0)).toBeCloseTo(3, 2);
    expect(peak?.frequencyHz).toBeCloseTo(50.5, 2);
  });
});

// SG-06: textbook definitions; biased Pearson kurtosis.
describe('SG-06 kurtosis and crest factor', () => {
  it.each<[string, Float64Array, number, number]>([
    ['sine', made(1000, sine(10, 1000)), 1.5, Math.SQRT2],
    ['square', made(1000, (i) => (i % 2 === 0 ? 1 : -1)), 1, 1],
    ['triangle', made(100_000, (i) => Math.abs(((i / 1000) % 2) - 1) - 0.5), 1.8, Math.sqrt(3)],
    ['one spike in 100', made(100, (i) => (i === 40 ? 1 : 0)), 98.0101, 9.9499],
  ])('%s', (_, samples, kurtosis, crest) => {
    const stats = waveformStats(samples);
    expect(stats.kurtosis).toBeCloseTo(kurtosis, 3);
    expect(stats.crest).toBeCloseTo(crest, 3);
  });
});

// SG-07: definition.
describe('SG-07 sizes of a sine', () => {
  it('converts between peak and rms', () => {
    expect(rmsFromPeak(1)).toBeCloseTo(0.7071067811865476, 15);
    expect(peakFromRms(rmsFromPeak(1))).toBeCloseTo(1, 15);
    const stats = waveformStats(made(1000, sine(5, 1000)));
    expect(stats.rms).toBeCloseTo(Math.SQRT1_2, 12);
    expect(stats.peakToPeak).toBeCloseTo(2, 12);
  });
});

// SG-08: convention of API 670 and ISO 13373 (computed).
describe('SG-08 1x size and lag from a pulse per turn', () => {
  it('is 5 peak at 40 degrees lag', () => {
    const samples = made(
      2560,
      (i) => 5 * Math.cos((2 * Math.PI * 25 * i) / 2560 - (40 * Math.PI) / 180),
    );
    const edgesS = made(26, (i) => i * 0.04);
    const [first] = orderVectors({ samples, sampleRateHz: 2560, edgesS });
    expect(peakFromRms(first?.rms ?? 0)).toBeCloseTo(5, 9);
    expect(first?.lagDeg).toBeCloseTo(40, 9);
    const { re, im } = realFft(samples);
    expect(Math.atan2(-(im[25] ?? 0), re[25] ?? 0)).toBeCloseTo((40 * Math.PI) / 180, 9);
  });
});

const MM_PER_INCH = 25.4;

// RB-01: Case Western Reserve University Bearing Data Center table, IMS and XJTU-SY papers (from
// memory); MFPT values read inside its data files. A published roller value is twice our BSF.
describe('RB-01 kinematic frequencies', () => {
  it.each([
    ['6205', 9, 0.3126, 1.537, 0, 1, { ftf: 0.39828, bpfo: 3.5848, bpfi: 5.4152 }, 1e-4],
    ['6203', 8, 0.2656, 1.122, 0, 1, { ftf: 0.3817, bpfo: 3.053, bpfi: 4.9469 }, 2e-4],
    ['ZA-2115', 16, 0.331, 2.815, 15.17, 2000 / 60, { ftf: 14.8, bpfo: 236.4, bpfi: 296.9 }, 0.1],
    ['MFPT', 8, 0.235, 1.245, 0, 25, { ftf: 10.140562, bpfo: 81.125, bpfi: 118.875 }, 1e-3],
    [
      'UER204',
      8,
      7.92 / MM_PER_INCH,
      34.55 / MM_PER_INCH,
      0,
      35,
      { ftf: 13.49, bpfo: 107.91, bpfi: 172.09 },
      0.01,
    ],
  ] as const)('%s', (_, rollers, d, pitch, contactDeg, shaftHz, wanted, tolerance) => {
    const found = bearingFrequencies(
      {
        rollers,
        rollerDiameterMm: d * MM_PER_INCH,
        pitchDiameterMm: pitch * MM_PER_INCH,
        contactDeg,
      },
      shaftHz,
    );
    expect(Math.abs(found.ftfHz - wanted.ftf)).toBeLessThanOrEqual(tolerance);
    expect(Math.abs(found.bpfoHz - wanted.bpfo)).toBeLessThanOrEqual(tolerance);
    expect(Math.abs(found.bpfiHz - wanted.bpfi)).toBeLessThanOrEqual(tolerance);
    expect(found.bpfoHz + found.bpfiHz).toBeCloseTo(rollers * shaftHz, 9);
  });

  it('the published roller value of the 6205 is twice its BSF', () => {
    const geometry = {
      rollers: 9,
      rollerDiameterMm: 0.3126,
      pitchDiameterMm: 1.537,
      contactDeg: 0,
    };
    expect(Math.abs(2 * bearingFrequencies(geometry, 1).bsfHz - 4.7135)).toBeLessThanOrEqual(1e-4);
  });
});

// RB-02: handbook rule (from memory).
describe('RB-02 rule of thumb without geometry', () => {
  it('lies within 5 % of the kinematic values of the 6205', () => {
    const geometry = {
      rollers: 9,
      rollerDiameterMm: 0.3126,
      pitchDiameterMm: 1.537,
      contactDeg: 0,
    };
    const { bpfoHz, bpfiHz } = bearingFrequencies(geometry, 1);
    expect(Math.abs((0.4 * 9) / bpfoHz - 1)).toBeLessThan(0.05);
    expect(Math.abs((0.6 * 9) / bpfiHz - 1)).toBeLessThan(0.05);
  });
});

// Unit checks of the invented scenarios.
describe('unit checks', () => {
  it('converts sizes of one tone', () => {
    expect(Math.abs(displacementPpUm(4.5, 1480 / 60) - 82.12)).toBeLessThanOrEqual(0.1);
    const fromPp = velocityRmsFromDisplacementPp(50, 2970 / 60);
    expect(Math.abs(fromPp - 5.498)).toBeLessThanOrEqual(0.002);
    const fromG = 0.08 * STANDARD_GRAVITY_M_S2 * sizeFactor('acceleration', 'velocity', 24.6667);
    expect(Math.abs(fromG - 5.062)).toBeLessThanOrEqual(0.005);
    expect(Math.abs(rmsFromPeak(0.3 * MM_PER_INCH) - 5.388)).toBeLessThanOrEqual(0.002);
  });

  it('reads 0.7071 rms from the Hann lines of a tone of 1 peak', () => {
    const spectrum = amplitudeSpectrum(made(1000, sine(100, 1000)), 1000);
    const rms = bandRms(spectrum, { lowHz: 10, highHz: 400 });
    expect(Math.abs(rms - 0.7071)).toBeLessThanOrEqual(0.0005);
  });

  it('gives the bearing frequencies of 9 balls, 22.2/103 mm at 24.6667 Hz', () => {
    const found = bearingFrequencies(
      { rollers: 9, rollerDiameterMm: 22.2, pitchDiameterMm: 103, contactDeg: 0 },
      24.6667,
    );
    const wanted = { ftfHz: 9.68, bpfoHz: 87.08, bpfiHz: 134.92, bsfHz: 54.56 };
    expect(Math.abs(found.ftfHz - wanted.ftfHz)).toBeLessThanOrEqual(0.02);
    expect(Math.abs(found.bpfoHz - wanted.bpfoHz)).toBeLessThanOrEqual(0.02);
    expect(Math.abs(found.bpfiHz - wanted.bpfiHz)).toBeLessThanOrEqual(0.02);
    expect(Math.abs(found.bsfHz - wanted.bsfHz)).toBeLessThanOrEqual(0.02);
  });
});
