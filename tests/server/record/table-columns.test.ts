import { describe, expect, it } from 'vitest';
import { columnWidths } from '@/lib/server/pdf/table-columns';
import { wrapWords } from '@/lib/server/pdf/wrap-words';

const measure = (text: string) => text.length;

describe('columns of a printed table', () => {
  it('fill the width where there is room', () => {
    const widths = columnWidths(
      [
        { natural: 10, least: 5 },
        { natural: 30, least: 5 },
      ],
      80,
    );
    expect(widths).toEqual([20, 60]);
  });

  it('wrap the long remark before the name', () => {
    const wishes = [
      { natural: 20, least: 10 },
      { natural: 500, least: 10 },
    ];
    expect(columnWidths(wishes, 100)).toEqual([20, 80]);
  });

  it('never ask for more than the page has', () => {
    const widths = columnWidths(
      Array.from({ length: 9 }, () => ({ natural: 90, least: 30 })),
      180,
    );
    expect(widths.reduce((sum, width) => sum + width, 0)).toBeCloseTo(180, 9);
  });
});

describe('words of a cell', () => {
  it('break at blanks only: a unit and its number stay whole', () => {
    expect(wrapWords('miss, mm/s rms', 7, measure)).toEqual(['miss,', 'mm/s', 'rms']);
    expect(wrapWords('at 124° against', 9, measure)).toEqual(['at 124°', 'against']);
  });

  it('break a word that is longer than a line, and lose none of it', () => {
    expect(wrapWords('a 0123456789ab b', 6, measure).join('').replace(/ /g, '')).toBe(
      'a0123456789abb',
    );
  });
});
