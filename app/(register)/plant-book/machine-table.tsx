import Link from 'next/link';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { ZoneStamp } from '@/components/ui/zone-stamp';
import { formatAge, formatDays, formatNumber, NOT_MEASURED, type DecimalMark } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { PlantBookRow } from '@/lib/schemas/register';

type MachineTableProps = { rows: readonly PlantBookRow[]; decimalMark: DecimalMark };

/** The register as a table: one line a machine, ruled by its worst point. */
export function MachineTable({ rows, decimalMark }: MachineTableProps) {
  const now = new Date();
  const number = (value: number | null) =>
    value === null ? NOT_MEASURED : formatNumber(value, { decimals: 2, decimalMark });
  return (
    <Table caption="Machines, worst first">
      <thead>
        <tr>
          <Th>machine</Th>
          <Th>zone</Th>
          <Th numeric>overall, mm/s rms</Th>
          <Th numeric>1x, mm/s rms</Th>
          <Th>worst point</Th>
          <Th>read</Th>
          <Th numeric>days since balance</Th>
          <Th>area</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.id}>
            <RowHead>
              <Link className="link" href={routes.machine(row.id)}>
                {row.tag}
              </Link>{' '}
              <span className="font-normal text-ink-soft">{row.name}</span>
            </RowHead>
            <Td>
              <ZoneStamp zone={row.zone} size="small" />
            </Td>
            <Td numeric>{number(row.overall)}</Td>
            <Td numeric>{number(row.oneX)}</Td>
            <Td>{row.worstPoint ?? ''}</Td>
            <Td>{row.readAt ? formatAge(row.readAt, now) : NOT_MEASURED}</Td>
            <Td numeric>{row.balancedAt ? formatDays(row.balancedAt, now) : 'never'}</Td>
            <Td>
              {row.siteName}, {row.areaName}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
