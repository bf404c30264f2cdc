import { describe, expect, it } from 'vitest';
import { alertLevel, stopLevelCap } from '@/lib/domain/severity/alert-level';
import { significantChange } from '@/lib/domain/severity/change-rule';
import { shaftBoundaries } from '@/lib/domain/severity/shaft-boundaries';
import { SHIPPED_LIMIT_SETS } from '@/lib/domain/severity/shipped-limit-sets';
import { worseVerdict, zoneOf, type Zone } from '@/lib/domain/severity/zone';

function shipped(key: string) {
  const found = SHIPPED_LIMIT_SETS.find((set) => set.key === key);
  if (found === undefined) throw new Error(`No shipped limit set has the key ${key}.`);
  return found;
}
const triple = ({ ab, bc, cd }: { ab: number; bc: number; cd: number }) => [ab, bc, cd];

// SV-01: the standards named in each set, from memory; SV-02 to SV-04 support the numbers.
describe('SV-01 boundaries as remembered from the standards', () => {
  it.each([
    ['iso-20816-3-group-1-rigid', [2.3, 4.5, 7.1], [29, 57, 90]],
    ['iso-20816-3-group-1-flexible', [3.5, 7.1, 11], [45, 90, 140]],
    ['iso-20816-3-group-2-rigid', [1.4, 2.8, 4.5], [22, 45, 71]],
    ['iso-20816-3-group-2-flexible', [2.3, 4.5, 7.1], [37, 71, 113]],
  ])('%s', (key, velocity, displacement) => {
    for (const set of [shipped(key), shipped(`${key}-slow`)]) {
      expect(triple(set.boundaries)).toEqual(velocity);
      expect(set.displacementRmsUm && triple(set.displacementRmsUm)).toEqual(displacement);
    }
  });

  it.each([
    ['iso-10816-1-class-i', [0.71, 1.8, 4.5]],
    ['iso-14694-bv-3-rigid', [4.5, 7.1, 9]],
    ['iso-14694-bv-3-flexible', [6.3, 11.8, 12.5]],
    ['iso-14694-bv-4-rigid', [2.8, 4.5, 7.1]],
    ['iso-14694-bv-4-flexible', [4.5, 7.1, 11.2]],
    ['iso-14694-bv-5-rigid', [1.8, 4, 5.6]],
    ['iso-14694-bv-5-flexible', [2.8, 5.6, 7.1]],
  ])('%s', (key, velocity) => {
    expect(triple(shipped(key).boundaries)).toEqual(velocity);
  });
});

// SV-02: structure of the tables: every displacement limit is the velocity limit at one frequency.
describe('SV-02 crossover of velocity and displacement', () => {
  it.each([
    ['iso-20816-3-group-1-rigid', 12.5],
    ['iso-20816-3-group-1-flexible', 12.5],
    ['iso-20816-3-group-2-rigid', 10],
    ['iso-20816-3-group-2-flexible', 10],
  ])('%s at about %d Hz', (key, hz) => {
    const { boundaries, displacementRmsUm } = shipped(key);
    const displacement = displacementRmsUm === null ? [] : triple(displacementRmsUm);
    const crossovers = triple(boundaries).map(
      (v, i) => (1000 * v) / (2 * Math.PI * (displacement[i] ?? 0)),
    );
    for (const crossover of crossovers) expect(Math.abs(crossover - hz)).toBeLessThanOrEqual(0.5);
  });
});

// SV-03: ISO 10816-7:2009 (from memory): printed alarm and trip values are the rule's, rounded.
describe('SV-03 pumps: alarm 1.25·B/C and trip 1.25·C/D', () => {
  it.each([
    ['iso-10816-7-category-i-small', [2.5, 4, 6.6], 5, 8.3],
    ['iso-10816-7-category-i-large', [3.5, 5, 7.6], 6.3, 9.5],
    ['iso-10816-7-category-ii-small', [3.2, 5.1, 8.5], 6.4, 10.6],
    ['iso-10816-7-category-ii-large', [4.2, 6.1, 9.5], 7.6, 11.9],
  ])('%s', (key, zones, alarm, trip) => {
    const { boundaries } = shipped(key);
    expect(triple(boundaries)).toEqual(zones);
    expect(Math.abs(alertLevel(100, boundaries) - alarm)).toBeLessThanOrEqual(0.06);
    expect(Math.abs(stopLevelCap(boundaries) - trip)).toBeLessThanOrEqual(0.06);
  });
});

// SV-04: AMCA 204 peak values / √2 (both tables from memory), within 5.5 %.
describe('SV-04 fans: another table of the trade agrees', () => {
  it.each([
    ['iso-14694-bv-3-rigid', [6.4, 10.2, 12.7]],
    ['iso-14694-bv-3-flexible', [8.8, 16.5, 17.8]],
    ['iso-14694-bv-4-rigid', [4.1, 6.4, 10.2]],
    ['iso-14694-bv-4-flexible', [6.4, 10.2, 15.2]],
    ['iso-14694-bv-5-rigid', [2.5, 5.7, 7.6]],
    ['iso-14694-bv-5-flexible', [4.1, 7.6, 10.2]],
  ])('%s', (key, peaks) => {
    triple(shipped(key).boundaries).forEach((limit, i) => {
      expect(Math.abs((peaks[i] ?? 0) / Math.SQRT2 / limit - 1)).toBeLessThanOrEqual(0.055);
    });
  });
});

// SV-05: ISO 7919-3 / ISO 20816-3 annex B, formula from memory, arithmetic verified.
describe('SV-05 relative shaft vibration', () => {
  it.each([
    [1500, 123.935, 232.379, 340.823],
    [1800, 113.137, 212.132, 311.127],
    [3000, 87.636, 164.317, 240.998],
    [3600, 80, 150, 220],
    [6000, 61.968, 116.19, 170.411],
    [10_000, 48, 90, 132],
  ])('%d r/min', (speedRpm, ...published) => {
    triple(shaftBoundaries(speedRpm)).forEach((limit, i) => {
      expect(Math.abs(limit - (published[i] ?? 0))).toBeLessThanOrEqual(0.05);
    });
  });
});

// SV-07: ISO 10816-1/20816-1 (rules from memory, arithmetic verified).
describe('SV-07 alert and stop levels', () => {
  it.each([
    [1.9, 2.8, 4.5, 2.6, 5.625],
    [5, 7.1, 11, 6.775, 13.75],
    [3.2, 2.8, 4.5, 3.5, 5.625],
  ])('baseline %d with B/C %d and C/D %d', (baseline, bc, cd, alert, stop) => {
    expect(alertLevel(baseline, { bc })).toBeCloseTo(alert, 12);
    expect(stopLevelCap({ cd })).toBeCloseTo(stop, 12);
  });

  // Scenario values: significant change test.
  it('1.10 → 1.85 with B/C 2.8 is significant', () => {
    const { change, limit, significant } = significantChange(1.85, 1.1, 2.8);
    expect(change).toBeCloseTo(0.75, 12);
    expect(limit).toBeCloseTo(0.7, 12);
    expect(significant).toBe(true);
  });
});

// SV-08: classification vectors computed from the tables above.
describe('SV-08 zones', () => {
  it.each<[string, number, number | null, Zone]>([
    ['iso-20816-3-group-2-rigid', 1.4, null, 'A'],
    ['iso-20816-3-group-2-rigid', 1.41, null, 'B'],
    ['iso-20816-3-group-2-rigid', 2, 50, 'C'],
    ['iso-20816-3-group-1-flexible', 7.1, null, 'B'],
    ['iso-20816-3-group-1-flexible', 11.2, 120, 'D'],
    ['iso-20816-3-group-1-rigid', 4.6, 40, 'C'],
  ])('%s, %d mm/s and %s µm', (key, velocity, displacement, zone) => {
    const { boundaries, displacementRmsUm } = shipped(key);
    const byVelocity = { kind: 'zone', zone: zoneOf(velocity, boundaries) } as const;
    const verdict =
      displacement === null || displacementRmsUm === null
        ? byVelocity
        : worseVerdict(byVelocity, { kind: 'zone', zone: zoneOf(displacement, displacementRmsUm) });
    expect(verdict).toEqual({ kind: 'zone', zone });
  });

  // Scenario values: boundary belongs to the lower zone.
  it('group 2 rigid round each boundary', () => {
    const { boundaries } = shipped('iso-20816-3-group-2-rigid');
    const values = [1.39, 1.4, 1.41, 2.8, 2.81, 4.5, 4.51];
    expect(values.map((value) => zoneOf(value, boundaries)).join('')).toBe('AABBCCD');
  });
});
