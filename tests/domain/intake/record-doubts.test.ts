import { describe, expect, it } from 'vitest';
import { clockDoubts, placeDoubts, type PointHistory } from '@/lib/domain/intake/record-doubts';

const NOTHING: PointHistory = {
  lastOverallsMmS: [],
  distanceDb: null,
  nearest: null,
  nearestRecordS: null,
};
const codes = (overall: number, history: Partial<PointHistory>) =>
  placeDoubts(overall, { ...NOTHING, ...history }).map(({ code }) => code);

describe('doubts about the place of a record', () => {
  it('need a history', () => {
    expect(codes(100, {})).toEqual([]);
  });

  it('a level beyond four times the usual, either way', () => {
    const lastOverallsMmS = [1, 2, 1, 2, 9, 1, 500];
    expect(codes(6, { lastOverallsMmS })).toEqual([]);
    expect(codes(6.01, { lastOverallsMmS })).toEqual(['LEVEL_UNLIKE']);
    expect(codes(0.375, { lastOverallsMmS })).toEqual([]);
    expect(codes(0.37, { lastOverallsMmS })).toEqual(['LEVEL_UNLIKE']);
    expect(placeDoubts(6.6, { ...NOTHING, lastOverallsMmS })[0]?.message).toBe(
      'The overall velocity, 6.6 mm/s rms, is 4.4 times the usual 1.5 of this point (median of 6): check point, unit and state of the machine.',
    );
  });

  it('a spectrum 6 dB or more away, naming the point it resembles', () => {
    const nearest = { label: 'P-205 NDE-H', distanceDb: 1.7 };
    expect(codes(1, { distanceDb: 5.99, nearest })).toEqual([]);
    expect(placeDoubts(1, { ...NOTHING, distanceDb: 9.9, nearest })).toEqual([
      {
        code: 'UNLIKE_POINT',
        message:
          'The spectrum lies 9.9 dB from the last one kept here and 1.7 dB from that of P-205 NDE-H: was it taken there?',
      },
    ]);
    const farther = { ...nearest, distanceDb: 12 };
    expect(placeDoubts(1, { ...NOTHING, distanceDb: 6, nearest: farther })[0]?.message).toBe(
      'The spectrum lies 6.0 dB from the last one kept here: check that the point is the right one.',
    );
  });

  it('another record of the point within a minute', () => {
    expect(codes(1, { nearestRecordS: 60 })).toEqual(['SAME_TIME']);
    expect(codes(1, { nearestRecordS: 61 })).toEqual([]);
  });
});

describe('doubts about the clock', () => {
  const now = Date.parse('2026-02-03T12:00Z');
  it.each([
    ['2026-02-03T12:04Z', []],
    ['2026-02-03T12:06Z', ['CLOCK_AHEAD']],
    ['2025-01-01T12:00Z', []],
    ['2024-12-29T12:00Z', ['CLOCK_OLD']],
  ])('%s', (takenAt, wanted) => {
    expect(clockDoubts(Date.parse(takenAt), now).map(({ code }) => code)).toEqual(wanted);
  });
});
