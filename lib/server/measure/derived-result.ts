import 'server-only';
import { z } from 'zod';
import type { Derived } from '@/entities/measured-record';
import type { AmplitudeSpectrum } from '@/lib/domain/signal/amplitude-spectrum';
import { WAVEFORM_METHOD, type WaveformAnalysis } from '@/lib/domain/signal/analyse-waveform';
import { spectrumAs } from '@/lib/domain/signal/quantity';
import type { ThirdOctaveLevel } from '@/lib/domain/signal/third-octave';
import { decodeSamples } from '../samples';

/** Method and version as stored with every result. */
export const METHOD = `${WAVEFORM_METHOD.id}/${WAVEFORM_METHOD.version}`;

const settings = z.object({
  quantity: z.enum(['acceleration', 'velocity', 'displacement']),
  window: z.literal('hann'),
  blockLength: z.number(),
  averages: z.number(),
  enbwBins: z.number(),
  band: z.object({ lowHz: z.number(), highHz: z.number() }),
  statedSpeedRpm: z.number().nullable(),
});

const order = z.object({
  order: z.number(),
  frequencyHz: z.number(),
  amplitudeRmsMmS: z.number(),
  lagDeg: z.number().nullable(),
  scatterRmsMmS: z.number().nullable(),
});

const result = z.object({
  stats: z.object({
    mean: z.number(),
    rms: z.number(),
    truePeak: z.number(),
    peakToPeak: z.number(),
    crest: z.number().nullable(),
    kurtosis: z.number().nullable(),
  }),
  dfHz: z.number(),
  overallVelocityRmsMmS: z.number(),
  speedRpm: z.number().nullable(),
  speedSource: z.enum(['tacho', 'spectrum', 'stated']).nullable(),
  speedSpreadPct: z.number().nullable(),
  turns: z.number().nullable(),
  harmonics: z.array(order),
  oneXShare: z.number().nullable(),
  tachoEdges: z.number().nullable(),
  tachoRepair: z.string().nullable(),
  tachoFault: z.string().nullable(),
  thirdOctaves: z.array(z.object({ centreHz: z.number(), levelDb: z.number().nullable() })),
});

export type StoredSettings = z.infer<typeof settings>;
export type StoredResult = z.infer<typeof result>;

/** The part of an analysis that is stored as data; the spectrum lines stand beside it as bytes. */
export function storedResult(
  analysis: WaveformAnalysis,
  thirdOctaves: readonly ThirdOctaveLevel[],
): StoredResult {
  const { stats, spectrum, tacho, tachoFault } = analysis;
  return {
    stats,
    dfHz: spectrum.dfHz,
    overallVelocityRmsMmS: analysis.overallVelocityRmsMmS,
    speedRpm: analysis.speedRpm,
    speedSource: analysis.speedSource,
    speedSpreadPct: analysis.speedSpreadPct,
    turns: analysis.turns,
    harmonics: [...analysis.harmonics],
    oneXShare: analysis.oneXShare,
    tachoEdges: tacho?.edges ?? null,
    tachoRepair: tacho?.repair ?? null,
    tachoFault: tachoFault?.message ?? null,
    thirdOctaves: [...thirdOctaves],
  };
}

/** Settings and result of a stored row, read back. */
export function readDerived(derived: Pick<Derived, 'settings' | 'result'>): {
  settings: StoredSettings;
  result: StoredResult;
} {
  return { settings: settings.parse(derived.settings), result: result.parse(derived.result) };
}

/** Third-octave levels out of a stored result. */
export function readThirdOctaves(levels: unknown): ThirdOctaveLevel[] {
  return result.shape.thirdOctaves.parse(levels);
}

/** The acceleration lines of an analysis as a spectrum. */
export function accelerationSpectrum({ spectrum, settings }: WaveformAnalysis): AmplitudeSpectrum {
  return asSpectrum(settings, spectrum.dfHz, spectrum.accelerationRmsMS2);
}

/**
 * A stored spectrum as acceleration in m/s² rms or velocity in mm/s rms. Only acceleration lines are
 * stored: velocity follows from them line by line, from the band's lower edge up where it was
 * acceleration that was measured.
 */
export function storedSpectrum(
  derived: Pick<Derived, 'settings' | 'result' | 'lines'>,
  as: 'acceleration' | 'velocity',
): AmplitudeSpectrum | null {
  if (!derived.lines) return null;
  const { settings: used, result: found } = readDerived(derived);
  const lines = asSpectrum(used, found.dfHz, decodeSamples('f64le', derived.lines));
  if (as === 'acceleration') return lines;
  const lowHz = used.quantity === 'acceleration' ? used.band.lowHz : 0;
  return spectrumAs(lines, { from: 'acceleration', to: 'velocity', lowHz });
}

function asSpectrum(
  { blockLength, averages, window, enbwBins }: StoredSettings,
  dfHz: number,
  rms: Float64Array,
): AmplitudeSpectrum {
  const sampleRateHz = dfHz * blockLength;
  return { dfHz, sampleRateHz, blockLength, averages, window, enbwBins, rms };
}
