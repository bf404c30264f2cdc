import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { DecimalMark, Delimiter, LayoutColumn } from '@/lib/domain/intake/column-layout';
import { NumberCursor } from '@/lib/domain/intake/number-cursor';
import { readIrregularColumns } from '@/lib/domain/intake/read-irregular-columns';
import {
  readNumberColumns,
  type NumberColumns,
  type TablePlan,
} from '@/lib/domain/intake/read-number-columns';
import type { IntakeFailure } from '@/lib/domain/intake/intake-failure';
import type { Result } from '@/lib/domain/result';

const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);

const column = (index: number, role: LayoutColumn['role'], name: string): LayoutColumn => ({
  index,
  role,
  name,
  quantity: null,
  unit: null,
});

const planOf = (
  delimiter: Delimiter = ',',
  mark: DecimalMark = 'point',
  columns = [column(0, 'time', 'time_s'), column(1, 'signal', 'a')],
): TablePlan => ({ fileName: 'x.csv', delimiter, mark, columns, firstRow: 1 });

const plain = (result: Result<NumberColumns, IntakeFailure>) =>
  result.ok
    ? { rows: result.value.rows, values: [...result.value.values].map(([i, v]) => [i, ...v]) }
    : result.failure;

function bothWays(text: string, plan: TablePlan) {
  const bulk = plain(readNumberColumns(bytesOf(text), plan));
  expect(plain(readIrregularColumns(text, plan))).toEqual(bulk);
  return bulk;
}

describe('numbers from bytes', () => {
  const read = (text: string, mark = 46): number => new NumberCursor(bytesOf(text), mark).read();
  const finite = fc.double({ noNaN: true, noDefaultInfinity: true });

  it('are those of Number(text), to the last bit', () => {
    const spelt = fc.oneof(
      finite.map(String),
      finite.map((x) => x.toExponential()),
      fc.tuple(finite, fc.integer({ min: 1, max: 21 })).map(([x, d]) => x.toPrecision(d)),
      fc
        .tuple(fc.double({ min: -1e6, max: 1e6, noNaN: true }), fc.integer({ min: 0, max: 20 }))
        .map(([x, d]) => x.toFixed(d)),
      fc.stringMatching(/^[+-]?\d{1,25}(\.\d{0,25})?(e[+-]?\d{1,3})?$/),
    );
    fc.assert(
      fc.property(spelt, (text) => {
        expect(read(text)).toBe(Number(text));
        expect(read(text.replace('.', ','), 44)).toBe(Number(text));
      }),
      { numRuns: 3000 },
    );
  });

  it.each(['', ' ', '-', '.', 'abc', 'e5', '+.e1', 'NaN'])('are not found in "%s"', (text) => {
    expect(read(text)).toBeNaN();
  });

  it('leave the position behind the number and its spaces', () => {
    const cursor = new NumberCursor(bytesOf('  1.5e  ,2'), 46);
    expect(cursor.read()).toBe(1.5);
    expect(cursor.position).toBe(5);
    cursor.position = 9;
    expect(cursor.read()).toBe(2);
  });
});

describe('number columns', () => {
  const cell = fc.oneof(
    { weight: 12, arbitrary: fc.double({ min: -1e8, max: 1e8, noNaN: true }).map(String) },
    fc.constantFrom('', 'abc', 'NaN', '-inf', '1e9', ' 7 ', '1.2.3', '0x10', '5 5', '1,5', '#'),
  );
  const line = fc.oneof(
    { weight: 8, arbitrary: fc.tuple(cell, cell).map((cells) => cells.join(';')) },
    fc.constantFrom('', '  ', '# note', '1;2;3', '1', ';'),
  );

  it('come out the same from both readers, values and failures alike', () => {
    fc.assert(
      fc.property(
        fc.array(line, { maxLength: 12 }),
        fc.constantFrom('\n', '\r\n'),
        fc.boolean(),
        (lines, feed, ends) => {
          fc.pre(lines.length > 0);
          bothWays(lines.join(feed) + (ends ? feed : ''), planOf(';'));
        },
      ),
      { numRuns: 2000 },
    );
  });

  it('come back as they were printed', () => {
    // Printing drops the sign of zero; adding zero does the same.
    const value = fc.double({ min: -1e8, max: 1e8, noNaN: true }).map((x) => x + 0);
    fc.assert(
      fc.property(
        fc.array(fc.tuple(value, value), { minLength: 1, maxLength: 50 }),
        fc.constantFrom<[Delimiter, DecimalMark]>([',', 'point'], [';', 'comma'], ['\t', 'comma']),
        (pairs, [delimiter, mark]) => {
          const print = (x: number): string =>
            mark === 'comma' ? String(x).replace('.', ',') : String(x);
          const text = pairs.map((pair) => pair.map(print).join(delimiter ?? '')).join('\n');
          expect(bothWays(text, planOf(delimiter, mark))).toEqual({
            rows: pairs.length,
            values: [
              [0, ...pairs.map(([t]) => t)],
              [1, ...pairs.map(([, a]) => a)],
            ],
          });
        },
      ),
    );
  });

  it.each([
    ['0,1\n1,abc\n', 'NOT_A_NUMBER', 2, 'a', 'abc'],
    ['0,1\n1,\n', 'EMPTY_CELL', 2, 'a', ''],
    ['0,1\nNaN,2\n', 'NOT_FINITE', 2, 'time_s', 'NaN'],
    ['0,1\n1,-Inf\n', 'NOT_FINITE', 2, 'a', '-Inf'],
    ['0,1\n1,1000000000\n', 'ABSURD_VALUE', 2, 'a', '1000000000'],
    ['0,1\n1,1e999\n', 'ABSURD_VALUE', 2, 'a', '1e999'],
    ['0,1\n1\n', 'RAGGED_ROW', 2, undefined, undefined],
    ['0,1\n1,2,3\n', 'RAGGED_ROW', 2, undefined, undefined],
    ['0,1\n\n1,2\n', 'EMPTY_ROW', 2, undefined, undefined],
  ])('name the place of a fault in %j', (text, code, row, name, value) => {
    const failure = bothWays(text, planOf());
    expect(failure).toMatchObject({ code, row });
    expect(failure).toEqual(
      expect.objectContaining(name === undefined ? {} : { column: name, value }),
    );
    const message = 'message' in failure ? failure.message : '';
    expect(message).toContain(`x.csv, row ${row}`);
  });

  it('skip ignored columns whatever they hold, comments and empty rows at the end', () => {
    const columns = [column(0, 'ignore', 'when'), column(1, 'signal', 'a')];
    const text = '# note\n12:00 noon,1\n# more\n,2\n\n  \n';
    expect(bothWays(text, planOf(',', 'point', columns))).toEqual({ rows: 2, values: [[1, 1, 2]] });
  });

  it('accept times of any size and refuse a file that is too long', () => {
    expect(bothWays('1.7e9,1\n1.7e10,2\n', planOf())).toMatchObject({ rows: 2 });
    const long = new Uint8Array(10_000_001).fill(10);
    expect(plain(readNumberColumns(long, planOf()))).toMatchObject({ code: 'TOO_MANY_ROWS' });
  });
});
