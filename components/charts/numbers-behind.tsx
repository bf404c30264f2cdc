'use client';

import { useState } from 'react';
import { Table, Td, Th } from '@/components/ui/table';
import { formatCount, formatNumber, NOT_MEASURED } from '@/lib/format';
import type { Cell, Numbers } from './chart-types';
import { csvText } from './csv-text';

const MOST_ROWS = 200;

/** The chart's numbers as a table, and all of them as CSV. */
export function NumbersBehind({ title, numbers }: { title: string; numbers: Numbers }) {
  const [open, setOpen] = useState(false);
  return (
    <div className="no-print mt-1 flex flex-wrap items-start gap-x-4">
      <details
        className="min-w-0 open:w-full"
        onToggle={(event) => setOpen(event.currentTarget.open)}
      >
        <summary className="target flex cursor-pointer items-center text-sm text-blue">
          Numbers as a table
        </summary>
        {open && <NumbersTable title={title} numbers={numbers} />}
      </details>
      <button
        type="button"
        className="target cursor-pointer text-sm text-blue hover:underline"
        onClick={() => saveCsv(numbers)}
      >
        Numbers as CSV
      </button>
    </div>
  );
}

function NumbersTable({ title, numbers }: { title: string; numbers: Numbers }) {
  const rows = numbers.rows();
  const shown = rows.slice(0, MOST_ROWS);
  return (
    <div className="max-h-96 overflow-y-auto">
      {rows.length > MOST_ROWS && (
        <p className="text-xs text-ink-soft">
          {formatCount(shown.length, rows.length)} rows; the CSV has them all.
        </p>
      )}
      <Table caption={`${title}, as numbers`}>
        <thead>
          <tr>
            {numbers.head.map((head, column) => (
              <Th key={head} numeric={column > 0}>
                {head}
              </Th>
            ))}
          </tr>
        </thead>
        <tbody>
          {shown.map((row, index) => (
            <tr key={index}>
              {row.map((cell, column) => (
                <Td key={column} numeric={column > 0}>
                  {cellText(cell)}
                </Td>
              ))}
            </tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}

function cellText(cell: Cell): string {
  if (cell === null) return NOT_MEASURED;
  return typeof cell === 'number' ? formatNumber(cell, { significant: 5 }) : cell;
}

function saveCsv(numbers: Numbers) {
  const file = new Blob([csvText(numbers.head, numbers.rows())], {
    type: 'text/csv;charset=utf-8',
  });
  const link = document.createElement('a');
  link.href = URL.createObjectURL(file);
  link.download = `${numbers.fileName}.csv`;
  link.click();
  URL.revokeObjectURL(link.href);
}
