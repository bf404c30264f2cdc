import Link from 'next/link';
import { RotorFace } from '@/components/rotor-face/rotor-face';
import { EmptyState } from '@/components/ui/empty-state';
import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import {
  formatDate,
  formatLag,
  formatMass,
  formatNumber,
  formatPlural,
  formatQuantity,
  formatRotorAngle,
} from '@/lib/format';
import { routes } from '@/lib/routes';
import type { LedgerPlane, MachinePageDto } from '@/lib/schemas/register';
import { isTrial } from './is-trial';

/** Jobs, what hangs on the rotor, and what was learned: the coefficient book. */
export function BalanceHistory({ machine }: { machine: MachinePageDto }) {
  return (
    <>
      <Panel title="Balance jobs" note={formatPlural(machine.jobs.length, 'job')}>
        <Jobs machine={machine} />
      </Panel>
      <Panel title="Weights ledger" note={machine.rotor?.name}>
        {machine.planes.length === 0 && (
          <p className="text-ink-soft">No correction plane is recorded.</p>
        )}
        <div className="grid gap-6 lg:grid-cols-2">
          {machine.planes.map((plane) => (
            <PlaneLedger key={plane.id} machine={machine} plane={plane} />
          ))}
        </div>
      </Panel>
      <Panel title="Coefficient book" note="influence coefficients by plane and point">
        <Coefficients machine={machine} />
      </Panel>
    </>
  );
}

function Jobs({ machine }: { machine: MachinePageDto }) {
  if (machine.jobs.length === 0)
    return (
      <EmptyState title="Never balanced here">The first job fills ledger and book.</EmptyState>
    );
  return (
    <ul>
      {machine.jobs.map((job) => (
        <li key={job.id}>
          <Link className="link" href={routes.balanceJob(job.id)}>
            Job {job.number}
          </Link>
          , {job.kind}, {job.state},{' '}
          {formatDate(job.closedAt ?? job.openedAt, machine.site.timeZone)}
          {job.closedAt && (
            <>
              {' '}
              <Link className="link" href={routes.jobRecord(job.id)}>
                job record
              </Link>
            </>
          )}
        </li>
      ))}
    </ul>
  );
}

function PlaneLedger({ machine, plane }: { machine: MachinePageDto; plane: LedgerPlane }) {
  const rotation = machine.setups.find(({ validTo }) => validTo === null)?.rotationFromDriveEnd;
  return (
    <div>
      {rotation && (
        <RotorFace
          plane={{
            name: `Plane ${plane.name}`,
            radiusMm: plane.radiusMm,
            rotationFromDriveEnd: rotation === 'clockwise' ? 'cw' : 'ccw',
            positions: plane.positions.length > 0 ? plane.positions : undefined,
            decimalMark: machine.site.decimalMark,
          }}
          weights={plane.weights.map((weight) => ({
            id: weight.id,
            massG: weight.massG,
            angleDeg: weight.angleDeg,
            label: formatDate(weight.fittedAt, machine.site.timeZone),
            state: isTrial(weight) ? ('trial' as const) : ('on' as const),
          }))}
        />
      )}
      <p className="mt-2 text-sm">
        {plane.sum
          ? `Sum: ${formatQuantity(plane.sum.unbalanceGmm, 'g·mm')} at ${formatRotorAngle(plane.sum.angleDeg)}, as one weight ${formatMass(plane.sum.equivalentMassG, machine.site.decimalMark)} at radius ${formatQuantity(plane.radiusMm, 'mm')}.`
          : `Nothing hangs in plane ${plane.name}.`}
        {plane.sum?.cleanUp && ' The weights largely work against each other: clean them up.'}
      </p>
    </div>
  );
}

function Coefficients({ machine }: { machine: MachinePageDto }) {
  if (machine.coefficients.length === 0)
    return <p className="text-ink-soft">Empty: every balance job adds its estimates.</p>;
  return (
    <Table caption="Coefficient book">
      <thead>
        <tr>
          <Th>plane to point</Th>
          <Th numeric>size per kg·mm</Th>
          <Th numeric>lag</Th>
          <Th numeric>r/min</Th>
          <Th numeric>estimates</Th>
          <Th numeric>spread, %</Th>
          <Th>grade</Th>
        </tr>
      </thead>
      <tbody>
        {machine.coefficients.map((line) => (
          <tr key={`${line.planeName} ${line.pointLabel} ${line.unit} ${line.speedRpm}`}>
            <RowHead>
              {line.planeName} to {line.pointLabel}
            </RowHead>
            <Td numeric>{formatQuantity(line.sizePerKgMm, line.unit)}</Td>
            <Td numeric>{formatLag(line.deg)}</Td>
            <Td numeric>{formatNumber(line.speedRpm)}</Td>
            <Td numeric>{line.count}</Td>
            <Td numeric>
              {line.spreadPct === null ? 'one estimate' : formatNumber(line.spreadPct)}
            </Td>
            <Td>{line.grade}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
