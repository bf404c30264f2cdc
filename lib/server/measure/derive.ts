import 'server-only';
import { scaled } from '@/lib/domain/intake/signal-scale';
import { ok, type Result } from '@/lib/domain/result';
import { analyseWaveform, type WaveformAnalysis } from '@/lib/domain/signal/analyse-waveform';
import { checkWaveform, type WaveformDoubt } from '@/lib/domain/signal/check-waveform';
import type { VibrationQuantity } from '@/lib/domain/signal/quantity';
import { tachoEdges } from '@/lib/domain/signal/tacho-edges';
import {
  COMPARED_THIRD_OCTAVES,
  thirdOctaveLevels,
  type ThirdOctaveLevel,
} from '@/lib/domain/signal/third-octave';
import type { TachoInput, VelocityOrder, WaveformInput } from '@/lib/domain/signal/waveform-input';
import { accelerationSpectrum } from './derived-result';
import { bandOf, type PointContext } from './point-context';

/** A record as received: raw values × `scale` are m/s², mm/s or µm. */
export type RawWaveform = {
  readonly samples: Float64Array;
  readonly tacho: Float64Array | null;
  readonly sampleRateHz: number;
  readonly quantity: VibrationQuantity;
  readonly unit: string;
  readonly scale: number;
};

/** What was computed from a record, and the doubts its samples raise. */
export type DerivedFacts = {
  readonly analysis: WaveformAnalysis;
  readonly thirdOctaves: readonly ThirdOctaveLevel[];
  readonly doubts: readonly WaveformDoubt[];
};

/** Analyses and checks a record with the limits' band, the machine's speeds and the set-up's tacho. */
export function deriveRecord(
  raw: RawWaveform,
  context: PointContext,
  statedSpeedRpm: number | null,
): Result<DerivedFacts> {
  const input = waveformInput(raw, context, statedSpeedRpm);
  const analysed = analyseWaveform(input);
  if (!analysed.ok) return analysed;
  const analysis = withoutIndex(context) ? withoutLag(analysed.value) : analysed.value;
  const { speedMinRpm, speedMaxRpm } = context.point.machine.$;
  return ok({
    analysis,
    thirdOctaves: thirdOctaveLevels(accelerationSpectrum(analysis), COMPARED_THIRD_OCTAVES),
    doubts: checkWaveform(input, analysis, { speedMinRpm, speedMaxRpm }),
  });
}

function waveformInput(
  raw: RawWaveform,
  context: PointContext,
  statedSpeedRpm: number | null,
): WaveformInput {
  const tacho = tachoInput(raw, context);
  return {
    samples: scaled(raw.samples, raw.scale),
    sampleRateHz: raw.sampleRateHz,
    quantity: raw.quantity,
    band: bandOf(context),
    ...(tacho === null ? {} : { tacho }),
    ...(statedSpeedRpm === null ? {} : { speedRpm: statedSpeedRpm }),
  };
}

function tachoInput(raw: RawWaveform, { setup }: PointContext): TachoInput | null {
  if (raw.tacho === null) return null;
  const flank = setup?.tachoEdge ?? 'rising';
  const pulses = setup?.pulsesPerTurn ?? 1;
  if (pulses === 1) return { samples: raw.tacho, flank };
  const edges = tachoEdges(raw.tacho, raw.sampleRateHz, flank);
  if (!edges.ok) return { samples: raw.tacho, flank };
  return { edgesS: edges.value.edgesS.filter((_, i) => i % pulses === 0) };
}

/** Several pulses a turn without an index give a speed, but nobody knows which of them is the mark. */
function withoutIndex({ setup }: PointContext): boolean {
  return (setup?.pulsesPerTurn ?? 1) > 1;
}

function withoutLag(analysis: WaveformAnalysis): WaveformAnalysis {
  const bare = (order: VelocityOrder): VelocityOrder => ({ ...order, lagDeg: null });
  const { oneX, harmonics } = analysis;
  return { ...analysis, oneX: oneX === null ? null : bare(oneX), harmonics: harmonics.map(bare) };
}
