import { normalFrom, type RandomSource } from './random-source';
import type { KnockPart, PointVibration } from './vibration-at';

/** A record to be made. */
export type WaveformPlan = {
  readonly vibration: Omit<PointVibration, 'point'>;
  readonly speedRpm: number;
  readonly sampleRateHz: number;
  readonly sampleCount: number;
  /** When the mark first passes the tacho, seconds from the first sample, ≥ 0. */
  readonly firstMarkS: number;
  /** White noise of sensor and cable, m/s² rms. */
  readonly noiseRmsMS2: number;
};

/** Acceleration, m/s², and a tacho column that rises from 0 to 1 as the mark reaches the tacho. */
export type MadeWaveform = { readonly samplesMS2: Float64Array; readonly tacho: Float64Array };

/** A cosine of the record: peak in m/s², phase in radians at the first sample. */
type Tone = { readonly hz: number; readonly peakMS2: number; readonly phase: number };

const BROAD_BAND_TONES = 24;
const BROAD_BAND_FROM_HZ = 12;
const BROAD_BAND_TO_HZ = 800;
const KNOCK_HZ = 3000;
const KNOCK_DECAY_S = 0.001;
// Rolling elements slip a little.
const SLIP = 0.995;
const PULSE_SHARE_OF_TURN = 0.05;

/**
 * A record at constant speed whose velocity is the vibration asked for: per order
 * `v = √2·A·cos(kΩt − φ)`, t = 0 as the mark passes the tacho; the samples are its derivative. The
 * broad-band part is 24 tones between 12 and 800 Hz away from the orders; knocks excite a resonance at
 * 3 kHz at the pass frequency and leave their velocity at its first three multiples. `sampleRateHz`
 * well above 2.56 times the highest tone for all of it to be seen. The random source gives tones,
 * knocks and noise; orders do not depend on it.
 *
 * Example: 1x of 3 mm/s rms at 40° comes back as 3 mm/s rms at 40° by least squares over whole turns.
 */
export function synthesizeWaveform(plan: WaveformPlan, random: RandomSource): MadeWaveform {
  const { vibration, sampleCount, sampleRateHz } = plan;
  const tones = [...orderTones(plan), ...broadBandTones(plan, random), ...passTones(plan, random)];
  const samplesMS2 = Float64Array.from(
    { length: sampleCount },
    () => plan.noiseRmsMS2 * normalFrom(random),
  );
  for (const { hz, peakMS2, phase } of tones) {
    const perSample = (2 * Math.PI * hz) / sampleRateHz;
    for (let i = 0; i < sampleCount; i++)
      samplesMS2[i] = (samplesMS2[i] ?? 0) + peakMS2 * Math.cos(perSample * i + phase);
  }
  if (vibration.knocks !== null) addKnocks(samplesMS2, vibration.knocks, plan, random);
  return { samplesMS2, tacho: tachoColumn(plan) };
}

// The derivative of √2·A·cos(kΩ(t − t₀) − φ) leads it by a quarter turn.
function orderTones({ vibration, speedRpm, firstMarkS }: WaveformPlan): Tone[] {
  return vibration.orders.map(({ order, rmsMmS, lagDeg }) => {
    const hz = (order * speedRpm) / 60;
    const phase = -2 * Math.PI * hz * firstMarkS - (lagDeg * Math.PI) / 180 + Math.PI / 2;
    return velocityTone(hz, rmsMmS, phase);
  });
}

function broadBandTones(plan: WaveformPlan, random: RandomSource): Tone[] {
  const { vibration, speedRpm, sampleRateHz } = plan;
  const highestHz = Math.min(BROAD_BAND_TO_HZ, 0.35 * sampleRateHz);
  const turnHz = speedRpm / 60;
  const rmsEach = vibration.broadBandRmsMmS / Math.sqrt(BROAD_BAND_TONES);
  return Array.from({ length: BROAD_BAND_TONES }, () => {
    const wanted = BROAD_BAND_FROM_HZ * (highestHz / BROAD_BAND_FROM_HZ) ** random();
    return velocityTone(awayFromOrders(wanted, turnHz), rmsEach, 2 * Math.PI * random());
  });
}

// A tone close to an order would be read as that order in a short record.
function awayFromOrders(wantedHz: number, turnHz: number): number {
  const order = Math.floor(wantedHz / turnHz);
  const within = wantedHz / turnHz - order;
  return turnHz * (order + 0.25 + 0.5 * within);
}

function passTones({ vibration, speedRpm }: WaveformPlan, random: RandomSource): Tone[] {
  const { knocks } = vibration;
  if (knocks === null) return [];
  const shares = [1, 0.6, 0.36];
  const all = Math.hypot(...shares);
  const passHz = (SLIP * knocks.passOrder * speedRpm) / 60;
  return shares.map((share, i) =>
    velocityTone((i + 1) * passHz, (knocks.velocityRmsMmS * share) / all, 2 * Math.PI * random()),
  );
}

function velocityTone(hz: number, rmsMmS: number, phase: number): Tone {
  return { hz, peakMS2: Math.SQRT2 * rmsMmS * 1e-3 * 2 * Math.PI * hz, phase };
}

// Cosine bursts start at their peak: a sine would leave a step of velocity with each knock.
function addKnocks(
  samples: Float64Array,
  knocks: KnockPart,
  { speedRpm, sampleRateHz }: WaveformPlan,
  random: RandomSource,
): void {
  const periodS = 60 / (SLIP * knocks.passOrder * speedRpm);
  const ringHz = Math.min(KNOCK_HZ, 0.35 * sampleRateHz);
  const length = Math.ceil(8 * KNOCK_DECAY_S * sampleRateHz);
  const lengthS = samples.length / sampleRateHz;
  for (let startS = periodS * random(); startS < lengthS; startS += jittered(periodS, random)) {
    const peak = knocks.peakMS2 * (0.8 + 0.4 * random());
    const first = Math.ceil(startS * sampleRateHz);
    for (let i = first; i < Math.min(first + length, samples.length); i++) {
      const t = i / sampleRateHz - startS;
      const ring = Math.exp(-t / KNOCK_DECAY_S) * Math.cos(2 * Math.PI * ringHz * t);
      samples[i] = (samples[i] ?? 0) + peak * ring;
    }
  }
}

function jittered(periodS: number, random: RandomSource): number {
  return periodS * (1 + 0.01 * (random() - 0.5));
}

function tachoColumn(plan: WaveformPlan): Float64Array {
  const { speedRpm, sampleRateHz, sampleCount, firstMarkS } = plan;
  const turnsPerSample = speedRpm / 60 / sampleRateHz;
  const width = Math.max(PULSE_SHARE_OF_TURN, 2 * turnsPerSample);
  return Float64Array.from({ length: sampleCount }, (_, i) => {
    const turns = (i / sampleRateHz - firstMarkS) * (speedRpm / 60);
    // A mark on a sample belongs to it, although the product carries a rounding error.
    return turns - Math.floor(turns + 1e-9) < width ? 1 : 0;
  });
}
