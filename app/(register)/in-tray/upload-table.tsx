import Link from 'next/link';
import { RowKeys } from '@/components/register/row-keys';
import { Badge } from '@/components/ui/badge';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { ZoneStamp } from '@/components/ui/zone-stamp';
import {
  formatBytes,
  formatDateTime,
  formatNumber,
  formatQuantity,
  type DecimalMark,
} from '@/lib/format';
import { routes } from '@/lib/routes';
import type { InTrayRow } from '@/lib/schemas/in-tray';

type UploadTableProps = {
  rows: readonly InTrayRow[];
  mayDecide: boolean;
  decimalMark: DecimalMark;
};

/** Files with what became of them; what is held says why and what can be done. */
export function UploadTable(props: UploadTableProps) {
  return (
    <>
      <ul className="flex flex-col divide-y divide-rule sm:hidden">
        {props.rows.map((row) => (
          <UploadCard key={row.uploadId} {...props} row={row} />
        ))}
      </ul>
      <div className="max-sm:hidden">
        <WideTable {...props} />
      </div>
    </>
  );
}

/** On a phone one under the other: a table would hide what is held and why. */
function UploadCard({ row, mayDecide, decimalMark }: UploadRowProps) {
  const { record, point, site } = row;
  return (
    <li className="flex flex-col gap-1 py-4">
      <span className="flex flex-wrap items-center gap-2">
        <Link className="link font-semibold break-all" href={addressOf(row)}>
          {row.fileName}
        </Link>
        <Badge>{row.state}</Badge>
        {record && <ZoneStamp zone={record.zone} size="small" />}
      </span>
      <span className="text-ink-soft">
        {point ? `${point.machineTag} ${point.label}, ` : ''}
        {formatDateTime(record?.takenAt ?? row.at, site.timeZone)}
        {record?.overallMmS != null && (
          <>, {formatQuantity(record.overallMmS, 'mm/s rms', { decimals: 2, decimalMark })}</>
        )}
      </span>
      <Remarks row={row} />
      {mayDecide && row.state === 'held' && record && <Decide recordId={record.id} />}
    </li>
  );
}

function WideTable({ rows, mayDecide, decimalMark }: UploadTableProps) {
  return (
    <RowKeys>
      <Table caption="Files, held first, then waiting, newest on top">
        <thead>
          <tr>
            <Th>file</Th>
            <Th>state</Th>
            <Th>point</Th>
            <Th>taken</Th>
            <Th numeric>overall, mm/s rms</Th>
            <Th>zone</Th>
            <Th>what there is to say</Th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <UploadRow key={row.uploadId} {...{ row, mayDecide, decimalMark }} />
          ))}
        </tbody>
      </Table>
    </RowKeys>
  );
}

type UploadRowProps = { row: InTrayRow; mayDecide: boolean; decimalMark: DecimalMark };

function UploadRow({ row, mayDecide, decimalMark }: UploadRowProps) {
  const { record, site, point } = row;
  return (
    <tr>
      <RowHead>
        <Link className="link block min-w-44 break-all" href={addressOf(row)}>
          {row.fileName}
        </Link>
        <span className="block text-xs font-normal text-ink-soft">
          {formatBytes(row.sizeBytes, decimalMark)} · {formatDateTime(row.at, site.timeZone)},{' '}
          {row.person}
        </span>
      </RowHead>
      <Td>
        <Badge>{row.state}</Badge>
      </Td>
      <Td>
        {point ? (
          <Link className="link whitespace-nowrap" href={routes.point(point.id)}>
            {point.machineTag} {point.label}
          </Link>
        ) : (
          <span className="text-ink-soft">not said yet</span>
        )}
        <span className="block text-xs text-ink-soft">{site.name}</span>
      </Td>
      <Td className="whitespace-nowrap">
        {record ? formatDateTime(record.takenAt, site.timeZone) : NOT_SAID}
      </Td>
      <Td numeric>{overallText(record, decimalMark)}</Td>
      <Td>{record && <ZoneStamp zone={record.zone} size="small" />}</Td>
      <Td className="min-w-72">
        <Remarks row={row} />
        {mayDecide && row.state === 'held' && record && <Decide recordId={record.id} />}
      </Td>
    </tr>
  );
}

const NOT_SAID = <span className="text-ink-soft">not said yet</span>;

function overallText(record: InTrayRow['record'], decimalMark: DecimalMark) {
  if (!record) return <span className="text-ink-soft">not read yet</span>;
  if (record.overallMmS === null) return <span className="text-ink-soft">not measured</span>;
  return formatNumber(record.overallMmS, { decimals: 2, decimalMark });
}

function Remarks({ row }: { row: InTrayRow }) {
  const { state, record, problem, questions } = row;
  if (state === 'held' && record)
    return (
      <ul className="list-disc pl-4">
        {record.reasons.map(({ code, message }) => (
          <li key={code}>{message}</li>
        ))}
      </ul>
    );
  if (state !== 'waiting') return <span className="text-ink-soft">nothing</span>;
  if (problem !== null) return <>{problem}</>;
  return <>{questions.length === 0 ? 'Ready to be confirmed.' : questions.join(' ')}</>;
}

const DECISIONS = [
  ['keep', 'Keep'],
  ['rehome', 'Re-home'],
  ['line', 'Line through'],
] as const;

function Decide({ recordId }: { recordId: number }) {
  return (
    <span className="mt-1 flex flex-wrap gap-x-4">
      {DECISIONS.map(([decision, label]) => (
        <Link
          key={decision}
          className="link target inline-flex items-center font-semibold"
          href={`${routes.reading(recordId)}?decide=${decision}#decide`}
        >
          {label}
        </Link>
      ))}
    </span>
  );
}

function addressOf({ state, record, uploadId }: InTrayRow): string {
  return record && (state === 'held' || state === 'kept')
    ? routes.reading(record.id)
    : routes.upload(uploadId);
}
