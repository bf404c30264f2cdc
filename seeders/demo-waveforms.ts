import type { EntityManager } from '@mikro-orm/postgresql';
import type { ModelledWeight } from '@/lib/domain/plant-model/unbalance-at';
import { randomSource, type RandomSource } from '@/lib/domain/plant-model/random-source';
import {
  synthesizeWaveform,
  type MadeWaveform,
} from '@/lib/domain/plant-model/synthesize-waveform';
import { vibrationAt } from '@/lib/domain/plant-model/vibration-at';
import { buildRecord } from '@/lib/server/measure/keep-waveform';
import { loadPointContext } from '@/lib/server/measure/point-context';
import { weightsOn, type DemoLedger } from './demo-ledger';
import type { DemoMachine } from './demo-machine';
import { readAt, type Round } from './demo-rounds';

/** Samples an instrument took, with their rate. */
export type Sampled = MadeWaveform & { readonly sampleRateHz: number };

type Spot = { readonly machine: DemoMachine; readonly pointIndex: number };

/** Knocks ring at 3 kHz; without them the band of the limits is all there is to see. */
const KNOCKING = { sampleRateHz: 10_240, sampleCount: 16_384 };
/** Frequency and phase of each broad-band tone, and the place of the first mark. */
const NUMBERS_OF_TONES = 49;
const ORDINARY = { sampleRateHz: 2560, sampleCount: 8192 };

/** Keeps records with samples of these rounds, the way an upload is kept; hands back how many. */
export async function seedWaveforms(
  em: EntityManager,
  machine: DemoMachine,
  rounds: readonly Round[],
  ledger: DemoLedger,
): Promise<number> {
  const spots = rounds.flatMap((round) => pointsSampled(machine).map((i) => ({ round, i })));
  for (const { round, i } of spots) {
    const weights = weightsOn(ledger, round.at);
    const made = sample({ machine, pointIndex: i }, round, weights);
    await keep(em, { machine, pointIndex: i }, { round, made });
  }
  await em.flush();
  return spots.length;
}

/** What an instrument at a point would record in a round. */
export function sample(
  { machine, pointIndex }: Spot,
  { day, speedRpm }: Omit<Round, 'at'>,
  weights: readonly ModelledWeight[],
): Sampled {
  const vibration = vibrationAt(machine.model, { day, speedRpm }, weights)[pointIndex];
  if (!vibration) throw new Error(`${machine.spec.tag} has no such point`);
  const length = vibration.knocks === null ? ORDINARY : KNOCKING;
  const random = placeThenDay(6151 * machine.number + 89 * pointIndex, Math.round(10 * day));
  const firstMarkS = (random() * 60) / speedRpm;
  const plan = { vibration, speedRpm, ...length, firstMarkS, noiseRmsMS2: 0.05 };
  const { samplesMS2, tacho } = synthesizeWaveform(plan, random);
  // The instrument writes single precision.
  return { samplesMS2: Float64Array.from(samplesMS2, Math.fround), tacho, ...length };
}

/**
 * What is not tied to the speed sounds alike from month to month at one place: the broad-band tones,
 * drawn first, come from the place; knocks and noise from the day.
 */
function placeThenDay(placeSeed: number, daySeed: number): RandomSource {
  const place = randomSource(placeSeed);
  const day = randomSource(placeSeed + daySeed);
  let left = NUMBERS_OF_TONES;
  return () => (left-- > 0 ? place() : day());
}

// A bearing that fails is followed where it is; the others are looked at all around.
function pointsSampled({ model, spec }: DemoMachine): number[] {
  const failing = model.faults.flatMap((fault) =>
    fault.kind === 'bearing defect' ? [fault.point] : [],
  );
  const all = [...model.points.keys()];
  if (spec.waveforms !== 'last rounds') return all;
  return all.filter((i) => failing.includes(model.points[i]?.name ?? ''));
}

async function keep(
  em: EntityManager,
  { machine, pointIndex }: Spot,
  { round, made }: { round: Round; made: Sampled },
): Promise<void> {
  const { spec, by, pointIds } = machine;
  const takenAt = readAt(round, pointIndex);
  const context = await loadPointContext(em, pointIds[pointIndex] ?? 0, takenAt);
  const { samplesMS2, tacho, sampleRateHz } = made;
  const built = await buildRecord(em, {
    context,
    raw: {
      samples: samplesMS2,
      tacho: spec.hasTacho ? tacho : null,
      sampleRateHz,
      quantity: 'acceleration',
      unit: 'm/s2',
      scale: 1,
    },
    takenAt,
    statedSpeedRpm: spec.hasTacho ? null : round.speedRpm,
    personId: by.personId,
    upload: null,
    supersedes: null,
    note: null,
    now: new Date(takenAt.getTime() + 4 * 3_600_000),
    doubts: [],
    history: 'skip',
  });
  if (!built.ok) throw new Error(`${spec.tag}: ${built.failure.message}`);
}
