import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { LimitSet } from './limit-set';
import { Person } from './person';
import { Point } from './bearing';
import { Setup } from './setup';
import { Upload } from './upload';

export type HoldReason = { code: string; message: string };
export type LimitsByValue = {
  title: string;
  edition: string;
  bAb: number;
  bBc: number;
  bCd: number;
  unit: string;
};

/** One measurement at one point. Never updated beyond its decision; corrected by a newer record. */
export const MeasuredRecord = defineEntity({
  name: 'MeasuredRecord',
  tableName: 'measured_record',
  indexes: [{ name: 'measured_record_point_taken_index', properties: ['point', 'takenAt'] }],
  properties: {
    id: p.integer().primary(),
    /** The point it counts for now. */
    point: () => p.manyToOne(Point).ref(),
    /** The point named when it came in; stays for ever. */
    declaredPoint: () => p.manyToOne(Point).ref(),
    upload: () => p.manyToOne(Upload).ref().nullable(),
    source: p.enum(['waveform', 'typed'] as const),
    takenAt: p.datetime(),
    /** The speed stated by the person or the file, not the one measured. */
    statedSpeedRpm: p.double().$type<number>().nullable(),
    state: p.enum(['kept', 'held', 'lined through'] as const),
    holdReasons: p.json<HoldReason[]>().default('[]'),
    decisionReason: p.string().length(1000).nullable(),
    supersedes: () => p.manyToOne(MeasuredRecord).ref().nullable(),
    person: () => p.manyToOne(Person).ref(),
    createdAt: p.datetime(),
    note: p.string().length(1000).nullable(),
  },
});
export type MeasuredRecord = InferEntity<typeof MeasuredRecord>;

/** Raw samples as received, in the unit received. Own row, so that lists never load it. */
export const Waveform = defineEntity({
  name: 'Waveform',
  tableName: 'waveform',
  uniques: [{ name: 'waveform_record_unique', properties: ['record'] }],
  checks: [
    { name: 'waveform_rate_check', expression: 'sample_rate_hz > 0' },
    { name: 'waveform_count_check', expression: 'sample_count > 2' },
    {
      name: 'waveform_bytes_check',
      expression:
        "octet_length(samples) = sample_count * case sample_format when 'f32le' then 4 else 8 end",
    },
  ],
  properties: {
    id: p.integer().primary(),
    record: () => p.manyToOne(MeasuredRecord).ref(),
    sampleRateHz: p.double().$type<number>(),
    sampleCount: p.integer(),
    quantity: p.enum(['acceleration', 'velocity', 'displacement'] as const),
    unit: p.string().length(20),
    /** Raw value × scale = value in m/s², mm/s or µm. */
    scale: p.double().$type<number>(),
    /** f32le only where every value survives it exactly. */
    sampleFormat: p.enum(['f32le', 'f64le'] as const),
    samples: p.blob(),
    tachoFormat: p.enum(['f32le', 'f64le'] as const).nullable(),
    tacho: p.blob().nullable(),
  },
});
export type Waveform = InferEntity<typeof Waveform>;

/** A result computed from a waveform, with the method and the settings that made it. */
export const Derived = defineEntity({
  name: 'Derived',
  tableName: 'derived',
  uniques: [{ name: 'derived_record_method_unique', properties: ['record', 'method'] }],
  properties: {
    id: p.integer().primary(),
    record: () => p.manyToOne(MeasuredRecord).ref(),
    method: p.string().length(60),
    settings: p.json<unknown>(),
    result: p.json<unknown>(),
    /** Spectrum lines as float64 little-endian where the result has any. */
    lines: p.blob().nullable(),
    madeAt: p.datetime(),
  },
});
export type Derived = InferEntity<typeof Derived>;

/** A scalar value of a record, judged by limits kept by value. */
export const Reading = defineEntity({
  name: 'Reading',
  tableName: 'reading',
  uniques: [{ name: 'reading_record_kind_unique', properties: ['record', 'kind'] }],
  indexes: [{ name: 'reading_point_kind_taken_index', properties: ['point', 'kind', 'takenAt'] }],
  checks: [
    { name: 'reading_value_check', expression: "value >= 0 and value < 'Infinity'::float8" },
    { name: 'reading_speed_check', expression: 'speed_rpm is null or speed_rpm > 0' },
  ],
  properties: {
    id: p.integer().primary(),
    record: () => p.manyToOne(MeasuredRecord).ref(),
    point: () => p.manyToOne(Point).ref(),
    takenAt: p.datetime(),
    kind: p.enum([
      'overall velocity',
      'true peak acceleration',
      'rms acceleration',
      'crest factor',
      'kurtosis',
      'overall displacement',
    ] as const),
    value: p.double().$type<number>(),
    unit: p.string().length(20),
    bandLowHz: p.double().$type<number>().nullable(),
    bandHighHz: p.double().$type<number>().nullable(),
    speedRpm: p.double().$type<number>().nullable(),
    zone: p.enum(['A', 'B', 'C', 'D'] as const).nullable(),
    limitSet: () => p.manyToOne(LimitSet).ref().nullable(),
    limits: p.json<LimitsByValue>().nullable(),
    status: p.enum(['kept', 'held', 'lined through'] as const).default('kept'),
  },
});
export type Reading = InferEntity<typeof Reading>;

/** A 1x vector from a record: size with unit and detection, lag where a tacho gave it. */
export const OneXVector = defineEntity({
  name: 'OneXVector',
  tableName: 'one_x_vector',
  uniques: [{ name: 'one_x_vector_record_unique', properties: ['record'] }],
  indexes: [{ name: 'one_x_vector_point_taken_index', properties: ['point', 'takenAt'] }],
  checks: [
    {
      name: 'one_x_vector_lag_check',
      expression: 'lag_deg is null or (lag_deg >= 0 and lag_deg < 360)',
    },
    { name: 'one_x_vector_amplitude_check', expression: 'amplitude >= 0' },
    { name: 'one_x_vector_speed_check', expression: 'speed_rpm > 0' },
  ],
  properties: {
    id: p.integer().primary(),
    record: () => p.manyToOne(MeasuredRecord).ref(),
    point: () => p.manyToOne(Point).ref(),
    takenAt: p.datetime(),
    amplitude: p.double().$type<number>(),
    unit: p.string().length(20).default('mm/s rms'),
    lagDeg: p.double().$type<number>().nullable(),
    speedRpm: p.double().$type<number>(),
    speedSource: p.enum(['tacho', 'stated', 'spectrum'] as const),
    scatter: p.double().$type<number>().nullable(),
    method: p.string().length(60),
    setup: () => p.manyToOne(Setup).ref().nullable(),
    status: p.enum(['kept', 'held', 'lined through'] as const).default('kept'),
  },
});
export type OneXVector = InferEntity<typeof OneXVector>;
