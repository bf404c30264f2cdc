import Link from 'next/link';
import { Panel } from '@/components/ui/panel';
import { ZoneStamp } from '@/components/ui/zone-stamp';
import {
  formatAge,
  formatDate,
  formatNumber,
  formatQuantity,
  type DecimalMark,
} from '@/lib/format';
import { routes } from '@/lib/routes';
import type { RecentChangesDto, RecentEvent, ZoneChange } from '@/lib/schemas/recent-changes';

type ChangesPanelProps = { recent: RecentChangesDto; decimalMark: DecimalMark };

/** Machines that passed a zone boundary, the worse first. */
export function ChangesPanel({ recent, decimalMark }: ChangesPanelProps) {
  const { worse, better, days } = recent;
  return (
    <Panel title="Zones passed" note={`in the last ${String(days)} days`}>
      {worse.length + better.length === 0 ? (
        <p className="text-ink-soft">No machine passed a zone boundary.</p>
      ) : (
        <>
          <ChangeList words="for the worse" changes={worse} decimalMark={decimalMark} />
          <ChangeList words="for the better" changes={better} decimalMark={decimalMark} />
        </>
      )}
    </Panel>
  );
}

type ChangeListProps = {
  words: string;
  changes: readonly ZoneChange[];
  decimalMark: DecimalMark;
};

function ChangeList({ words, changes, decimalMark }: ChangeListProps) {
  const now = new Date();
  const options = { decimals: 2, decimalMark };
  if (changes.length === 0) return null;
  return (
    <section className="not-first:mt-4">
      <h3 className="text-xs text-ink-soft">{words}</h3>
      <ul className="flex flex-col divide-y divide-rule">
        {changes.map((change) => (
          <li
            key={change.machineId}
            className="flex flex-wrap items-center gap-x-3 gap-y-1 py-2 max-sm:py-3"
          >
            <span className="flex items-center gap-1.5">
              <ZoneStamp zone={change.before.zone} size="small" />
              <span aria-label="to">→</span>
              <ZoneStamp zone={change.after.zone} size="small" />
            </span>
            <span className="min-w-0 grow">
              <Link className="link font-semibold" href={routes.machine(change.machineId)}>
                {change.tag}
              </Link>{' '}
              {change.name}, {change.pointLabel}
            </span>
            <Link className="link figures text-sm" href={routes.reading(change.recordId)}>
              {formatNumber(change.before.value, options)} →{' '}
              {formatQuantity(change.after.value, 'mm/s rms', options)}
            </Link>
            <span className="text-sm text-ink-soft">{formatAge(change.at, now)}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}

/** What was entered about machines of late. */
export function EventsPanel({ recent }: { recent: RecentChangesDto }) {
  const { events, days } = recent;
  return (
    <Panel title="On the machines" note={`in the last ${String(days)} days`}>
      {events.length === 0 ? (
        <p className="text-ink-soft">Nothing was entered.</p>
      ) : (
        <ul className="flex flex-col divide-y divide-rule">
          {events.map((event) => (
            <EventLine key={event.id} event={event} />
          ))}
        </ul>
      )}
    </Panel>
  );
}

function EventLine({ event }: { event: RecentEvent }) {
  return (
    <li className="py-2">
      <p>
        <Link className="link font-semibold" href={routes.machine(event.machineId)}>
          {event.tag}
        </Link>{' '}
        {event.kind}: {event.text}
      </p>
      <p className="text-sm text-ink-soft">
        {formatDate(event.at, event.timeZone)}, {event.person}
        {event.balanceJobId !== null && (
          <>
            {', '}
            <Link className="link" href={routes.jobRecord(event.balanceJobId)}>
              job record
            </Link>
          </>
        )}
      </p>
    </li>
  );
}
