import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatNumber, formatRotorAngle } from '@/lib/format';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';

/** Residual unbalance after the job against ISO 21940-11: an estimate in place, with its uncertainty. */
export function ToleranceTable({ job }: { job: BalanceJobDto }) {
  const { tolerance } = job;
  if (!tolerance) return null;
  return (
    <Panel
      title="Estimate in place"
      note={`balance quality grade G ${tolerance.grade}, permissible ${formatNumber(tolerance.permissibleGmm)} g·mm (ISO 21940-11)`}
    >
      <Table caption="Residual unbalance">
        <thead>
          <tr>
            <Th>plane</Th>
            <Th numeric>residual, g·mm</Th>
            <Th numeric>at</Th>
            <Th numeric>uncertainty, g·mm</Th>
            <Th numeric>permissible, g·mm</Th>
            <Th>verdict</Th>
          </tr>
        </thead>
        <tbody>
          {tolerance.planes.map((plane) => (
            <tr key={plane.name}>
              <RowHead>{plane.name}</RowHead>
              <Td numeric>{formatNumber(plane.residualGmm)}</Td>
              <Td numeric>{formatRotorAngle(plane.residualDeg)}</Td>
              <Td numeric>
                {plane.uncertaintyGmm === null ? 'not known' : formatNumber(plane.uncertaintyGmm)}
              </Td>
              <Td numeric>{formatNumber(plane.permissibleGmm)}</Td>
              <Td>{plane.verdict}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
      <p className="mt-2 text-xs text-ink-soft">
        From the coefficients of this job, not from a balancing machine; vibration limits are a
        separate verdict.
      </p>
    </Panel>
  );
}
