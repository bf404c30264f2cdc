import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatDate, formatDegrees, formatNumber } from '@/lib/format';
import type { MachinePageDto } from '@/lib/schemas/register';

/** Mark, tacho and rotation by version, and the limits the machine is judged by. */
export function SetupPanel({ machine }: { machine: MachinePageDto }) {
  const { limits } = machine;
  return (
    <Panel title="Set-up and limits">
      <Table caption="Set-ups, newest first">
        <thead>
          <tr>
            <Th>set-up</Th>
            <Th>mark</Th>
            <Th>tacho</Th>
            <Th>rotation from the drive end</Th>
            <Th>from</Th>
            <Th>why</Th>
          </tr>
        </thead>
        <tbody>
          {machine.setups.map((setup) => (
            <tr key={setup.number} className={setup.validTo ? 'text-ink-soft' : ''}>
              <RowHead>{setup.number}</RowHead>
              <Td>{setup.mark}</Td>
              <Td>
                {formatDegrees(setup.tachoDeg)}, {setup.tachoEdge} edge
              </Td>
              <Td>{setup.rotationFromDriveEnd}</Td>
              <Td>{formatDate(setup.validFrom, machine.site.timeZone)}</Td>
              <Td>{setup.reason}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
      <p className="mt-3">
        {limits ? (
          <>
            Judged by {limits.title}, {limits.edition}: A/B{' '}
            <span className="figures">{formatNumber(limits.bAb)}</span>, B/C{' '}
            <span className="figures">{formatNumber(limits.bBc)}</span>, C/D{' '}
            <span className="figures">{formatNumber(limits.bCd)}</span> mm/s rms.{' '}
            <span className="text-ink-soft">{limits.citation}</span>
          </>
        ) : (
          'No limit set is in use: readings get no zone.'
        )}
      </p>
    </Panel>
  );
}
