import Link from 'next/link';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { formatDate, formatNumber, formatPlural, formatQuantity } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import type { LastJobDto } from '@/lib/schemas/balance-job-parts';

/** What to know before the first run: starts, neighbours, deposits, and the last job on this rotor. */
export function BeforeFirstRun({ job }: { job: BalanceJobDto }) {
  const { startsAllowed, startsPlanned, neighbours, lastJob, cleaned } = job;
  return (
    <>
      {startsAllowed !== null && startsPlanned > startsAllowed && (
        <Notice kind="caution" title="More starts are needed than were agreed">
          Base, trials, check and one trim need {formatPlural(startsPlanned, 'start')};{' '}
          {startsAllowed} were agreed. Agree more, read the base repeats in one start, or use the
          coefficient book where it is offered.
        </Notice>
      )}
      {neighbours.length > 0 && (
        <Notice kind="caution" title="A neighbour turns at nearly this speed">
          {neighbours
            .map(({ tag, speedRpm }) => `${tag} (${formatQuantity(speedRpm, 'r/min')})`)
            .join(', ')}
          : the readings can beat slowly. Average over a minute or more, or have it stopped.
        </Notice>
      )}
      {cleaned === 'no' && (
        <Notice kind="caution" title="The rotor was not cleaned">
          Deposits come off again, and the balance goes with them. Clean it first where you can.
        </Notice>
      )}
      {lastJob && <LastJob last={lastJob} timeZone={job.site.timeZone} />}
    </>
  );
}

function LastJob({ last, timeZone }: { last: LastJobDto; timeZone: string }) {
  const size = (value: number | null) =>
    value === null ? 'not read' : `${formatNumber(value)} ${last.unit}`;
  return (
    <Panel title="Since the last job on this rotor">
      <p>
        <Link className="link" href={routes.balanceJob(last.id)}>
          Job {last.number}
        </Link>
        , signed {formatDate(last.closedAt, timeZone)}: 1x from {size(last.before)} to{' '}
        {size(last.after)}.{' '}
        {last.sameSetup
          ? 'Mark, tacho and sensors are the same set-up.'
          : 'The set-up has changed since: its coefficients do not hold here.'}
      </p>
      {last.events.length === 0 ? (
        <p className="text-ink-soft">No event is recorded since.</p>
      ) : (
        <ul className="mt-2">
          {last.events.map((event) => (
            <li key={event.at}>
              {formatDate(event.at, timeZone)} {event.kind}: {event.text}
            </li>
          ))}
        </ul>
      )}
    </Panel>
  );
}
