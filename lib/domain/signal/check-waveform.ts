import type { WaveformAnalysis } from './analyse-waveform';
import { mainPeak } from './main-peak';
import { sizeFactor } from './quantity';
import { clippedPlaces, droppedSamples } from './sample-faults';
import type { WaveformInput } from './waveform-input';

/** A reason to hold a record until a person has looked at it. */
export type WaveformDoubt = {
  readonly code:
    | 'FEW_TURNS'
    | 'CLIPPED'
    | 'FLAT_LINE'
    | 'DROPPED_SAMPLES'
    | 'SKI_SLOPE'
    | 'TACHO_UNUSABLE'
    | 'TACHO_REPAIRED'
    | 'SPEED_OUTSIDE_RANGE'
    | 'ONE_X_ABOVE_OVERALL'
    | 'BAND_CUT';
  readonly message: string;
};

/** The speeds the machine runs at, r/min; either may be unknown. */
export type MachineSpeeds = {
  readonly speedMinRpm?: number | null;
  readonly speedMaxRpm?: number | null;
};

/** Fewest shaft turns a record should hold. */
export const TURNS_MIN = 8;
const SPEED_MARGIN = 0.1;
const SKI_SLOPE = { fromHz: 2, belowHz: 5, shareMax: 0.5, velocityRmsMinMmS: 0.5 } as const;

/**
 * The doubts about a record, as data; none means it may be kept without a person. Named are: fewer
 * than 8 turns; clipping (at least 3 equal extreme samples at 2 or more places); a flat line;
 * dropped samples (16 or more equal in a row); a ski slope (more than half of the velocity energy
 * from 2 Hz up lies below 5 Hz, or below half the shaft speed if that is less, and is at least
 * 0.5 mm/s rms, so that a sensor's own noise on a still machine is not taken for one); missing or
 * doubled tacho edges; a speed more than 10 % outside the machine's range (given, or the main
 * velocity peak where none is known); 1x larger than 1.05 times an overall that contains it; and a
 * band that the sample rate cuts short.
 */
export function checkWaveform(
  input: WaveformInput,
  analysis: WaveformAnalysis,
  machine: MachineSpeeds = {},
): WaveformDoubt[] {
  return [
    flatLine(analysis),
    clipping(input),
    dropouts(input, analysis),
    fewTurns(analysis),
    tacho(analysis),
    skiSlope(analysis),
    speedRange(analysis, machine),
    oneXAboveOverall(analysis),
    bandCut(input),
  ].flatMap((doubt) => doubt ?? []);
}

function flatLine({ stats }: WaveformAnalysis): WaveformDoubt | null {
  if (stats.rms > 1e-9 * Math.abs(stats.mean)) return null;
  return {
    code: 'FLAT_LINE',
    message: 'Every sample is the same: check the sensor and its cable.',
  };
}

function clipping({ samples }: WaveformInput): WaveformDoubt | null {
  const places = clippedPlaces(samples);
  if (places < 2) return null;
  return {
    code: 'CLIPPED',
    message: `The signal is cut off flat at ${places} places: choose a larger range and record again.`,
  };
}

function dropouts({ samples }: WaveformInput, { stats }: WaveformAnalysis): WaveformDoubt | null {
  const dropped = droppedSamples(samples, stats.rms);
  if (dropped === null) return null;
  return {
    code: 'DROPPED_SAMPLES',
    message: `From sample ${dropped.from + 1} the same value stands ${dropped.length} times: samples were lost, record again.`,
  };
}

function fewTurns({ turns }: WaveformAnalysis): WaveformDoubt | null {
  if (turns === null || turns >= TURNS_MIN) return null;
  return {
    code: 'FEW_TURNS',
    message: `The record holds ${turns} turns of the shaft and ${TURNS_MIN} are needed: record for longer.`,
  };
}

function tacho({ tacho: used, tachoFault }: WaveformAnalysis): WaveformDoubt | null {
  if (tachoFault !== null) return { code: 'TACHO_UNUSABLE', message: tachoFault.message };
  if (used === null || used.repair === 'none') return null;
  return {
    code: 'TACHO_REPAIRED',
    message: `One tacho edge was ${used.repair === 'one put in' ? 'missing and put in half-way' : 'doubled and left out'}: look at the tacho before using the lag.`,
  };
}

function skiSlope({ spectrum, speedRpm }: WaveformAnalysis): WaveformDoubt | null {
  const belowHz = Math.min(SKI_SLOPE.belowHz, speedRpm === null ? Infinity : speedRpm / 120);
  let low = 0;
  let all = 0;
  spectrum.accelerationRmsMS2.forEach((rms, k) => {
    const frequencyHz = k * spectrum.dfHz;
    if (frequencyHz < SKI_SLOPE.fromHz || frequencyHz > 1000) return;
    const power = (rms * sizeFactor('acceleration', 'velocity', frequencyHz)) ** 2;
    all += power;
    if (frequencyHz < belowHz) low += power;
  });
  const small = Math.sqrt(low) < SKI_SLOPE.velocityRmsMinMmS;
  if (small || low <= SKI_SLOPE.shareMax * all) return null;
  return {
    code: 'SKI_SLOPE',
    message: `${Math.round((100 * low) / all)} % of the velocity energy lies below ${belowHz} Hz: let the sensor settle, check its mounting and record again.`,
  };
}

function speedRange(analysis: WaveformAnalysis, machine: MachineSpeeds): WaveformDoubt | null {
  const low = (machine.speedMinRpm ?? 0) * (1 - SPEED_MARGIN);
  const high = (machine.speedMaxRpm ?? Infinity) * (1 + SPEED_MARGIN);
  const speed = analysis.speedRpm ?? mainPeakRpm(analysis);
  if (speed === null || (speed >= low && speed <= high)) return null;
  const named = analysis.speedRpm === null ? 'The main peak' : 'The speed';
  return {
    code: 'SPEED_OUTSIDE_RANGE',
    message: `${named} lies at ${speed.toFixed(0)} r/min, outside this machine's ${machine.speedMinRpm ?? 0}–${machine.speedMaxRpm ?? 'unlimited'} r/min: check that the point is the right one.`,
  };
}

function mainPeakRpm({ spectrum, settings }: WaveformAnalysis): number | null {
  const velocity = {
    dfHz: spectrum.dfHz,
    sampleRateHz: spectrum.dfHz * settings.blockLength,
    blockLength: settings.blockLength,
    averages: settings.averages,
    window: settings.window,
    enbwBins: settings.enbwBins,
    rms: spectrum.velocityRmsMmS,
  };
  const peak = mainPeak(velocity, settings.band);
  return peak === null ? null : 60 * peak.frequencyHz;
}

function oneXAboveOverall(analysis: WaveformAnalysis): WaveformDoubt | null {
  const { oneX, oneXShare } = analysis;
  if (oneX === null || oneXShare === null || Math.sqrt(oneXShare) <= 1.05) return null;
  return {
    code: 'ONE_X_ABOVE_OVERALL',
    message:
      'The 1x size is larger than the overall that contains it: check unit, sample rate and speed.',
  };
}

function bandCut({ band, sampleRateHz }: WaveformInput): WaveformDoubt | null {
  if (band.highHz <= sampleRateHz / 2) return null;
  return {
    code: 'BAND_CUT',
    message: `The record reaches ${sampleRateHz / 2} Hz and the band ${band.highHz} Hz: the overall covers less than its limits assume.`,
  };
}
