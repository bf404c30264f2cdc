import Link from 'next/link';
import { EmptyState } from '@/components/ui/empty-state';
import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { ZoneStamp } from '@/components/ui/zone-stamp';
import { formatDateTime, formatLag, formatNumber, formatPlural, NOT_MEASURED } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { PointPageDto } from '@/lib/schemas/register';

/** Every record of a point; held and lined-through ones stay in sight, quieter. */
export function RecordTable({ point }: { point: PointPageDto }) {
  const { records, site } = point;
  if (records.length === 0)
    return <EmptyState title="No record yet">Upload a waveform of this point to begin.</EmptyState>;
  const number = (value: number | null) =>
    value === null
      ? NOT_MEASURED
      : formatNumber(value, { decimals: 2, decimalMark: site.decimalMark });
  return (
    <Panel title="Records" note={formatPlural(records.length, 'record')}>
      <Table caption="Records, newest first">
        <thead>
          <tr>
            <Th>taken</Th>
            <Th>zone</Th>
            <Th numeric>overall, mm/s rms</Th>
            <Th numeric>1x, mm/s rms</Th>
            <Th numeric>lag</Th>
            <Th numeric>r/min</Th>
            <Th>what</Th>
          </tr>
        </thead>
        <tbody>
          {records.map((record) => (
            <tr key={record.id} className={record.state === 'kept' ? '' : 'text-ink-soft'}>
              <RowHead>
                <Link className="link" href={routes.reading(record.id)}>
                  {formatDateTime(record.takenAt, site.timeZone)}
                </Link>
              </RowHead>
              <Td>{record.state === 'kept' && <ZoneStamp zone={record.zone} size="small" />}</Td>
              <Td numeric>{number(record.overall)}</Td>
              <Td numeric>{number(record.oneX)}</Td>
              <Td numeric>{record.lagDeg === null ? 'no phase' : formatLag(record.lagDeg)}</Td>
              <Td numeric>
                {record.speedRpm === null ? 'not known' : formatNumber(record.speedRpm)}
              </Td>
              <Td>
                {record.source}
                {record.state !== 'kept' && `, ${record.state}`}
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </Panel>
  );
}
