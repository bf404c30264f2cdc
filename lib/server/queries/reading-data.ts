import 'server-only';
import { Derived, Waveform } from '@/entities/measured-record';
import { columnMaxima } from '@/lib/domain/drawing/spectrum-lines';
import { scaled } from '@/lib/domain/intake/signal-scale';
import type { AmplitudeSpectrum } from '@/lib/domain/signal/amplitude-spectrum';
import { envelopeSpectrum } from '@/lib/domain/signal/envelope';
import { tachoEdges } from '@/lib/domain/signal/tacho-edges';
import type { SpectrumDataDto, SpectrumKind, WaveformDataDto } from '@/lib/schemas/reading-page';
import { METHOD, readDerived, storedSpectrum } from '../measure/derived-result';
import { loadRaw } from '../measure/keep-waveform';
import { loadCurve, loadTacho, waveformFacts } from '../measure/load-curve';
import { query, type QueryContext } from '../query';
import { visibleRecord } from '../scope';

type Stretch = { from: number | null; to: number | null; columns: number };

const SHOWN_UNITS = { acceleration: 'm/s²', velocity: 'mm/s', displacement: 'µm' } as const;
const TURNS_SENT = 400;
/** The band whose envelope is looked at, moved below half the sample rate where that is lower. */
const ENVELOPE_BAND = { lowHz: 2000, highHz: 5000 };
const ENVELOPE_TOP_HZ = 1000;

/** A stretch of a record (s) reduced to its lowest and highest values; every sample when near enough. */
export const waveformData = query(
  'measurement:read',
  async (context, args: { recordId: number } & Stretch): Promise<WaveformDataDto | null> => {
    const { recordId, columns } = args;
    const { em } = context;
    const record = await visibleRecord(context, recordId);
    const stored = record && (await waveformFacts(em, recordId));
    if (!stored) return null;
    const { sampleRateHz, sampleCount, scale, quantity } = stored;
    const part = partOf(args, stored);
    const { indices, values } = await loadCurve(em, recordId, stored, { ...part, columns });
    return {
      seconds: Array.from(indices, (i) => i / sampleRateHz),
      values: Array.from(values, (value) => value * scale),
      sampleCount: part.count,
      unit: SHOWN_UNITS[quantity],
      durationS: sampleCount / sampleRateHz,
      turns: stored.tachoFormat ? await turnsIn(em, recordId, sampleRateHz, part) : [],
    };
  },
);

function partOf(
  { from, to }: Stretch,
  { sampleRateHz, sampleCount }: { sampleRateHz: number; sampleCount: number },
) {
  const first = Math.min(sampleCount - 1, Math.max(0, Math.floor((from ?? 0) * sampleRateHz)));
  const last = to === null ? sampleCount : Math.ceil(to * sampleRateHz) + 1;
  return { first, count: Math.max(1, Math.min(sampleCount, last) - first) };
}

/** The tacho's edges in a part; none where there are more than can be told apart. */
async function turnsIn(
  em: QueryContext['em'],
  recordId: number,
  sampleRateHz: number,
  { first, count }: { first: number; count: number },
): Promise<number[]> {
  const tacho = await loadTacho(em, recordId);
  const edges = tacho && tachoEdges(tacho, sampleRateHz);
  if (!edges?.ok) return [];
  const [fromS, toS] = [first / sampleRateHz, (first + count) / sampleRateHz];
  const turns = edges.value.edgesS.filter((at) => at >= fromS && at <= toS);
  return turns.length <= TURNS_SENT ? Array.from(turns) : [];
}

/** Lines of a record's spectrum (Hz), reduced by their maxima so that peaks stay. */
export const spectrumData = query(
  'measurement:read',
  async (
    context,
    args: { recordId: number; kind: SpectrumKind } & Stretch,
  ): Promise<SpectrumDataDto | null> => {
    const { recordId, kind, from, to, columns } = args;
    if (!(await isStoredHere(context, recordId))) return null;
    const derived = await context.em.findOneOrFail(Derived, { record: recordId, method: METHOD });
    const { settings } = readDerived(derived);
    const spectrum =
      kind === 'envelope'
        ? await envelopeOf(context, recordId)
        : { lines: storedSpectrum(derived, kind), band: settings.band };
    if (!spectrum?.lines) return null;
    const { lines, band } = spectrum;
    const topHz = {
      velocity: settings.band.highHz,
      acceleration: Infinity,
      envelope: ENVELOPE_TOP_HZ,
    };
    const range = lineRange(lines, { from, to: Math.min(to ?? Infinity, topHz[kind]) });
    const shown = columnMaxima(Array.from(lines.rms), range, columns);
    return {
      kind,
      unit: kind === 'velocity' ? 'mm/s rms' : 'm/s² rms',
      hz: shown.map(({ index }) => index * lines.dfHz),
      values: shown.map(({ value }) => value),
      dfHz: lines.dfHz,
      settings: { blockLength: lines.blockLength, averages: lines.averages, ...band },
    };
  },
);

async function isStoredHere(context: QueryContext, recordId: number): Promise<boolean> {
  const record = await visibleRecord(context, recordId);
  return record !== null && (await context.em.count(Waveform, { record: recordId })) > 0;
}

async function envelopeOf({ em }: QueryContext, recordId: number) {
  const { samples, scale, sampleRateHz, quantity } = await loadRaw(em, recordId);
  const top = 0.45 * sampleRateHz;
  const highHz = Math.min(ENVELOPE_BAND.highHz, top);
  const band = { lowHz: Math.min(ENVELOPE_BAND.lowHz, 0.4 * highHz), highHz };
  if (quantity !== 'acceleration') return null;
  return { lines: envelopeSpectrum(scaled(samples, scale), sampleRateHz, band), band };
}

function lineRange({ dfHz, rms }: AmplitudeSpectrum, hz: { from: number | null; to: number }) {
  const from = Math.max(1, Math.floor((hz.from ?? 0) / dfHz));
  const to = Math.min(rms.length - 1, Math.ceil(hz.to / dfHz));
  return { from, to: Math.max(from, to) };
}
