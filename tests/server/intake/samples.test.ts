import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Waveform } from '@/entities/measured-record';
import { getEntityManager } from '@/lib/server/db';
import { buildRecord, loadRaw } from '@/lib/server/measure/keep-waveform';
import { loadPointContext } from '@/lib/server/measure/point-context';
import { decodeSamples, encodeSamples } from '@/lib/server/samples';
import type { SmallPlant } from '@/tests/support/plant';
import { openPlant } from '@/tests/support/open-plant';
import { valueOf } from './records-of-test';

const bits = (values: Float64Array): string[] =>
  Array.from(new BigUint64Array(values.slice().buffer), (word) => word.toString(16));

const narrow = fc.array(fc.float({ noNaN: true }), { minLength: 1, maxLength: 64 });
const wide = fc.array(fc.double(), { minLength: 1, maxLength: 64 });

describe('samples as bytes', () => {
  it('come back bit for bit, whatever they are', () => {
    fc.assert(
      fc.property(fc.oneof(narrow, wide), (values) => {
        const samples = Float64Array.from(values);
        const { format, bytes } = encodeSamples(samples);
        expect(bits(decodeSamples(format, bytes))).toEqual(bits(samples));
      }),
    );
  });

  it('come back from bytes that start at any offset', () => {
    fc.assert(
      fc.property(wide, fc.integer({ min: 1, max: 15 }), (values, offset) => {
        const samples = Float64Array.from(values);
        const { format, bytes } = encodeSamples(samples);
        const shifted = Buffer.concat([Buffer.alloc(offset), bytes]).subarray(offset);
        expect(bits(decodeSamples(format, shifted))).toEqual(bits(samples));
      }),
    );
  });

  it('take half the room only where nothing is lost', () => {
    expect(encodeSamples(Float64Array.of(0.5, -0, 3)).format).toBe('f32le');
    expect(encodeSamples(Float64Array.of(0.5, 0.1)).format).toBe('f64le');
    expect(encodeSamples(Float64Array.of(1e39)).format).toBe('f64le');
  });

  it('are not made of half a value', () => {
    expect(() => decodeSamples('f64le', new Uint8Array(12))).toThrow('no whole number');
  });
});

describe('samples in the database', () => {
  let plant: SmallPlant;
  let close: () => Promise<void>;

  beforeAll(async () => {
    ({ plant, close } = await openPlant());
  });

  afterAll(() => close());

  it('come back bit for bit, and no flush touches what was not loaded', async () => {
    const pointId = plant.home.pointIds[0];
    const now = new Date();
    let minutes = 0;
    const sample = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    const record = fc.array(fc.oneof(sample, fc.float({ min: -100, max: 100, noNaN: true })), {
      minLength: 16,
      maxLength: 200,
    });
    await fc.assert(
      fc.asyncProperty(record, record, async (first, second) => {
        const samples = Float64Array.from(first);
        const tacho = Float64Array.from(samples, (_, i) => second[i % second.length] ?? 0);
        const takenAt = new Date(now.getTime() - 120_000 * ++minutes);
        const writing = await getEntityManager();
        const context = await loadPointContext(writing, pointId, takenAt);
        const built = valueOf(
          await buildRecord(writing, {
            context,
            raw: {
              samples,
              tacho,
              sampleRateHz: 4096,
              quantity: 'velocity',
              unit: 'mm/s',
              scale: 1,
            },
            takenAt,
            statedSpeedRpm: null,
            personId: plant.at('technician').personId,
            upload: null,
            supersedes: null,
            note: null,
            now,
            doubts: [],
            history: 'skip',
          }),
        );
        await writing.flush();
        const flushing = await getEntityManager();
        await flushing.find(Waveform, { record: built.record.id }, { fields: ['id', 'unit'] });
        await flushing.flush();
        const read = await loadRaw(await getEntityManager(), built.record.id);
        expect(bits(read.samples)).toEqual(bits(samples));
        expect(bits(read.tacho ?? new Float64Array())).toEqual(bits(tacho));
      }),
      { numRuns: 15 },
    );
  });
});
