import Link from 'next/link';
import { MachineTrain } from '@/components/rotor-face/machine-train';
import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { ZoneStamp } from '@/components/ui/zone-stamp';
import { formatAge, formatLag, formatNumber, NOT_MEASURED } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { MachinePageDto } from '@/lib/schemas/register';
import { HeadFacts } from './head-facts';

type StandingProps = { machine: MachinePageDto; mayUpload: boolean };

/** Who it is and how it stands: the worst point, what hangs on the rotor, every point's stamp. */
export function Standing({ machine, mayUpload }: StandingProps) {
  return (
    <>
      <HeadFacts machine={machine} />
      <Panel title="The machine from the side">
        <MachineTrain
          name={`${machine.tag} ${machine.name}`}
          drive={machine.drive}
          overhung={machine.rotor?.overhung ?? false}
          bearings={machine.bearings.map((bearing) => ({
            id: bearing.id,
            label: bearing.label,
            part: bearing.place,
            points: machine.points
              .filter(({ bearingId }) => bearingId === bearing.id)
              .map(({ id, label, zone }) => ({ id, label, zone, href: routes.point(id) })),
          }))}
        />
        <PointsTable machine={machine} mayUpload={mayUpload} />
      </Panel>
    </>
  );
}

function PointsTable({ machine, mayUpload }: StandingProps) {
  const now = new Date();
  const number = (value: number | null) =>
    value === null
      ? NOT_MEASURED
      : formatNumber(value, { decimals: 2, decimalMark: machine.site.decimalMark });
  return (
    <div className="mt-4">
      <Table caption="What each point says" captionShown>
        <thead>
          <tr>
            <Th>point</Th>
            <Th>zone</Th>
            <Th numeric>overall, mm/s rms</Th>
            <Th numeric>1x, mm/s rms</Th>
            <Th numeric>lag</Th>
            <Th>read</Th>
            <Th>evidence</Th>
          </tr>
        </thead>
        <tbody>
          {machine.points.map((point) => (
            <tr key={point.id}>
              <RowHead>
                <Link className="link" href={routes.point(point.id)}>
                  {point.label}
                </Link>
              </RowHead>
              <Td>
                <ZoneStamp zone={point.zone} size="small" />
              </Td>
              <Td numeric>{number(point.overall)}</Td>
              <Td numeric>{number(point.oneX)}</Td>
              <Td numeric>{point.lagDeg === null ? 'no phase' : formatLag(point.lagDeg)}</Td>
              <Td>{point.readAt ? formatAge(point.readAt, now) : NOT_MEASURED}</Td>
              <Td>
                {point.recordId !== null && (
                  <Link className="link" href={routes.reading(point.recordId)}>
                    latest record
                  </Link>
                )}{' '}
                {mayUpload && (
                  <Link className="link" href={routes.newUpload(`?point=${point.id}`)}>
                    upload
                  </Link>
                )}
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}
