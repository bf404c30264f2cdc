import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { curvePieces, nearestIndex } from '@/lib/domain/drawing/curve-pieces';
import { columnMaxima, highestPeaks } from '@/lib/domain/drawing/spectrum-lines';
import { trainBodies, trainColumns, type TrainPart } from '@/lib/domain/drawing/train-columns';

const xs = (pieces: { x: number }[][]) => pieces.map((piece) => piece.map(({ x }) => x));
const at = (...values: number[]) => values.map((x) => ({ x, y: 1 }));

describe('pieces of a curve', () => {
  it('are cut at a balance between two readings', () => {
    expect(xs(curvePieces(at(0, 1, 2), [1.5]))).toEqual([[0, 1], [2]]);
  });

  it('are cut at a missing value and across a long gap', () => {
    expect(xs(curvePieces([...at(0, 1), { x: 2, y: null }, ...at(3, 4)]))).toEqual([
      [0, 1],
      [3, 4],
    ]);
    expect(xs(curvePieces(at(0, 1, 2, 3, 9, 10)))).toEqual([
      [0, 1, 2, 3],
      [9, 10],
    ]);
  });

  it('hold one point, or none', () => {
    expect(xs(curvePieces(at(5)))).toEqual([[5]]);
    expect(curvePieces([])).toEqual([]);
  });

  it('lose and invent no reading', () => {
    const values = fc.uniqueArray(fc.integer({ min: 0, max: 1000 }), { maxLength: 40 });
    fc.assert(
      fc.property(values, fc.array(fc.integer({ min: 0, max: 1000 })), (list, breaks) => {
        const rising = [...list].sort((a, b) => a - b);
        expect(xs(curvePieces(at(...rising), breaks)).flat()).toEqual(rising);
      }),
    );
  });

  it('are found by the nearest value', () => {
    expect(nearestIndex([0, 10], 6)).toBe(1);
    expect(nearestIndex([0, 10], 4)).toBe(0);
    expect(nearestIndex([3], -5)).toBe(0);
    expect(nearestIndex([], 1)).toBe(-1);
  });
});

describe('lines of a spectrum on a screen', () => {
  it('keep the largest of each column', () => {
    expect(columnMaxima([1, 5, 2, 3], { from: 0, to: 3 }, 2).map(({ index }) => index)).toEqual([
      1, 3,
    ]);
  });

  it('never lose the highest line, whatever the width', () => {
    const lines = fc.array(fc.double({ min: 0, max: 10, noNaN: true }), { minLength: 1 });
    fc.assert(
      fc.property(lines, fc.integer({ min: 1, max: 50 }), (values, columns) => {
        const shown = columnMaxima(values, { from: 0, to: values.length - 1 }, columns);
        expect(Math.max(...shown.map(({ value }) => value))).toBe(Math.max(...values));
      }),
    );
  });

  it('stay within what is asked for', () => {
    expect(columnMaxima([9, 1, 2, 9], { from: 1, to: 2 }, 1)).toEqual([{ index: 2, value: 2 }]);
    expect(columnMaxima([], { from: 0, to: 10 }, 5)).toEqual([]);
  });

  it('give the highest peaks, largest first', () => {
    expect(highestPeaks([0, 3, 0, 5, 0, 4, 0], 2)).toEqual([
      { index: 3, value: 5 },
      { index: 5, value: 4 },
    ]);
    expect(highestPeaks([5, 4, 3], 2)).toEqual([]);
    expect(highestPeaks([0, 2, 2, 0], 5)).toEqual([{ index: 1, value: 2 }]);
  });
});

describe('a machine train from the side', () => {
  const bearings = (...parts: TrainPart[]) => parts.map((part) => ({ part }));
  const two = bearings('driver', 'driver', 'driven', 'driven');

  it('has its rotor between the driven bearings', () => {
    const columns = trainColumns(two, false);
    expect(columns).toHaveLength(4);
    expect(trainBodies(columns)).toEqual([
      { part: 'driver', from: 0, to: 1 },
      { part: 'driven', from: 2, to: 3 },
    ]);
  });

  it('has an overhung rotor past the last bearing', () => {
    const columns = trainColumns(two, true);
    expect(columns).toHaveLength(5);
    expect(trainBodies(columns).at(-1)).toEqual({ part: 'driven', from: 4, to: 4 });
  });

  it('shows a driver that has no points', () => {
    const columns = trainColumns(bearings('driven', 'driven'), false);
    expect(columns[0]).toEqual({ kind: 'body', part: 'driver' });
  });

  it('puts a gear between driver and driven whatever the order given', () => {
    const columns = trainColumns(bearings('driven', 'gear', 'driver'), false);
    expect(trainBodies(columns).map(({ part }) => part)).toEqual(['driver', 'gear', 'driven']);
  });
});
