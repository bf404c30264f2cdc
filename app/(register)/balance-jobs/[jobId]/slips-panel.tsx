import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatNumber } from '@/lib/format';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';

const SHOWN = 6;

/** After a check run that was not as predicted: the common slips, best explanation first. */
export function SlipsPanel({ job }: { job: BalanceJobDto }) {
  const { slips, unit, site } = job;
  if (slips.length === 0) return null;
  return (
    <Panel title="What if we slipped?" note="the check run is not as predicted">
      <div className="flex flex-col gap-3">
        <Notice kind="caution" title="Go and look before any more weight goes on">
          Each line supposes one slip and computes the check run again. One that fits is a question
          to whoever was at the machine; nothing is changed by it.
        </Notice>
        <Table caption="Slips supposed, best explanation first" roomy>
          <thead>
            <tr>
              <Th>were it so that …</Th>
              <Th numeric>then the run misses by, {unit}</Th>
              <Th>it</Th>
            </tr>
          </thead>
          <tbody>
            {slips.slice(0, SHOWN).map(({ slip, words, miss, inside }) => (
              <tr key={slip}>
                <RowHead>{words}</RowHead>
                <Td numeric>
                  {formatNumber(miss, { decimals: 2, decimalMark: site.decimalMark })}
                </Td>
                <Td>{explains(inside)}</Td>
              </tr>
            ))}
          </tbody>
        </Table>
      </div>
    </Panel>
  );
}

function explains(inside: boolean | null): string {
  if (inside === null) return 'band not known: compare the misses';
  return inside ? 'explains the run' : 'does not explain it';
}
