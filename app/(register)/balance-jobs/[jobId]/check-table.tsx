import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatLag, formatNumber, formatQuantity } from '@/lib/format';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';

/** The last check run beside the base and beside what was predicted. */
export function CheckTable({ job }: { job: BalanceJobDto }) {
  if (!job.check) return null;
  return (
    <Table caption="Check run against base and prediction" captionShown>
      <thead>
        <tr>
          <Th>point</Th>
          <Th numeric>base, {job.unit}</Th>
          <Th numeric>now, {job.unit}</Th>
          <Th numeric>reduction</Th>
          <Th numeric>predicted, {job.unit}</Th>
          <Th numeric>miss, {job.unit}</Th>
          <Th>verdict</Th>
        </tr>
      </thead>
      <tbody>
        {job.check.points.map((point) => (
          <tr key={point.pointId}>
            <RowHead>{point.label}</RowHead>
            <Td numeric>{formatNumber(point.before)}</Td>
            <Td numeric>
              {formatNumber(point.now)} at {formatLag(point.lagDeg)}
            </Td>
            <Td numeric>{formatQuantity(point.reductionPct, '%', { decimals: 1 })}</Td>
            <Td numeric>
              {point.predicted
                ? `${formatNumber(point.predicted.amplitude)} at ${formatLag(point.predicted.lagDeg)}`
                : 'none'}
            </Td>
            <Td numeric>{point.miss === null ? 'none' : formatNumber(point.miss)}</Td>
            <Td>{verdictOf(point)}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

type Verdict = { miss: number | null; band: number | null; reductionPct: number };

function verdictOf(point: Verdict): string {
  const expected = expectationOf(point);
  return point.reductionPct < 0 ? `worse than the base; ${expected}` : expected;
}

function expectationOf(point: Verdict): string {
  if (point.miss === null) return 'no prediction';
  if (point.band === null) return 'band not known';
  return point.miss <= point.band ? 'as predicted' : 'not as predicted: look for a slip';
}
