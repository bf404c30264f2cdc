import type { EntityManager } from '@mikro-orm/postgresql';
import { MeasuredRecord, OneXVector, Reading } from '@/entities/measured-record';
import { measure, type ModelledReading } from '@/lib/domain/plant-model/measure';
import { randomSource } from '@/lib/domain/plant-model/random-source';
import { vibrationAt } from '@/lib/domain/plant-model/vibration-at';
import { judgeValue } from '@/lib/domain/severity/zone';
import { weightsOn, type DemoLedger } from './demo-ledger';
import type { DemoMachine } from './demo-machine';
import { readAt, type Round } from './demo-rounds';

/** A reading of a round as somebody typed it. */
export type TypedReading = ModelledReading & {
  readonly machine: DemoMachine;
  readonly pointId: number;
  readonly takenAt: Date;
  readonly speedRpm: number;
};

const SCATTER = { absoluteMmS: 0.03, relative: 0.025 };
const BATCH = 500;

/** What the instrument showed at every point of a machine in these rounds. */
export function readingsOf(
  machine: DemoMachine,
  rounds: readonly Round[],
  ledger: DemoLedger,
): TypedReading[] {
  const random = randomSource(104_729 * machine.number);
  return rounds.flatMap((round) => {
    const { day, speedRpm, at } = round;
    const shaken = vibrationAt(machine.model, { day, speedRpm }, weightsOn(ledger, at));
    return shaken.flatMap((vibration, i) => {
      const pointId = machine.pointIds[i];
      if (pointId === undefined) return [];
      const takenAt = readAt(round, i);
      return [{ ...measure(vibration, SCATTER, random), machine, pointId, takenAt, speedRpm }];
    });
  });
}

/** Writes typed readings in bulk: record, overall velocity with its zone, 1x vector. */
export async function insertReadings(
  em: EntityManager,
  readings: readonly TypedReading[],
): Promise<void> {
  for (let from = 0; from < readings.length; from += BATCH) {
    const batch = readings.slice(from, from + BATCH);
    const ids = await newRecordIds(em, batch.length);
    const withIds = batch.map((reading, i) => ({ ...reading, id: ids[i] ?? 0 }));
    await em.insertMany(MeasuredRecord, withIds.map(recordRow));
    await em.insertMany(Reading, withIds.map(readingRow));
    await em.insertMany(OneXVector, withIds.map(vectorRow));
  }
}

/** Ids are drawn beforehand: a bulk insert hands back only its first. */
async function newRecordIds(em: EntityManager, count: number): Promise<number[]> {
  const rows = await em.execute<{ id: string }[]>(
    `select nextval(pg_get_serial_sequence('measured_record', 'id')) as id from generate_series(1, ?)`,
    [count],
  );
  return rows.map(({ id }) => Number(id));
}

type Numbered = TypedReading & { readonly id: number };

function recordRow({ id, machine, pointId, takenAt, speedRpm }: Numbered) {
  return {
    id,
    point: pointId,
    declaredPoint: pointId,
    source: 'typed' as const,
    takenAt,
    statedSpeedRpm: speedRpm,
    state: 'kept' as const,
    holdReasons: [],
    person: machine.by.personId,
    createdAt: new Date(takenAt.getTime() + 4 * 3_600_000),
  };
}

function readingRow({ id, machine, pointId, takenAt, speedRpm, overallMmS }: Numbered) {
  const { limitSet } = machine;
  const { title, edition, bAb, bBc, bCd, unit, bandLowHz, bandHighHz } = limitSet;
  return {
    record: id,
    point: pointId,
    takenAt,
    kind: 'overall velocity' as const,
    value: overallMmS,
    unit: 'mm/s rms',
    bandLowHz,
    bandHighHz,
    speedRpm,
    zone: zoneOf(machine, overallMmS, speedRpm),
    limitSet: limitSet.id,
    limits: { title, edition, bAb, bBc, bCd, unit },
    status: 'kept' as const,
  };
}

function zoneOf({ limitSet }: DemoMachine, value: number, speedRpm: number) {
  const { bAb: ab, bBc: bc, bCd: cd, speedMinRpm = null, speedMaxRpm = null } = limitSet;
  const limits = { boundaries: { ab, bc, cd }, speedMinRpm, speedMaxRpm };
  const verdict = judgeValue(value, limits, speedRpm);
  return verdict.kind === 'zone' ? verdict.zone : null;
}

function vectorRow(reading: Numbered) {
  const { id, machine, pointId, takenAt, speedRpm, oneXMmS, lagDeg } = reading;
  const { hasTacho } = machine.spec;
  return {
    record: id,
    point: pointId,
    takenAt,
    amplitude: oneXMmS,
    unit: 'mm/s rms',
    lagDeg: hasTacho ? lagDeg : null,
    speedRpm,
    speedSource: hasTacho ? ('tacho' as const) : ('stated' as const),
    method: 'typed',
    setup: hasTacho ? machine.setupId : null,
    status: 'kept' as const,
  };
}
