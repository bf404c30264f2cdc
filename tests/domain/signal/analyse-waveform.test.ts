import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { analyseWaveform, type WaveformAnalysis } from '@/lib/domain/signal/analyse-waveform';
import { checkWaveform, type MachineSpeeds } from '@/lib/domain/signal/check-waveform';
import { sizeFactor } from '@/lib/domain/signal/quantity';
import type { WaveformInput } from '@/lib/domain/signal/waveform-input';

const BAND = { lowHz: 10, highHz: 1000 };
const RATE = 4096;
const noise = (i: number): number => (((i * 7919) % 1009) / 1009 - 0.5) * 0.2;

function input(change: Partial<WaveformInput> = {}): WaveformInput {
  const samples = Float64Array.from(
    { length: RATE },
    (_, i) => 4 * Math.cos((2 * Math.PI * 25 * i) / RATE - 1) + noise(i),
  );
  return { samples, sampleRateHz: RATE, quantity: 'acceleration', band: BAND, ...change };
}

function analysed(given: WaveformInput): WaveformAnalysis {
  const result = analyseWaveform(given);
  if (!result.ok) throw new Error(result.failure.message);
  return result.value;
}

function doubts(given: WaveformInput, machine?: MachineSpeeds): string[] {
  return checkWaveform(given, analysed(given), machine).map(({ code }) => code);
}

const edgesS = Float64Array.from({ length: 25 }, (_, i) => i / 25);

describe('analysis of a record', () => {
  it('reads 1x with lag as velocity from acceleration and a tacho', () => {
    const { oneX, speedRpm, speedSource, turns, overallVelocityRmsMmS, oneXShare } = analysed(
      input({ tacho: { edgesS } }),
    );
    const rms = (4 / Math.SQRT2) * sizeFactor('acceleration', 'velocity', 25);
    expect([speedRpm, speedSource, turns].map(String)).toEqual(['1500', 'tacho', '24']);
    expect(oneX?.amplitudeRmsMmS).toBeCloseTo(rms, 1);
    expect(oneX?.lagDeg).toBeCloseTo(180 / Math.PI + 90, 0);
    expect(overallVelocityRmsMmS).toBeCloseTo(rms, 1);
    expect(oneXShare).toBeCloseTo(1, 2);
  });

  it('gives size and no lag without a tacho, at the line found near the stated speed', () => {
    const found = analysed(input({ speedRpm: 1508 }));
    expect(found.speedSource).toBe('spectrum');
    expect(found.speedRpm).toBeCloseTo(1500, 0);
    expect(found.oneX?.lagDeg).toBeNull();
    expect(found.settings.statedSpeedRpm).toBe(1508);
  });

  it('stays at the stated speed where no line is clear', () => {
    const { speedRpm, speedSource } = analysed(input({ speedRpm: 4000 }));
    expect([speedRpm, speedSource]).toEqual([4000, 'stated']);
  });

  it('claims no speed where none is known', () => {
    const unknown = analysed(input());
    expect(unknown).toMatchObject({ speedRpm: null, oneX: null, oneXShare: null, turns: null });
  });

  it('does not compare 1x with a band that leaves it out', () => {
    const { oneX, oneXShare } = analysed(
      input({ tacho: { edgesS }, band: { lowHz: 30, highHz: 1000 } }),
    );
    expect(oneX?.amplitudeRmsMmS).toBeGreaterThan(10);
    expect(oneXShare).toBeNull();
  });

  it('gives the same velocity whether the record is acceleration or already velocity', () => {
    const samples = input().samples.map((x) => x - noise(0));
    const factor = sizeFactor('acceleration', 'velocity', 25);
    const asVelocity = analysed(
      input({ samples: samples.map((x) => x * factor), quantity: 'velocity', speedRpm: 1500 }),
    );
    expect(asVelocity.oneX?.amplitudeRmsMmS).toBeCloseTo((4 / Math.SQRT2) * factor, 0);
  });

  it('scales every size with the record and leaves the lag alone', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 100, noNaN: true }), (factor) => {
        const one = analysed(input({ tacho: { edgesS } }));
        const more = analysed(
          input({ tacho: { edgesS }, samples: input().samples.map((x) => x * factor) }),
        );
        expect(more.overallVelocityRmsMmS / one.overallVelocityRmsMmS / factor).toBeCloseTo(1, 9);
        expect(more.oneX?.lagDeg).toBeCloseTo(one.oneX?.lagDeg ?? NaN, 6);
        expect(more.stats.crest).toBeCloseTo(one.stats.crest ?? NaN, 6);
      }),
      { numRuns: 10 },
    );
  });

  it.each([
    ['TOO_SHORT', { samples: Float64Array.of(1, 2) }],
    ['NOT_FINITE', { samples: new Float64Array(100).fill(NaN) }],
    ['RATE_ZERO', { sampleRateHz: 0 }],
    ['SPEED_ZERO', { speedRpm: 0 }],
    ['BAND_EMPTY', { band: { lowHz: 3000, highHz: 4000 } }],
  ])('answers %s in words', (code, change) => {
    const result = analyseWaveform(input(change));
    expect(result).toMatchObject({ ok: false, failure: { code } });
  });
});

describe('doubts about a record', () => {
  it('are none for a sound one', () => {
    const machine = { speedMinRpm: 1450, speedMaxRpm: 1500 };
    expect(doubts(input({ tacho: { edgesS } }), machine)).toEqual([]);
  });

  it('name a flat line', () => {
    expect(doubts(input({ samples: new Float64Array(RATE).fill(2) }))).toEqual(['FLAT_LINE']);
  });

  it('name clipping', () => {
    const cut = input().samples.map((x) => Math.max(-3, Math.min(3, x)));
    expect(doubts(input({ samples: cut }))).toEqual(['CLIPPED']);
  });

  it('name lost samples', () => {
    const lost = input().samples.fill(1, 500, 540);
    expect(doubts(input({ samples: lost }))).toEqual(['DROPPED_SAMPLES']);
  });

  it('name too few turns', () => {
    const short = { samples: input().samples.slice(0, 1000), speedRpm: 1500 };
    expect(doubts(input(short))).toEqual(['FEW_TURNS']);
  });

  it('name a tacho that was repaired or cannot be used', () => {
    const missing = edgesS.filter((_, i) => i !== 5);
    expect(doubts(input({ tacho: { edgesS: missing } }))).toEqual(['TACHO_REPAIRED']);
    const broken = edgesS.filter((_, i) => i !== 5 && i !== 12);
    expect(doubts(input({ tacho: { edgesS: broken } }))).toEqual(['TACHO_UNUSABLE']);
    expect(doubts(input({ tacho: { samples: new Float64Array(RATE) } }))).toEqual([
      'TACHO_UNUSABLE',
    ]);
  });

  it('name a ski slope, but not the sensor noise of a machine that barely moves', () => {
    const drift = (size: number): Float64Array =>
      input().samples.map((x, i) => 0.01 * x + size * Math.cos((2 * Math.PI * 3.2 * i) / RATE));
    expect(doubts(input({ samples: drift(0.5) }))).toEqual(['SKI_SLOPE']);
    expect(doubts(input({ samples: drift(0.008) }))).toEqual([]);
  });

  it('name a speed outside the range, given or read from the main peak', () => {
    const machine = { speedMinRpm: 2950, speedMaxRpm: 2990 };
    expect(doubts(input({ tacho: { edgesS } }), machine)).toEqual(['SPEED_OUTSIDE_RANGE']);
    expect(doubts(input(), machine)).toEqual(['SPEED_OUTSIDE_RANGE']);
    expect(doubts(input(), { speedMinRpm: 1600, speedMaxRpm: null })).toEqual([]);
  });

  it('name a 1x above the overall that contains it', () => {
    const analysis = analysed(input({ tacho: { edgesS } }));
    const wrong = { ...analysis, oneXShare: 1.2 };
    const codes = checkWaveform(input(), wrong).map(({ code }) => code);
    expect(codes).toEqual(['ONE_X_ABOVE_OVERALL']);
  });

  it('name a band the sample rate cuts short', () => {
    expect(doubts(input({ band: { lowHz: 10, highHz: 4000 } }))).toEqual(['BAND_CUT']);
  });
});
