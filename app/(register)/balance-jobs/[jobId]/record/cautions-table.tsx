import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatDateTime } from '@/lib/format';
import type { CautionLine } from '@/lib/server/queries/job-record';

type CautionsTableProps = { cautions: readonly CautionLine[]; timeZone: string };

/** Which cautions were ticked, at which step, and who was named at the machine. */
export function CautionsTable({ cautions, timeZone }: CautionsTableProps) {
  return (
    <Panel title="Cautions confirmed">
      <Table caption="Cautions confirmed">
        <thead>
          <tr>
            <Th>caution</Th>
            <Th>step</Th>
            <Th>named at the machine</Th>
            <Th>ticked by</Th>
            <Th>time</Th>
          </tr>
        </thead>
        <tbody>
          {cautions.map((line, index) => (
            <tr key={index}>
              <RowHead>{line.cautionId}</RowHead>
              <Td>{line.step}</Td>
              <Td>{line.namedPerson ?? 'not asked'}</Td>
              <Td>{line.person}</Td>
              <Td>{formatDateTime(line.at, timeZone)}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </Panel>
  );
}
