import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatDegrees, formatLag, formatMass, formatQuantity } from '@/lib/format';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import { stillToHang } from './still-to-hang';

/** Before the check run is started: what was recorded beside what was asked for, and what to expect. */
export function AsFittedPanel({ job }: { job: BalanceJobDto }) {
  const { asFitted, site, unit } = job;
  if (!asFitted) return null;
  const { decimalMark } = site;
  const isUnfinished = (planeName: string) => {
    const plane = job.planes.find(({ name }) => name === planeName);
    return plane !== undefined && stillToHang(job, plane.id).length > 0;
  };
  const place = (grams: number, deg: number) =>
    `${formatMass(grams, decimalMark)} at ${formatDegrees(deg, 0, decimalMark)}`;
  return (
    <Panel title="As recorded" note="degrees against rotation">
      <div className="flex flex-col gap-3">
        {asFitted.planes.some(({ isFar, planeName }) => isFar && !isUnfinished(planeName)) && (
          <Notice kind="failure" title="This is not where the answer asks for it">
            Go and look before the start. If it hangs elsewhere than recorded, take it off in the
            ledger below and record it where it hangs; if it hangs there, move it.
          </Notice>
        )}
        <Table caption="Asked for and recorded" roomy>
          <thead>
            <tr>
              <Th>plane</Th>
              <Th numeric>asked for</Th>
              <Th numeric>recorded</Th>
              <Th>it is</Th>
            </tr>
          </thead>
          <tbody>
            {asFitted.planes.map((plane) => (
              <tr key={plane.planeName}>
                <RowHead>{plane.planeName}</RowHead>
                <Td numeric>{place(plane.askedG, plane.askedDeg)}</Td>
                <Td numeric>{place(plane.fittedG, plane.fittedDeg)}</Td>
                <Td>
                  {isUnfinished(plane.planeName)
                    ? 'not all of the plan yet'
                    : nearness(plane.isFar)}
                </Td>
              </tr>
            ))}
          </tbody>
        </Table>
        <p>
          Expected in the check run:{' '}
          {asFitted.expected
            .map(
              ({ label, amplitude, lagDeg }) =>
                `${label} ${formatQuantity(amplitude, unit, { decimals: 2, decimalMark })} at ${formatLag(lagDeg)}`,
            )
            .join('; ')}
          .
        </p>
      </div>
    </Panel>
  );
}

function nearness(isFar: boolean): string {
  return isFar ? 'far from what was asked for' : 'near enough';
}
