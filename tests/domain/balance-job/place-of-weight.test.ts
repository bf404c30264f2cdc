import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { placeOfWeight, type TypedPlace } from '@/lib/domain/balance-job/place-of-weight';

const typed = (over: Partial<TypedPlace>): TypedPlace => ({
  position: null,
  angleDeg: 75,
  angleSense: 'against',
  arcMm: null,
  radiusMm: 400,
  ...over,
});

describe('placeOfWeight', () => {
  it('keeps degrees counted against rotation and converts those counted with it', () => {
    expect(placeOfWeight(typed({}))).toEqual({ ok: true, value: 75 });
    expect(placeOfWeight(typed({ angleSense: 'with' }))).toEqual({ ok: true, value: 285 });
  });

  it('takes a full turn as the mark', () => {
    expect(placeOfWeight(typed({ angleDeg: 360 }))).toEqual({ ok: true, value: 0 });
    expect(placeOfWeight(typed({ angleDeg: 0, angleSense: 'with' }))).toEqual({
      ok: true,
      value: 0,
    });
  });

  it('refuses to guess the way somebody counted', () => {
    const result = placeOfWeight(typed({ angleSense: '' }));
    expect(result).toMatchObject({ ok: false, failure: { field: 'angleSense' } });
    expect(placeOfWeight(typed({ angleDeg: null }))).toMatchObject({
      ok: false,
      failure: { field: 'angleDeg' },
    });
  });

  it('stops where tape and degrees disagree by more than 10°', () => {
    // 512 mm along a rim of radius 400 mm is 73.34° (arc = r·angle).
    expect(placeOfWeight(typed({ arcMm: 512 }))).toEqual({ ok: true, value: 75 });
    expect(placeOfWeight(typed({ arcMm: 512, angleDeg: 95 }))).toMatchObject({
      ok: false,
      failure: { code: 'places-disagree', field: 'arcMm' },
    });
    expect(placeOfWeight(typed({ arcMm: 512, angleSense: 'with' }))).toEqual({
      ok: true,
      value: 285,
    });
  });

  it('lets a fixed position win over degrees', () => {
    const position = { label: 'blade 4', angleDeg: 154.29 };
    expect(placeOfWeight(typed({ position, angleDeg: 10 }))).toEqual({ ok: true, value: 154.29 });
  });

  it('turns against into with by mirroring, for every angle', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 360, noNaN: true }), (angleDeg) => {
        const against = placeOfWeight(typed({ angleDeg }));
        const mirrored = placeOfWeight(typed({ angleDeg: 360 - angleDeg, angleSense: 'with' }));
        if (!against.ok || !mirrored.ok) throw new Error('both are places');
        const apart = Math.abs(against.value - mirrored.value);
        expect(Math.min(apart, 360 - apart)).toBeLessThan(1e-9);
        expect(against.value).toBeGreaterThanOrEqual(0);
        expect(against.value).toBeLessThan(360);
      }),
    );
  });
});
