import type { ReactNode } from 'react';
import type { Metadata } from 'next';
import { PageHead } from '@/components/ui/page-head';
import { formatDate } from '@/lib/format';
import type { Actor } from '@/lib/schemas/actor';
import { requireActor } from '@/lib/server/actor';
import { narrowed } from '@/lib/server/chosen-site';
import { clockNow } from '@/lib/server/clock';
import { balanceJobs } from '@/lib/server/queries/balance-jobs';
import { dueBoard } from '@/lib/server/queries/due-board';
import { inTray } from '@/lib/server/queries/in-tray';
import { recentChanges } from '@/lib/server/queries/recent-changes';
import { ChangesPanel, EventsPanel } from './_today/changes-panels';
import { DuePanel } from './_today/due-panel';
import { OpenJobsPanel, WaitingPanel } from './_today/waiting-panels';
import { todaySections, type TodaySection } from './_today/sections';

export const metadata: Metadata = { title: 'Today' };

/** What has changed and what waits, in the order of the role that looks. */
export default async function TodayPage() {
  const actor = await narrowed(await requireActor());
  const panels = await panelsOf(actor);
  const site = actor.sites.length === 1 ? actor.sites[0] : undefined;
  const date = formatDate(clockNow(), actor.sites[0]?.timeZone ?? 'UTC');
  return (
    <>
      <PageHead title="Today" note={`${date}, ${site?.name ?? 'all your sites'}`} />
      <div className="grid items-start gap-4 sm:gap-5 xl:grid-cols-2">
        {todaySections(actor.role).map((section) => (
          <div key={section} className="min-w-0">
            {panels[section]}
          </div>
        ))}
      </div>
    </>
  );
}

async function panelsOf(actor: Actor): Promise<Record<TodaySection, ReactNode>> {
  const decimalMark = actor.sites[0]?.decimalMark ?? '.';
  const [board, jobs, tray, recent] = await Promise.all([
    dueBoard(actor, undefined),
    balanceJobs(actor, undefined),
    inTray(actor, { state: 'open' }),
    recentChanges(actor, undefined),
  ]);
  return {
    due: <DuePanel board={board} decimalMark={decimalMark} />,
    jobs: <OpenJobsPanel jobs={jobs.filter(({ closedAt }) => closedAt === null)} />,
    waiting: <WaitingPanel tray={tray} />,
    changes: <ChangesPanel recent={recent} decimalMark={decimalMark} />,
    events: <EventsPanel recent={recent} />,
  };
}
