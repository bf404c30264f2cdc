import { rpm, type Rpm } from '../units';
import type { AmplitudeSpectrum } from './amplitude-spectrum';
import { mainPeak } from './main-peak';
import { orderVectors } from './order-vectors';
import { lagAs, sizeFactor } from './quantity';
import type { Failure, Result } from '../result';
import { soundEdges, type SoundEdges } from './sound-edges';
import { tachoEdges } from './tacho-edges';
import { tachoSpeed } from './tacho-speed';
import { toneSizesRms } from './tone-size';
import type { VelocityOrder, WaveformInput } from './waveform-input';

/** Where a speed came from: the tacho, a line found near the stated speed, or the statement alone. */
export type SpeedSource = 'tacho' | 'spectrum' | 'stated';

/** Speed of the shaft and its first orders as velocity. */
export type ShaftOrders = {
  readonly speedRpm: Rpm | null;
  readonly speedSource: SpeedSource | null;
  readonly speedSpreadPct: number | null;
  readonly turns: number | null;
  readonly oneX: VelocityOrder | null;
  readonly harmonics: readonly VelocityOrder[];
  readonly tacho: { readonly edges: number; readonly repair: SoundEdges['repair'] } | null;
  readonly tachoFault: Failure | null;
};

const HIGHEST_ORDER = 3;
/** A line counts as the shaft's when it stands this many times above the median line around it. */
const CLEAR_LINE_RATIO = 3;

/**
 * Speed and orders 1 to 3 as velocity rms. With a sound tacho: mean speed and whole turns between
 * edges, size and lag by least squares, turned into velocity at the mean speed. Without: sizes only,
 * at the line found within 1.5 % of the stated speed, or at the stated speed itself where no line is
 * clear; no lag. With neither, nothing is claimed. `spectrum` is that of the record
 * as measured: integrated lines lean to low frequencies and would shift the peak. A tacho that cannot be used is reported in `tachoFault` and the record read as without.
 */
export function shaftOrders(input: WaveformInput, spectrum: AmplitudeSpectrum): ShaftOrders {
  const sound = soundTacho(input);
  if (sound?.ok === true) return ordersWithTacho(input, sound.value);
  return { ...ordersWithoutTacho(input, spectrum), tachoFault: sound?.failure ?? null };
}

function soundTacho({ tacho, sampleRateHz }: WaveformInput): Result<SoundEdges> | null {
  if (tacho === undefined) return null;
  if ('edgesS' in tacho) return soundEdges(tacho.edgesS);
  const found = tachoEdges(tacho.samples, sampleRateHz, tacho.flank);
  return found.ok ? soundEdges(found.value.edgesS) : found;
}

function ordersWithTacho(input: WaveformInput, { edgesS, repair }: SoundEdges): ShaftOrders {
  const { samples, sampleRateHz, quantity } = input;
  const { speedRpm, spreadPct, turns } = tachoSpeed(edgesS);
  const vectors = orderVectors({ samples, sampleRateHz, edgesS }, HIGHEST_ORDER);
  const harmonics = vectors.map(({ order, rms, lagDeg, scatterRms }): VelocityOrder => {
    const frequencyHz = (order * speedRpm) / 60;
    const factor = sizeFactor(quantity, 'velocity', frequencyHz);
    return {
      order,
      frequencyHz,
      amplitudeRmsMmS: rms * factor,
      lagDeg: lagAs(lagDeg, quantity, 'velocity'),
      scatterRmsMmS: scatterRms === null ? null : scatterRms * factor,
    };
  });
  return {
    speedRpm,
    speedSource: 'tacho',
    speedSpreadPct: spreadPct,
    turns,
    oneX: harmonics[0] ?? null,
    harmonics,
    tacho: { edges: edgesS.length, repair },
    tachoFault: null,
  };
}

function ordersWithoutTacho(input: WaveformInput, spectrum: AmplitudeSpectrum): ShaftOrders {
  const { samples, sampleRateHz, speedRpm } = input;
  const nothing = { speedSpreadPct: null, tacho: null, tachoFault: null };
  if (speedRpm === undefined) {
    const unknown = { speedRpm: null, speedSource: null, turns: null, oneX: null, harmonics: [] };
    return { ...nothing, ...unknown };
  }
  const foundHz = shaftLineNear(spectrum, speedRpm / 60);
  const shaftHz = foundHz ?? speedRpm / 60;
  const harmonics = sizesAt(input, shaftHz);
  return {
    ...nothing,
    speedRpm: rpm(foundHz === null ? speedRpm : 60 * foundHz),
    speedSource: foundHz === null ? 'stated' : 'spectrum',
    turns: Math.floor((shaftHz * samples.length) / sampleRateHz),
    oneX: harmonics[0] ?? null,
    harmonics,
  };
}

function sizesAt(input: WaveformInput, shaftHz: number): VelocityOrder[] {
  const { samples, sampleRateHz, quantity } = input;
  const frequenciesHz = Array.from({ length: HIGHEST_ORDER }, (_, i) => (i + 1) * shaftHz).filter(
    (frequencyHz) => frequencyHz < sampleRateHz / 2,
  );
  const sizes = toneSizesRms(samples, sampleRateHz, frequenciesHz);
  return frequenciesHz.map((frequencyHz, i) => ({
    order: i + 1,
    frequencyHz,
    amplitudeRmsMmS: (sizes[i] ?? 0) * sizeFactor(quantity, 'velocity', frequencyHz),
    lagDeg: null,
    scatterRmsMmS: null,
  }));
}

function shaftLineNear(spectrum: AmplitudeSpectrum, statedHz: number): number | null {
  const reach = Math.max(0.015 * statedHz, 1.5 * spectrum.dfHz);
  const peak = mainPeak(spectrum, { lowHz: statedHz - reach, highHz: statedHz + reach });
  if (peak === null) return null;
  const line = Math.round(statedHz / spectrum.dfHz);
  const around = spectrum.rms.slice(Math.max(1, line - 20), line + 21).sort();
  const floor = around[Math.floor(around.length / 2)] ?? 0;
  return peak.rms > CLEAR_LINE_RATIO * floor ? peak.frequencyHz : null;
}
