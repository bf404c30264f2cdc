import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { orderVectors } from '@/lib/domain/signal/order-vectors';
import { solveLinear } from '@/lib/domain/signal/solve-linear';
import { toneSizesRms } from '@/lib/domain/signal/tone-size';
import { shortTurnDeg } from '@/lib/domain/units';

const radians = (deg: number): number => (deg * Math.PI) / 180;

describe('order vectors', () => {
  it('finds size and lag of three orders at any speed, without a whole number of samples a turn', () => {
    const lag = fc.double({ min: 0, max: 359, noNaN: true });
    fc.assert(
      fc.property(
        fc.double({ min: 5, max: 80, noNaN: true }),
        fc.double({ min: 0, max: 0.01, noNaN: true }),
        fc.tuple(lag, lag, lag),
        (shaftHz, firstS, lags) => {
          const sizes = [3, 0.5, 1.25];
          const samples = Float64Array.from({ length: 2000 }, (_, i) => {
            const theta = 2 * Math.PI * shaftHz * (i / 1000 - firstS);
            return sizes.reduce(
              (sum, a, k) => sum + a * Math.cos((k + 1) * theta - radians(lags[k] ?? 0)),
              0.4,
            );
          });
          const turns = Math.floor((1.999 - firstS) * shaftHz);
          const edgesS = Float64Array.from({ length: turns + 1 }, (_, i) => firstS + i / shaftHz);
          const vectors = orderVectors({ samples, sampleRateHz: 1000, edgesS });
          vectors.forEach(({ rms, lagDeg: found }, k) => {
            expect(rms * Math.SQRT2).toBeCloseTo(sizes[k] ?? 0, 8);
            expect(Math.abs(shortTurnDeg(lags[k] ?? 0, found))).toBeLessThan(1e-6);
          });
        },
      ),
      { numRuns: 30 },
    );
  });

  it('follows a speed that changes during the record', () => {
    const turnsAt = (t: number): number => 20 * t + 1.5 * t * t;
    const instantOf = (turn: number): number => (-20 + Math.sqrt(400 + 6 * turn)) / 3;
    const samples = Float64Array.from({ length: 4000 }, (_, i) =>
      Math.cos(2 * Math.PI * turnsAt(i / 2000) - radians(75)),
    );
    const edgesS = Float64Array.from({ length: 45 }, (_, turn) => instantOf(turn));
    const first = orderVectors({ samples, sampleRateHz: 2000, edgesS })[0];
    expect(first?.lagDeg).toBeCloseTo(75, 0);
    expect((first?.rms ?? 0) * Math.SQRT2).toBeCloseTo(1, 3);
  });

  it('turns the lag by 30 degrees when the tacho is moved by 30 degrees in the direction of rotation', () => {
    const samples = Float64Array.from({ length: 1000 }, (_, i) =>
      Math.cos((2 * Math.PI * 25 * i) / 1000 - radians(200)),
    );
    const edges = (lateTurns: number): Float64Array =>
      Float64Array.from({ length: 24 }, (_, i) => (i + lateTurns) / 25);
    const lagWith = (edgesS: Float64Array): number | undefined =>
      orderVectors({ samples, sampleRateHz: 1000, edgesS })[0]?.lagDeg;
    expect(lagWith(edges(0))).toBeCloseTo(200, 6);
    expect(lagWith(edges(30 / 360))).toBeCloseTo(170, 6);
  });

  it('states a scatter that is zero for a steady tone and not for a shaken one', () => {
    const edgesS = Float64Array.from({ length: 26 }, (_, i) => i / 25);
    const steady = Float64Array.from({ length: 1000 }, (_, i) => Math.cos(i * 0.05 * Math.PI));
    const shaken = steady.map((x, i) => x * (i % 400 < 200 ? 1 : 0.8));
    const scatterOf = (samples: Float64Array): number | null | undefined =>
      orderVectors({ samples, sampleRateHz: 1000, edgesS })[0]?.scatterRms;
    expect(scatterOf(steady)).toBeLessThan(1e-9);
    expect(scatterOf(shaken)).toBeGreaterThan(0.01);
    const oneTurn = { samples: steady, sampleRateHz: 1000, edgesS: edgesS.slice(0, 2) };
    expect(orderVectors(oneTurn)[0]?.scatterRms).toBeNull();
  });
});

describe('tone size', () => {
  it('reads a tone between lines', () => {
    const samples = Float64Array.from(
      { length: 1024 },
      (_, i) => 5 * Math.cos((2 * Math.PI * 25.3 * i) / 1024 + 1) + 7,
    );
    expect(toneSizesRms(samples, 1024, [25.3])[0]).toBeCloseTo(5 / Math.SQRT2, 3);
  });
});

describe('linear system', () => {
  it('solves what needs a row exchange', () => {
    expect([...solveLinear(Float64Array.of(0, 1, 2, 0), Float64Array.of(3, 4))]).toEqual([2, 3]);
  });
});
