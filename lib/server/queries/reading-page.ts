import 'server-only';
import type { Loaded } from '@mikro-orm/postgresql';
import { Point } from '@/entities/bearing';
import { Derived, MeasuredRecord, OneXVector, Reading, Waveform } from '@/entities/measured-record';
import { bearingFrequencies } from '@/lib/domain/signal/bearing-frequencies';
import type {
  MethodDto,
  PlaceDto,
  ReadingPageDto,
  ReadingValueDto,
} from '@/lib/schemas/reading-page';
import { METHOD, readDerived, type StoredResult } from '../measure/derived-result';
import { nearestPoints } from '../measure/point-history';
import { unitWord } from '../measure/unit-word';
import { query, type QueryContext } from '../query';

const SUGGESTIONS = 3;
const SHOWN_UNITS = { acceleration: 'm/s²', velocity: 'mm/s', displacement: 'µm' } as const;
const POPULATED = [
  'point.bearing',
  'point.machine.site',
  'declaredPoint.machine',
  'upload',
  'person',
] as const;

type LoadedRecord = Loaded<MeasuredRecord, (typeof POPULATED)[number]>;

/** Everything the page of one record shows beside its curves. */
export const readingPage = query(
  'measurement:read',
  async (context, recordId: number): Promise<ReadingPageDto | null> => {
    const { em, siteIds } = context;
    const record = await em.findOne(
      MeasuredRecord,
      { id: recordId, point: { machine: { site: { $in: siteIds } } } },
      { populate: POPULATED },
    );
    if (!record) return null;
    const derived = await em.findOne(
      Derived,
      { record: recordId, method: METHOD },
      { fields: ['method', 'settings', 'result', 'madeAt'] },
    );
    const made = derived ? { ...readDerived(derived), row: derived } : null;
    return {
      ...recordFacts(record),
      ...(await chainOf(context, record)),
      waveform: await waveformFacts(context, recordId),
      values: await valuesOf(context, recordId),
      vector: await vectorOf(context, recordId),
      made: made ? methodDto(made) : null,
      marks: marksOf(record, made?.result.speedRpm ?? null),
      suggestions: await suggestionsFor(context, record, made?.result ?? null),
      points: await pointsToMoveTo(context, record),
    };
  },
);

function recordFacts(record: LoadedRecord) {
  const machine = record.point.$.machine.$;
  const { id, name, timeZone, decimalMark, phaseShown } = machine.site.$;
  const declared = record.declaredPoint.id === record.point.id ? null : record.declaredPoint.$;
  const upload = record.upload?.$;
  return {
    recordId: record.id,
    state: record.state,
    source: record.source,
    reasons: [...record.holdReasons],
    decisionReason: record.decisionReason ?? null,
    note: record.note ?? null,
    takenAt: record.takenAt.toISOString(),
    createdAt: record.createdAt.toISOString(),
    person: record.person.$.name,
    statedSpeedRpm: record.statedSpeedRpm ?? null,
    site: { id, name, timeZone, decimalMark, phaseShown },
    machineName: machine.name,
    place: placeOf(record.point.$),
    declared: declared ? placeOf(declared) : null,
    upload: upload
      ? {
          id: upload.id,
          fileName: upload.fileName,
          sizeBytes: upload.sizeBytes,
          sha256: upload.sha256,
        }
      : null,
    supersedesId: record.supersedes?.id ?? null,
  };
}

function placeOf(point: Loaded<Point, 'machine'>): PlaceDto {
  const { id: machineId, tag: machineTag } = point.machine.$;
  return { pointId: point.id, label: point.label, machineId, machineTag };
}

async function chainOf({ em }: QueryContext, record: LoadedRecord) {
  const corrected = await em.findOne(MeasuredRecord, { supersedes: record.id }, { fields: ['id'] });
  const beside = {
    point: record.point.id,
    id: { $ne: record.id },
    state: { $in: ['kept' as const, 'held' as const] },
  };
  const [earlier] = await em.find(
    MeasuredRecord,
    { ...beside, takenAt: { $lt: record.takenAt } },
    { orderBy: { takenAt: 'desc' }, limit: 1, fields: ['id'] },
  );
  const [later] = await em.find(
    MeasuredRecord,
    { ...beside, takenAt: { $gt: record.takenAt } },
    { orderBy: { takenAt: 'asc' }, limit: 1, fields: ['id'] },
  );
  return {
    correctedById: corrected?.id ?? null,
    earlierId: earlier?.id ?? null,
    laterId: later?.id ?? null,
  };
}

async function waveformFacts(
  { em }: QueryContext,
  recordId: number,
): Promise<ReadingPageDto['waveform']> {
  const stored = await em.findOne(
    Waveform,
    { record: recordId },
    { fields: ['sampleRateHz', 'sampleCount', 'quantity', 'unit', 'tachoFormat'] },
  );
  if (!stored) return null;
  const { sampleRateHz, sampleCount, quantity, unit } = stored;
  return {
    sampleRateHz,
    sampleCount,
    durationS: sampleCount / sampleRateHz,
    quantity,
    receivedUnit: unitWord(unit),
    shownUnit: SHOWN_UNITS[quantity],
    withTacho: Boolean(stored.tachoFormat),
  };
}

async function valuesOf({ em }: QueryContext, recordId: number): Promise<ReadingValueDto[]> {
  const readings = await em.find(Reading, { record: recordId }, { orderBy: { id: 'asc' } });
  return readings.map(({ kind, value, unit, bandLowHz, bandHighHz, zone, limits }) => ({
    kind,
    value,
    unit,
    bandLowHz: bandLowHz ?? null,
    bandHighHz: bandHighHz ?? null,
    zone: zone ?? null,
    limits: limits ?? null,
  }));
}

async function vectorOf({ em }: QueryContext, recordId: number): Promise<ReadingPageDto['vector']> {
  const vector = await em.findOne(OneXVector, { record: recordId }, { populate: ['setup'] });
  if (!vector) return null;
  const { amplitude, unit, lagDeg, speedRpm, scatter, setup } = vector;
  return {
    amplitude,
    unit,
    lagDeg: lagDeg ?? null,
    speedRpm,
    scatter: scatter ?? null,
    setupNumber: setup?.$.number ?? null,
  };
}

type Made = ReturnType<typeof readDerived> & { row: { method: string; madeAt: Date } };

function methodDto({ settings, result, row }: Made): MethodDto {
  const { blockLength, averages, enbwBins, band } = settings;
  const { harmonics, dfHz, speedRpm, speedSource, speedSpreadPct, turns } = result;
  const { tachoRepair, tachoFault, oneXShare } = result;
  return {
    method: row.method,
    madeAt: row.madeAt.toISOString(),
    ...{ blockLength, averages, dfHz, enbwBins, band },
    ...{ speedRpm, speedSource, speedSpreadPct, turns, tachoRepair, tachoFault, oneXShare },
    orders: harmonics.map(({ order, frequencyHz, amplitudeRmsMmS, lagDeg }) => ({
      order,
      frequencyHz,
      amplitudeRmsMmS,
      lagDeg,
    })),
  };
}

function marksOf(record: LoadedRecord, speedRpm: number | null): ReadingPageDto['marks'] {
  const { ballCount, ballDiameterMm, pitchDiameterMm, contactDeg } = record.point.$.bearing.$;
  if (!speedRpm || !ballCount || !ballDiameterMm || !pitchDiameterMm) return [];
  const geometry = {
    rollers: ballCount,
    rollerDiameterMm: ballDiameterMm,
    pitchDiameterMm,
    contactDeg: contactDeg ?? 0,
  };
  const { ftfHz, bsfHz, bpfoHz, bpfiHz } = bearingFrequencies(geometry, speedRpm / 60);
  return [
    { label: 'BPFO', frequencyHz: bpfoHz },
    { label: 'BPFI', frequencyHz: bpfiHz },
    { label: 'BSF', frequencyHz: bsfHz },
    { label: 'FTF', frequencyHz: ftfHz },
  ];
}

async function suggestionsFor(
  { em }: QueryContext,
  record: LoadedRecord,
  result: StoredResult | null,
): Promise<ReadingPageDto['suggestions']> {
  if (record.state !== 'held' || result === null) return [];
  const near = await nearestPoints(em, {
    pointId: record.point.id,
    siteId: record.point.$.machine.$.site.id,
    takenAt: record.takenAt,
    recordId: record.id,
    thirdOctaves: result.thirdOctaves,
  });
  return near.filter(({ pointId }) => pointId !== record.point.id).slice(0, SUGGESTIONS);
}

async function pointsToMoveTo(
  { em }: QueryContext,
  record: LoadedRecord,
): Promise<ReadingPageDto['points']> {
  if (record.state === 'lined through') return [];
  const points = await em.find(
    Point,
    { machine: { site: record.point.$.machine.$.site.id, state: 'active' } },
    { populate: ['machine'], orderBy: { machine: { tag: 'asc' }, order: 'asc' } },
  );
  return points
    .filter(({ id }) => id !== record.point.id)
    .map(({ id, label, machine }) => ({
      id,
      label: `${machine.$.tag} ${label}`,
      machine: machine.$.name,
    }));
}
