import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import {
  Derived,
  OneXVector,
  Reading,
  type LimitsByValue,
  type MeasuredRecord,
} from '@/entities/measured-record';
import type { LimitSet } from '@/entities/limit-set';
import { judgeValue } from '@/lib/domain/severity/zone';
import { METHOD, storedResult } from './derived-result';
import type { DerivedFacts } from './derive';
import type { PointContext } from './point-context';

type Findings = {
  readonly record: MeasuredRecord;
  readonly context: PointContext;
  readonly facts: DerivedFacts;
  readonly now: Date;
};

/** Writes result, readings and 1x vector of a record; their status is the record's state. */
export function writeFindings(em: EntityManager, findings: Findings): void {
  const { record, facts, now } = findings;
  const { analysis, thirdOctaves } = facts;
  em.create(Derived, {
    record,
    method: METHOD,
    settings: analysis.settings,
    result: storedResult(analysis, thirdOctaves),
    // Always float64: decodeSamples is told so, and squared sums need the digits.
    lines: bytesOf64(analysis.spectrum.accelerationRmsMS2),
    madeAt: now,
  });
  writeReadings(em, findings);
  writeVector(em, findings);
}

/** Takes away what was derived, before it is made anew. */
export async function clearFindings(em: EntityManager, recordId: number): Promise<void> {
  await em.nativeDelete(Derived, { record: recordId, method: METHOD });
  await em.nativeDelete(Reading, { record: recordId });
  await em.nativeDelete(OneXVector, { record: recordId });
}

/** Lets the readings and the vector of a record follow its state. */
export async function markFindings(
  em: EntityManager,
  recordId: number,
  status: MeasuredRecord['state'],
): Promise<void> {
  await em.nativeUpdate(Reading, { record: recordId }, { status });
  await em.nativeUpdate(OneXVector, { record: recordId }, { status });
}

type Draft = Pick<Reading, 'kind' | 'value' | 'unit'> & { inBand?: true; judgedAs?: string };

function writeReadings(em: EntityManager, { record, context, facts }: Findings): void {
  const { speedRpm, settings } = facts.analysis;
  for (const { inBand, judgedAs, ...value } of drafts(facts)) {
    const limitSet = context.limitSet?.quantity === judgedAs ? context.limitSet : null;
    const limits = limitSet === null ? null : limitsByValue(limitSet);
    em.create(Reading, {
      ...value,
      record,
      point: context.point,
      takenAt: record.takenAt,
      bandLowHz: inBand ? settings.band.lowHz : null,
      bandHighHz: inBand ? settings.band.highHz : null,
      speedRpm,
      limitSet,
      limits,
      zone: zoneUnder(limitSet, value.value, speedRpm ?? context.point.machine.$.nominalSpeedRpm),
      status: record.state,
    });
  }
}

function zoneUnder(limitSet: LimitSet | null, value: number, speedRpm: number): Reading['zone'] {
  if (limitSet === null) return null;
  const { bAb: ab, bBc: bc, bCd: cd, speedMinRpm, speedMaxRpm } = limitSet;
  const limits = {
    boundaries: { ab, bc, cd },
    speedMinRpm: speedMinRpm ?? null,
    speedMaxRpm: speedMaxRpm ?? null,
  };
  const verdict = judgeValue(value, limits, speedRpm);
  return verdict.kind === 'zone' ? verdict.zone : null;
}

/** Limits for housing velocity judge housing records, limits for shaft displacement shaft records. */
function drafts({ analysis }: DerivedFacts): Draft[] {
  const { stats, settings, overallVelocityRmsMmS } = analysis;
  const { quantity } = settings;
  const list: Draft[] = [
    {
      kind: 'overall velocity',
      value: overallVelocityRmsMmS,
      unit: 'mm/s rms',
      inBand: true,
      ...(quantity === 'displacement' ? {} : { judgedAs: 'velocity' }),
    },
  ];
  if (quantity === 'acceleration') {
    list.push(
      { kind: 'true peak acceleration', value: stats.truePeak, unit: 'm/s² true peak' },
      { kind: 'rms acceleration', value: stats.rms, unit: 'm/s² rms' },
    );
  }
  if (quantity === 'displacement') {
    const value = stats.peakToPeak;
    list.push({ kind: 'overall displacement', value, unit: 'µm p-p', judgedAs: 'displacement' });
  }
  if (stats.crest !== null) list.push({ kind: 'crest factor', value: stats.crest, unit: '' });
  if (stats.kurtosis !== null) list.push({ kind: 'kurtosis', value: stats.kurtosis, unit: '' });
  return list;
}

function writeVector(em: EntityManager, { record, context, facts }: Findings): void {
  const { oneX, speedRpm, speedSource } = facts.analysis;
  if (oneX === null || speedRpm === null || speedSource === null) return;
  em.create(OneXVector, {
    record,
    point: context.point,
    takenAt: record.takenAt,
    amplitude: oneX.amplitudeRmsMmS,
    lagDeg: oneX.lagDeg,
    speedRpm,
    speedSource,
    scatter: oneX.scatterRmsMmS,
    method: METHOD,
    setup: context.setup,
    status: record.state,
  });
}

function limitsByValue({ title, edition, bAb, bBc, bCd, unit }: LimitSet): LimitsByValue {
  return { title, edition, bAb, bBc, bCd, unit };
}

function bytesOf64(lines: Float64Array): Buffer {
  return Buffer.from(lines.buffer, lines.byteOffset, lines.byteLength);
}
