import Link from 'next/link';
import { PointTrend } from '@/components/register/point-trend';
import { Panel } from '@/components/ui/panel';
import { formatDate } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { MachinePageDto } from '@/lib/schemas/register';
import { EventForm } from './event-form';

type ChangedProps = { machine: MachinePageDto; mayRecord: boolean };

/** What has changed: the worst point's trend, and what happened to the machine. */
export function Changed({ machine, mayRecord }: ChangedProps) {
  const pointId = machine.worst?.pointId ?? machine.points[0]?.id;
  const point = machine.points.find(({ id }) => id === pointId);
  return (
    <Panel
      title="What has changed"
      note={point && `${point.label}, the worst point`}
      actions={mayRecord && <EventForm machineId={machine.id} />}
    >
      {point ? (
        <PointTrend
          pointId={point.id}
          name={`${machine.tag} ${point.label}`}
          machineId={machine.id}
          site={machine.site}
        />
      ) : (
        <p className="text-ink-soft">No point is recorded yet.</p>
      )}
      <h3 className="mt-4 text-sm font-semibold">Events</h3>
      {machine.events.length === 0 && <p className="text-ink-soft">None recorded.</p>}
      <ul>
        {machine.events.slice(0, 8).map((event) => (
          <li key={event.id}>
            <span className="figures text-ink-soft">
              {formatDate(event.at, machine.site.timeZone)}
            </span>{' '}
            {event.balanceJobId === null ? (
              event.text
            ) : (
              <Link className="link" href={routes.balanceJob(event.balanceJobId)}>
                {event.text}
              </Link>
            )}{' '}
            <span className="text-ink-soft">{event.person}</span>
          </li>
        ))}
      </ul>
    </Panel>
  );
}
