import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { severityIndex } from '@/lib/domain/severity/severity-index';
import { worstPoint } from '@/lib/domain/severity/worst-point';
import {
  judgeValue,
  worseVerdict,
  ZONE_MEANING,
  zoneOf,
  type ZoneBoundaries,
  type ZoneLimits,
} from '@/lib/domain/severity/zone';

const GROUP_2_RIGID: ZoneBoundaries = { ab: 1.4, bc: 2.8, cd: 4.5 };
const limits: ZoneLimits = { boundaries: GROUP_2_RIGID, speedMinRpm: 120, speedMaxRpm: 30_000 };

const anyBoundaries = fc
  .tuple(
    fc.double({ min: 0.1, max: 10, noNaN: true }),
    fc.double({ min: 0.1, max: 10, noNaN: true }),
    fc.double({ min: 0.1, max: 10, noNaN: true }),
  )
  .map(([a, b, c]) => ({ ab: a, bc: a + b, cd: a + b + c }));
const anyValue = fc.double({ min: 0, max: 60, noNaN: true });

describe('judgeValue', () => {
  it.each([Number.NaN, Infinity, -0.1])('has no zone for %d', (value) => {
    expect(judgeValue(value, limits, 1500)).toMatchObject({ kind: 'no zone', code: 'NO_VALUE' });
  });

  it('has no zone without limits', () => {
    expect(judgeValue(1, null, 1500)).toMatchObject({ kind: 'no zone', code: 'NO_LIMITS' });
  });

  it('has no zone at a speed the limits do not hold for, and says which hold', () => {
    const verdict = judgeValue(1.2, limits, 90);
    expect(verdict).toMatchObject({ kind: 'no zone', code: 'SPEED_OUTSIDE' });
    expect(verdict).toHaveProperty(
      'reason',
      '90 r/min is outside the speeds this limit set holds for (120 to 30000 r/min): choose one for this speed.',
    );
    expect(judgeValue(1.2, { ...limits, speedMaxRpm: null }, 90)).toHaveProperty(
      'reason',
      expect.stringContaining('(from 120 r/min)'),
    );
  });

  it('takes both ends of the speed range, and an unknown speed', () => {
    for (const speed of [120, 30_000, null])
      expect(judgeValue(1.2, limits, speed)).toEqual({ kind: 'zone', zone: 'A' });
    expect(judgeValue(1.2, { ...limits, speedMinRpm: null }, 5)).toMatchObject({ kind: 'zone' });
  });

  it('never falls as the amplitude rises', () => {
    fc.assert(
      fc.property(anyBoundaries, anyValue, anyValue, (boundaries, one, other) => {
        const [low, high] = one < other ? [one, other] : [other, one];
        expect(zoneOf(low, boundaries) <= zoneOf(high, boundaries)).toBe(true);
        expect(severityIndex(low, boundaries)).toBeLessThanOrEqual(severityIndex(high, boundaries));
      }),
    );
  });

  it('does not change with the unit of value and limits', () => {
    fc.assert(
      fc.property(anyBoundaries, anyValue, (boundaries, value) => {
        // Powers of two scale without rounding.
        const scaled = { ab: 8 * boundaries.ab, bc: 8 * boundaries.bc, cd: 8 * boundaries.cd };
        expect(zoneOf(8 * value, scaled)).toBe(zoneOf(value, boundaries));
      }),
    );
  });

  it('has a word for every zone', () => {
    expect(ZONE_MEANING).toEqual({ A: 'as new', B: 'fine', C: 'put right soon', D: 'act' });
  });
});

describe('severityIndex', () => {
  it.each([
    [0, 0],
    [0.7, 0.125],
    [1.4, 0.25],
    [2.8, 0.5],
    [4.5, 0.8],
    [5.625, 1],
    [50, 1],
  ])('%d mm/s is %d', (value, index) => {
    expect(severityIndex(value, GROUP_2_RIGID)).toBeCloseTo(index, 12);
  });
});

describe('worseVerdict', () => {
  const zone = (letter: 'B' | 'C') => ({ kind: 'zone', zone: letter }) as const;
  const none = judgeValue(1, null, null);

  it('takes the higher zone, and any zone before none', () => {
    expect(worseVerdict(zone('B'), zone('C'))).toEqual(zone('C'));
    expect(worseVerdict(zone('C'), zone('B'))).toEqual(zone('C'));
    expect(worseVerdict(none, zone('B'))).toEqual(zone('B'));
    expect(worseVerdict(zone('B'), none)).toEqual(zone('B'));
  });
});

describe('worstPoint', () => {
  const at = (point: string, value: number, by: ZoneLimits | null = limits) => ({
    point,
    value,
    limits: by,
    speedRpm: 1485,
  });

  it('names the point that rules', () => {
    const worst = worstPoint([at('A-H', 1.2), at('A-V', 3), at('B-H', 2.1)]);
    expect(worst).toEqual({ ruling: at('A-V', 3), verdict: { kind: 'zone', zone: 'C' } });
  });

  it('compares points of different limit sets by zone before size', () => {
    const wide = { ...limits, boundaries: { ab: 3.5, bc: 7.1, cd: 11 } };
    expect(worstPoint([at('motor', 3, wide), at('fan', 2.9)])?.ruling.point).toBe('fan');
  });

  it('still orders values far above the limits', () => {
    expect(worstPoint([at('A-H', 20), at('B-H', 30)])?.ruling.point).toBe('B-H');
  });

  it('lets a point without a zone rule only when no point has one', () => {
    expect(worstPoint([at('slow', 9, null), at('A-H', 0.4)])?.ruling.point).toBe('A-H');
    const worst = worstPoint([at('one', 2, null), at('gone', Number.NaN), at('two', 3, null)]);
    expect(worst).toMatchObject({ ruling: { point: 'two' }, verdict: { code: 'NO_LIMITS' } });
  });

  it('tells values apart that share one quotient', () => {
    const [smaller, larger] = [at('A-H', 3.5e-323), at('B-H', 4e-323)];
    expect(worstPoint([smaller, larger])?.ruling.point).toBe('B-H');
  });

  it('of equal points takes the first, and has none without points', () => {
    expect(worstPoint([at('A-H', 2), at('B-H', 2)])?.ruling.point).toBe('A-H');
    expect(worstPoint([])).toBeNull();
  });

  it('is never a smaller value than another point of the same set', () => {
    fc.assert(
      fc.property(fc.array(anyValue, { minLength: 1, maxLength: 8 }), (values) => {
        const worst = worstPoint(values.map((value, i) => at(String(i), value)));
        expect(worst?.ruling.value).toBe(Math.max(...values));
      }),
    );
  });
});
