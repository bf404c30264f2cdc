import Link from 'next/link';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import type { ReportCell, ReportRow, ReportTable } from '@/lib/schemas/report';

/** A table of a report; a row that was lined through stays readable. */
export function ReportTableView({ table }: { table: ReportTable }) {
  return (
    <Table caption={table.caption} captionShown>
      <thead>
        <tr>
          {table.columns.map(({ label, numeric }, index) => (
            <Th key={index} numeric={numeric}>
              {label}
            </Th>
          ))}
        </tr>
      </thead>
      <tbody>
        {table.rows.map((row, index) => (
          <Row key={index} row={row} columns={table.columns} />
        ))}
      </tbody>
    </Table>
  );
}

type RowProps = { row: ReportRow; columns: ReportTable['columns'] };

function Row({ row, columns }: RowProps) {
  const [head, ...rest] = row.cells;
  return (
    <tr className={row.struck ? 'text-ink-soft line-through' : ''}>
      <RowHead>{head !== undefined && <Cell cell={head} />}</RowHead>
      {rest.map((cell, index) => (
        <Td key={index} numeric={columns[index + 1]?.numeric} className="print:whitespace-normal">
          <Cell cell={cell} />
        </Td>
      ))}
    </tr>
  );
}

function Cell({ cell }: { cell: ReportCell }) {
  if (typeof cell === 'string') return cell;
  return (
    <Link className="link" href={cell.href}>
      {cell.text}
    </Link>
  );
}
