import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  hzFromRpm,
  lagDeg,
  normaliseDeg,
  radPerSFromRpm,
  rotorDeg,
  rpm,
  shortTurnDeg,
} from '@/lib/domain/units';
import { near, nearDeg } from './balancing/near';

const turns = fc.double({ min: -1e5, max: 1e5, noNaN: true });

describe('normaliseDeg', () => {
  it.each([
    [-10, 350],
    [720, 0],
    [360, 0],
    [-360, 0],
    [-0, 0],
    [-1e-15, 0],
    [359.9, 359.9],
    [725.5, 5.5],
  ])('%s is %s', (deg, want) => {
    expect(normaliseDeg(deg)).toBe(want);
    expect(rotorDeg(deg)).toBe(want);
    expect(lagDeg(deg)).toBe(want);
  });

  it('lies in [0, 360), is unchanged by whole turns and by itself', () => {
    fc.assert(
      fc.property(turns, fc.integer({ min: -50, max: 50 }), (deg, whole) => {
        const once = normaliseDeg(deg);
        expect(once >= 0 && once < 360).toBe(true);
        expect(normaliseDeg(once)).toBe(once);
        nearDeg(normaliseDeg(deg + 360 * whole), once, 1e-8);
      }),
    );
  });
});

describe('shortTurnDeg', () => {
  it.each([
    [350, 10, 20],
    [10, 350, -20],
    [0, 180, 180],
    [180, 0, 180],
    [90, 90, 0],
  ])('from %s to %s is %s', (from, to, want) => {
    expect(shortTurnDeg(from, to)).toBe(want);
  });

  it('leads from one to the other in at most half a turn', () => {
    fc.assert(
      fc.property(turns, turns, (from, to) => {
        const turn = shortTurnDeg(from, to);
        expect(turn > -180 && turn <= 180).toBe(true);
        const missed = normaliseDeg(from + turn - to);
        expect(Math.min(missed, 360 - missed)).toBeLessThan(1e-8);
      }),
    );
  });
});

describe('speeds', () => {
  it('1500 r/min is 25 Hz, 60 r/min is 2π rad/s', () => {
    expect(hzFromRpm(rpm(1500))).toBe(25);
    near(radPerSFromRpm(rpm(60)), 2 * Math.PI, 1e-12);
  });
});
