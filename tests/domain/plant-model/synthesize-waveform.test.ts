import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { angleDeg, fromPolar, size, subtract, type Complex } from '@/lib/domain/complex';
import { randomSource } from '@/lib/domain/plant-model/random-source';
import {
  synthesizeWaveform,
  type MadeWaveform,
  type WaveformPlan,
} from '@/lib/domain/plant-model/synthesize-waveform';
import { overallFrom, vibrationAt } from '@/lib/domain/plant-model/vibration-at';
import { analyseWaveform } from '@/lib/domain/signal/analyse-waveform';
import { lagDeg } from '@/lib/domain/units';
import { fanWith } from './demo-machine';

const order = (number: number, rmsMmS: number, deg: number) => ({
  order: number,
  rmsMmS,
  lagDeg: lagDeg(deg),
});
// 1500 r/min at 5120 Hz: 5120 samples are 25 whole turns.
const plan: WaveformPlan = {
  vibration: {
    orders: [order(1, 3, 40), order(2, 0.8, 310)],
    broadBandRmsMmS: 0,
    knocks: null,
  },
  speedRpm: 1500,
  sampleRateHz: 5120,
  sampleCount: 5120,
  firstMarkS: 0.0125,
  noiseRmsMS2: 0,
};

// Velocity of one order by a plain Fourier sum over whole turns, divided by jkΩ: rms, angle as lag.
function velocityOfOrder(made: MadeWaveform, given: WaveformPlan, k: number): Complex {
  const omega = (2 * Math.PI * given.speedRpm) / 60;
  let [re, im] = [0, 0];
  made.samplesMS2.forEach((value, i) => {
    const turn = omega * k * (i / given.sampleRateHz - given.firstMarkS);
    re += value * Math.cos(turn);
    im += value * Math.sin(turn);
  });
  const toVelocity = (Math.SQRT2 * 1000) / (given.sampleCount * omega * k);
  // a = −√2·A·kΩ·sin(θ − φ): cosine sum ∝ sin φ, sine sum ∝ −cos φ.
  return { re: -im * toVelocity, im: re * toVelocity };
}

describe('synthesizeWaveform', () => {
  it('holds the velocity vectors put in', () => {
    const size1 = fc.double({ min: 0.1, max: 20, noNaN: true });
    const deg = fc.double({ min: 0, max: 360, noNaN: true });
    fc.assert(
      fc.property(size1, deg, size1, deg, (a, p, b, q) => {
        const given = {
          ...plan,
          vibration: { ...plan.vibration, orders: [order(1, a, p), order(2, b, q)] },
        };
        const made = synthesizeWaveform(given, randomSource(1));
        const miss = (k: number, vector: Complex) =>
          size(subtract(velocityOfOrder(made, given, k), vector));
        expect(miss(1, fromPolar(a, p))).toBeLessThan(1e-9);
        expect(miss(2, fromPolar(b, q))).toBeLessThan(1e-9);
      }),
      { numRuns: 20 },
    );
  });

  it('raises the tacho as the mark arrives', () => {
    const { tacho } = synthesizeWaveform(plan, randomSource(1));
    const rises = [...tacho.keys()].filter((i) => i > 0 && tacho[i] === 1 && tacho[i - 1] === 0);
    expect(rises).toHaveLength(25);
    expect(rises[0]).toBe(64);
    expect(new Set(tacho)).toEqual(new Set([0, 1]));
  });

  it('gives the same record for the same seed, another for another', () => {
    const noisy = { ...plan, noiseRmsMS2: 0.2 };
    const samples = (seed: number) => synthesizeWaveform(noisy, randomSource(seed)).samplesMS2;
    expect(samples(4)).toEqual(samples(4));
    expect(samples(5)).not.toEqual(samples(4));
  });

  it.each([985, 1485, 2970])('is read back by the analysis at %d r/min', (speedRpm) => {
    const vibration = { ...plan.vibration, broadBandRmsMmS: 0.8 };
    const given = {
      ...plan,
      vibration,
      speedRpm,
      sampleRateHz: 6400,
      sampleCount: 12_800,
      noiseRmsMS2: 0.05,
    };
    const made = synthesizeWaveform(given, randomSource(speedRpm));
    const analysed = analyseWaveform({
      samples: made.samplesMS2,
      sampleRateHz: given.sampleRateHz,
      quantity: 'acceleration',
      tacho: { samples: made.tacho },
      band: { lowHz: 10, highHz: 1000 },
    });
    if (!analysed.ok) throw new Error(analysed.failure.message);
    const { oneX, overallVelocityRmsMmS } = analysed.value;
    // A 0/1 tacho knows the mark to half a sample: 1.4° at 2970 r/min and 6400 Hz.
    const put = fromPolar(3, 40);
    const got = fromPolar(oneX?.amplitudeRmsMmS ?? 0, oneX?.lagDeg ?? 0);
    expect(oneX?.amplitudeRmsMmS).toBeCloseTo(3, 1);
    expect(size(subtract(got, put))).toBeLessThan(0.08);
    const whole = overallFrom({ point: 'A-H', ...vibration });
    expect(Math.abs(overallVelocityRmsMmS / whole - 1)).toBeLessThan(0.03);
    expect(analysed.value.speedRpm).toBeCloseTo(speedRpm, 0);
  });

  it('knocks of a bearing raise the kurtosis and the overall, not the 1x', () => {
    const knocks = { passOrder: 3.53, peakMS2: 30, velocityRmsMmS: 2.8 };
    const given: WaveformPlan = {
      vibration: { orders: [order(1, 0.9, 100)], broadBandRmsMmS: 0.7, knocks },
      speedRpm: 1482,
      sampleRateHz: 12_800,
      sampleCount: 16_384,
      firstMarkS: 0,
      noiseRmsMS2: 0.5,
    };
    const analysisOf = (made: MadeWaveform) => {
      const analysed = analyseWaveform({
        samples: made.samplesMS2,
        sampleRateHz: given.sampleRateHz,
        quantity: 'acceleration',
        tacho: { samples: made.tacho },
        band: { lowHz: 10, highHz: 1000 },
      });
      if (!analysed.ok) throw new Error(analysed.failure.message);
      return analysed.value;
    };
    const worn = analysisOf(synthesizeWaveform(given, randomSource(12)));
    const sound = { ...given, vibration: { ...given.vibration, knocks: null } };
    const healthy = analysisOf(synthesizeWaveform(sound, randomSource(12)));
    expect(worn.stats.kurtosis).toBeGreaterThan(6);
    expect(healthy.stats.kurtosis).toBeLessThan(4);
    const whole = overallFrom({ point: 'B-H', ...given.vibration });
    expect(Math.abs(worn.overallVelocityRmsMmS / whole - 1)).toBeLessThan(0.05);
    expect(worn.oneXShare).toBeLessThan(0.15);
    expect(worn.oneX?.amplitudeRmsMmS).toBeCloseTo(0.9, 1);
  });

  it('makes the records of a modelled machine', () => {
    const [first] = vibrationAt(fanWith([]), { day: 30, speedRpm: 1500 }, []);
    if (first === undefined) throw new Error('The fan has points.');
    const given = { ...plan, vibration: { ...first, broadBandRmsMmS: 0 } };
    const back = velocityOfOrder(synthesizeWaveform(given, randomSource(1)), given, 1);
    expect(size(back)).toBeCloseTo(first.orders[0]?.rmsMmS ?? 0, 9);
    expect(angleDeg(back)).toBeCloseTo(first.orders[0]?.lagDeg ?? 0, 6);
  });
});
