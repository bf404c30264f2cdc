import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { choosePositions, type PositionTask } from '@/lib/domain/balancing/choose-positions';
import { stockMasses } from '@/lib/domain/balancing/stock-masses';
import { fromPolar, size, subtract, sum } from '@/lib/domain/complex';
import { codeOf, valueOf } from './job-builder';

const ring = (count: number, roomG: number | null, radiusMm = 300) =>
  Array.from({ length: count }, (_, k) => ({
    id: k + 1,
    label: `P${k + 1}`,
    angleDeg: (360 / count) * k,
    radiusMm,
    roomG,
  }));

const task = (over: Partial<PositionTask> = {}): PositionTask => ({
  wanted: { unbalanceGmm: 9000, angleDeg: 60 },
  positions: ring(6, 100),
  piecesG: [5],
  targetGmm: 1,
  ...over,
});

describe('choosePositions', () => {
  it('takes one position where the weight belongs exactly there', () => {
    const { proposal } = valueOf(choosePositions(task()));
    expect(proposal.weights).toEqual([{ positionId: 2, label: 'P2', massG: 30 }]);
    expect(proposal.residualGmm).toBeCloseTo(0, 6);
  });

  it('says the least that remains where no choice meets the target', () => {
    const { proposal, choices } = valueOf(choosePositions(task({ positions: ring(6, 5) })));
    expect(proposal.meetsTarget).toBe(false);
    expect(proposal.residualGmm).toBe(Math.min(...choices.map((choice) => choice.residualGmm)));
  });

  it.each([
    ['no-positions', { positions: [] }],
    ['no-pieces', { piecesG: [] }],
    ['no-pieces', { piecesG: [5, 0] }],
    ['no-room', { positions: ring(6, 4) }],
    ['nothing-wanted', { wanted: { unbalanceGmm: 0, angleDeg: 0 } }],
    ['no-label', { positions: [{ ...ring(1, 10)[0]!, label: ' ' }] }],
    ['target', { targetGmm: Number.NaN }],
  ])('refuses in words: %s', (code, over) => {
    expect(codeOf(choosePositions(task(over)))).toBe(code);
  });

  it('never exceeds the room, uses whole pieces, and no random choice of as many is better', () => {
    const anyPosition = fc.record({
      angleDeg: fc.integer({ min: 0, max: 359 }),
      roomG: fc.constantFrom(10, 20, 40, null),
      radiusMm: fc.constantFrom(200, 300),
    });
    fc.assert(
      fc.property(
        fc.uniqueArray(anyPosition, {
          minLength: 3,
          maxLength: 7,
          selector: ({ angleDeg }) => angleDeg,
        }),
        fc.integer({ min: 500, max: 20_000 }),
        fc.integer({ min: 0, max: 359 }),
        fc.array(fc.tuple(fc.nat(6), fc.integer({ min: 1, max: 8 })), {
          minLength: 1,
          maxLength: 3,
        }),
        (places, unbalanceGmm, angle, tried) => {
          const positions = places.map((place, k) => ({ ...place, id: k, label: `P${k}` }));
          const wanted = { unbalanceGmm, angleDeg: angle };
          const plan = choosePositions(task({ positions, wanted, piecesG: [5] }));
          if (!plan.ok) return;
          for (const { weights } of plan.value.choices)
            for (const { positionId, massG } of weights) {
              expect(massG % 5).toBe(0);
              expect(massG).toBeLessThanOrEqual(positions[positionId]?.roomG ?? Infinity);
            }
          const own = new Map(tried.map(([at, pieces]) => [at % positions.length, 5 * pieces]));
          const fits = [...own].every(([at, g]) => g <= (positions[at]?.roomG ?? Infinity));
          const best = plan.value.choices[own.size - 1];
          if (!fits || !best) return;
          const hung = [...own].map(([at, g]) =>
            fromPolar(g * (positions[at]?.radiusMm ?? 0), positions[at]?.angleDeg ?? 0),
          );
          const left = size(subtract(fromPolar(unbalanceGmm, angle), sum(hung)));
          // Masses far above what is wanted are left out of the search and are never better.
          expect(best.residualGmm).toBeLessThanOrEqual(left + 1e-6 * unbalanceGmm);
        },
      ),
      { numRuns: 60 },
    );
  });

  it('says so where the search was stopped', () => {
    const positions = ring(24, null);
    const plan = valueOf(choosePositions(task({ positions, piecesG: [0.1], targetGmm: 0 })));
    expect(plan.choices[0]?.proven).toBe(true);
    expect(plan.choices.at(-1)?.proven).toBe(false);
  });
});

describe('stockMasses', () => {
  it('are the sums of pieces', () => {
    expect(stockMasses([5], 20)).toEqual([5, 10, 15, 20]);
    expect(stockMasses([4, 7], 15)).toEqual([4, 7, 8, 11, 12, 14, 15]);
    expect(stockMasses([5], 4.9)).toEqual([]);
    expect(stockMasses([2.5], 5.05)).toEqual([2.5, 5]);
  });
});
