import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { soundEdges } from '@/lib/domain/signal/sound-edges';
import { tachoEdges } from '@/lib/domain/signal/tacho-edges';
import { tachoSpeed } from '@/lib/domain/signal/tacho-speed';

const edgesOf = (tacho: number[], rateHz: number, flank?: 'rising' | 'falling'): number[] => {
  const found = tachoEdges(Float64Array.from(tacho), rateHz, flank);
  return found.ok ? [...found.value.edgesS] : [];
};

describe('tacho edges', () => {
  it('takes half a sample off a two-level column', () => {
    expect(edgesOf([0, 0, 1, 1, 0, 0, 0, 1], 1)).toEqual([1.5, 6.5]);
    expect(edgesOf([0, 0, 1, 1, 0, 0, 0, 1], 1, 'falling')).toEqual([3.5]);
  });

  it('has no bias over edges at every place between two samples', () => {
    const periodS = Math.SQRT2;
    const rateHz = 17;
    const tacho = Array.from({ length: 17_000 }, (_, i) => ((i / rateHz) % periodS < 0.4 ? 1 : 0));
    const late = edgesOf(tacho, rateHz).map((edge) => edge - Math.round(edge / periodS) * periodS);
    expect(Math.abs(late.reduce((sum, d) => sum + d, 0) / late.length)).toBeLessThan(0.001);
  });

  it('interpolates an analogue column and ignores ripple inside the hysteresis', () => {
    expect(edgesOf([0, 0, 4, 10, 10, 0], 1)).toEqual([2 + 1 / 6]);
    expect(edgesOf([0, 4.9, 5.1, 4.9, 5.1, 4.8, 9, 10, 0], 1)).toHaveLength(1);
  });

  it('says in words what is wrong with a column it cannot use', () => {
    expect(tachoEdges(new Float64Array(20), 1)).toMatchObject({ failure: { code: 'TACHO_FLAT' } });
    expect(tachoEdges(Float64Array.of(1, 1, 0, 0), 1)).toMatchObject({
      failure: { code: 'TACHO_WITHOUT_EDGES' },
    });
  });
});

describe('edge trains', () => {
  const even = Array.from({ length: 20 }, (_, i) => i);
  const without = (...gone: number[]): Float64Array =>
    Float64Array.from(even.filter((i) => !gone.includes(i)));

  it('leaves an even train alone', () => {
    expect(soundEdges(Float64Array.from(even))).toMatchObject({ value: { repair: 'none' } });
  });

  it('puts one missing edge in', () => {
    expect(soundEdges(without(7))).toEqual({
      ok: true,
      value: { edgesS: Float64Array.from(even), repair: 'one put in' },
    });
  });

  it.each([7.02, 7.5, 6.97])('leaves a doubled edge at %d out', (extra) => {
    const doubled = Float64Array.from([...even, extra]).sort();
    expect(soundEdges(doubled)).toEqual({
      ok: true,
      value: { edgesS: Float64Array.from(even), repair: 'one left out' },
    });
  });

  it('refuses two missing edges, whether together or apart', () => {
    expect(soundEdges(without(7, 8))).toMatchObject({ failure: { code: 'EDGES_IRREGULAR' } });
    expect(soundEdges(without(4, 12))).toMatchObject({ failure: { code: 'EDGES_IRREGULAR' } });
  });

  it('refuses one missing and one doubled edge', () => {
    const both = Float64Array.from([...without(5), 12.1]).sort();
    expect(soundEdges(both)).toMatchObject({ failure: { code: 'EDGES_IRREGULAR' } });
  });

  it('needs three edges', () => {
    expect(soundEdges(Float64Array.of(0, 1))).toMatchObject({ failure: { code: 'TOO_FEW_EDGES' } });
  });
});

describe('speed from edges', () => {
  it('is turns over time, whatever the origin of time', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 1000, noNaN: true }),
        fc.double({ min: 0.001, max: 2, noNaN: true }),
        fc.integer({ min: 2, max: 200 }),
        (origin, turnS, turns) => {
          const edges = Float64Array.from({ length: turns + 1 }, (_, i) => origin + i * turnS);
          const speed = tachoSpeed(edges);
          expect(speed.turns).toBe(turns);
          expect(Math.abs((speed.speedRpm * turnS) / 60 - 1)).toBeLessThan(1e-8);
        },
      ),
    );
  });

  it('states the spread as longest minus shortest turn', () => {
    expect(tachoSpeed(Float64Array.of(0, 0.9, 2, 3)).spreadPct).toBeCloseTo(20, 10);
  });
});
