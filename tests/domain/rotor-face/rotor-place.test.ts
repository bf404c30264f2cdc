import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { arcMm, positionWords } from '@/lib/domain/drawing/rotor-place';
import { leaderRows, spreadApart } from '@/lib/domain/drawing/leader-rows';
import { weightDotRadii } from '@/lib/domain/drawing/weight-dots';

const four = [0, 90, 180, 270].map((angleDeg, i) => ({ label: String(i + 1), angleDeg }));

describe('one place in several ways', () => {
  it('is 252 mm of arc for 36.1° at 400 mm', () => {
    expect(arcMm(36.1, 400)).toBeCloseTo(252.0255, 4);
  });

  it('is 1515 mm of arc for 124° at 700 mm', () => {
    expect(Math.round(arcMm(124, 700))).toBe(1515);
  });

  it('names the position it is at, also across zero', () => {
    expect(positionWords(90.3, four)).toEqual({ kind: 'at', label: '2' });
    expect(positionWords(359.8, four)).toEqual({ kind: 'at', label: '1' });
  });

  it('names the two positions it lies between, in the order of counting', () => {
    expect(positionWords(124, four)).toEqual({ kind: 'between', from: '2', to: '3' });
    expect(positionWords(300, four)).toEqual({ kind: 'between', from: '4', to: '1' });
    expect(positionWords(300, [...four].reverse())).toEqual({
      kind: 'between',
      from: '4',
      to: '1',
    });
  });

  it('names nothing where there is nothing to name', () => {
    expect(positionWords(10, [])).toEqual({ kind: 'none' });
    expect(positionWords(10, four.slice(0, 1))).toEqual({ kind: 'none' });
  });
});

describe('dots', () => {
  it('have areas in proportion to their masses', () => {
    expect(weightDotRadii([90, 22.5], 10)).toEqual([10, 5]);
  });

  it('stay visible when tiny, and when nothing weighs anything', () => {
    expect(weightDotRadii([1000, 1], 10)).toEqual([10, 3]);
    expect(weightDotRadii([0, 0], 10)).toEqual([3, 3]);
    expect(weightDotRadii([], 10)).toEqual([]);
  });
});

describe('labels', () => {
  it('give the lowest mark the first row and inmost channel of its side', () => {
    expect(leaderRows([350, 236, 120])).toEqual([
      { side: 'left', row: 1, channel: 1 },
      { side: 'left', row: 0, channel: 0 },
      { side: 'right', row: 0, channel: 0 },
    ]);
  });

  it('never share a row on one side', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 359 }), { maxLength: 12 }), (degs) => {
        const rows = leaderRows(degs).map(({ side, row }) => `${side} ${row}`);
        expect(new Set(rows).size).toBe(degs.length);
      }),
    );
  });

  it('move apart no more than they must', () => {
    expect(spreadApart([10, 11], 10, { min: 0, max: 100 })).toEqual([10, 20]);
    expect(spreadApart([98, 99], 10, { min: 0, max: 100 })).toEqual([90, 100]);
    expect(spreadApart([50, 10], 10, { min: 0, max: 100 })).toEqual([50, 10]);
  });

  it('keep their gap and order wherever there is room', () => {
    const wanted = fc.array(fc.double({ min: 0, max: 100, noNaN: true }), { maxLength: 10 });
    fc.assert(
      fc.property(wanted, (values) => {
        const placed = spreadApart(values, 10, { min: 0, max: 100 }).sort((a, b) => a - b);
        placed.slice(1).forEach((value, i) => {
          expect(value - placed[i]!).toBeGreaterThanOrEqual(10 - 1e-9);
        });
      }),
    );
  });
});
