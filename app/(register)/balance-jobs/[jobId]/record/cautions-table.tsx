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
            <Th>step</Th>
            <Th>cautions</Th>
            <Th>named at the machine</Th>
            <Th>ticked by</Th>
            <Th>time</Th>
          </tr>
        </thead>
        <tbody>
          {byStep(cautions).map((line) => (
            <tr key={`${line.step} ${line.at}`}>
              <RowHead>{line.step}</RowHead>
              <Td>{line.cautionIds.join(', ')}</Td>
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

type StepLine = Omit<CautionLine, 'cautionId'> & { cautionIds: string[] };

/** Cautions ticked together stand in one line. */
function byStep(cautions: readonly CautionLine[]): StepLine[] {
  const lines: StepLine[] = [];
  for (const { cautionId, ...rest } of cautions) {
    const last = lines.at(-1);
    if (last?.step === rest.step && last.at === rest.at) last.cautionIds.push(cautionId);
    else lines.push({ ...rest, cautionIds: [cautionId] });
  }
  return lines;
}
