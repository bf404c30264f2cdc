import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { add, fromPolar, multiply, size, subtract } from '@/lib/domain/complex';
import { driftedTo, driftLine, type DriftPoint } from '@/lib/domain/trends/drift-line';

const march = (count: number): DriftPoint[] =>
  Array.from({ length: count }, (_, day) => ({
    day,
    unbalanceGmm: add(fromPolar(100, 40), fromPolar(10 * day, 300)),
  }));
const lineOf = (points: readonly DriftPoint[]) => {
  const line = driftLine(points);
  if (!line.ok) throw new Error(line.failure.message);
  return line.value;
};

describe('driftLine', () => {
  it('finds a straight march and where it leads', () => {
    const line = lineOf(march(6));
    expect(size(line.perDayGmm)).toBeCloseTo(10, 9);
    expect(line).toMatchObject({ isForecast: true, lastDay: 5, readings: 6 });
    expect(line.straightness).toBeCloseTo(1, 9);
    const ahead = add(fromPolar(100, 40), fromPolar(70, 300));
    expect(size(subtract(driftedTo(line, 2), ahead))).toBeLessThan(1e-9);
  });

  it('is not forecast from fewer than six readings, nor from a wandering track', () => {
    expect(lineOf(march(5)).isForecast).toBe(false);
    const round = Array.from({ length: 8 }, (_, day) => ({
      day,
      unbalanceGmm: fromPolar(100, day * 45),
    }));
    expect(lineOf(round).straightness).toBeLessThan(0.2);
    expect(lineOf(round).isForecast).toBe(false);
  });

  it('says when there is too little', () => {
    expect(driftLine(march(1))).toMatchObject({ ok: false, failure: { code: 'NOT_ENOUGH' } });
    const still = [0, 1].map(() => ({ day: 3, unbalanceGmm: fromPolar(1, 0) }));
    expect(driftLine(still)).toMatchObject({ ok: false, failure: { code: 'SAME_X' } });
  });

  it('turns with the mark, a quarter at a time', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 3 }), (quarter) => {
        const turn = fromPolar(1, 90 * quarter);
        const turned = march(8).map(({ day, unbalanceGmm }) => ({
          day,
          unbalanceGmm: multiply(unbalanceGmm, turn),
        }));
        const expected = multiply(lineOf(march(8)).perDayGmm, turn);
        expect(size(subtract(lineOf(turned).perDayGmm, expected))).toBeLessThan(1e-9);
      }),
    );
  });
});
