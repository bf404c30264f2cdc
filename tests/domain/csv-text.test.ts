import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { csvText } from '@/components/charts/csv-text';

describe('numbers as CSV', () => {
  it('keeps every digit and leaves what was not measured empty', () => {
    expect(csvText(['time, s', 'value'], [[0.1 + 0.2, null]])).toBe(
      '"time, s",value\r\n0.30000000000000004,\r\n',
    );
  });

  it('reads back as it was written', () => {
    const rows = [
      ['a "quoted" word', 'two\nlines'],
      ['comma, inside', '-1.5e-7'],
    ];
    const { data } = Papa.parse(csvText(['one', 'two'], rows).trimEnd());
    expect(data).toEqual([['one', 'two'], ...rows]);
  });
});
