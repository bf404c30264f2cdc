import type { Metadata } from 'next';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { PageHead } from '@/components/ui/page-head';
import { Panel } from '@/components/ui/panel';
import { Tabs } from '@/components/ui/tabs';
import { allows } from '@/lib/domain/access/permissions';
import { formatCount } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { InTrayDto, InTrayFilter } from '@/lib/schemas/in-tray';
import { requireActor } from '@/lib/server/actor';
import { narrowed } from '@/lib/server/chosen-site';
import { inTray } from '@/lib/server/queries/in-tray';
import { UploadTable } from './upload-table';

export const metadata: Metadata = { title: 'In-tray' };

type Search = { searchParams: Promise<{ state?: string }> };

export default async function InTrayPage({ searchParams }: Search) {
  const actor = await narrowed(await requireActor());
  const state = stateOf((await searchParams).state);
  const tray = await inTray(actor, { state });
  const mayUpload = allows(actor.role, 'measurement:upload');
  const { waiting, held } = tray.counts;
  return (
    <>
      <PageHead
        title="In-tray"
        note={`${held} held, ${waiting} waiting to be confirmed`}
        actions={
          mayUpload && (
            <LinkButton href={routes.newUpload()} variant="primary">
              Upload files
            </LinkButton>
          )
        }
      />
      <Tabs label="Which files are shown" tabs={tabsOf(tray, state)} />
      {tray.rows.length === 0 ? (
        <Nothing tray={tray} mayUpload={mayUpload} />
      ) : (
        <Panel title="Files" note={formatCount(tray.rows.length, tray.found)}>
          <UploadTable
            rows={tray.rows}
            mayDecide={allows(actor.role, 'measurement:decide')}
            decimalMark={actor.sites[0]?.decimalMark ?? '.'}
          />
        </Panel>
      )}
    </>
  );
}

const STATES = [
  { state: 'open', label: 'Open' },
  { state: 'held', label: 'Held' },
  { state: 'waiting', label: 'Waiting' },
  { state: 'kept', label: 'Kept' },
  { state: 'withdrawn', label: 'Withdrawn' },
  { state: 'all', label: 'All' },
] as const;

function stateOf(text: string | undefined): InTrayFilter['state'] {
  return STATES.find(({ state }) => state === text)?.state ?? 'open';
}

function tabsOf({ counts }: InTrayDto, current: InTrayFilter['state']) {
  const { waiting, held, kept, withdrawn } = counts;
  const all = { ...counts, open: waiting + held, all: waiting + held + kept + withdrawn };
  return STATES.map(({ state, label }) => ({
    label,
    href: routes.inTray(state === 'open' ? '' : `?state=${state}`),
    count: all[state],
    current: state === current,
  }));
}

function Nothing({ tray, mayUpload }: { tray: InTrayDto; mayUpload: boolean }) {
  const any = Object.values(tray.counts).some((count) => count > 0);
  const upload = mayUpload && (
    <LinkButton href={routes.newUpload()} variant="primary">
      Upload files
    </LinkButton>
  );
  if (!any)
    return (
      <EmptyState title="No file has come in yet" action={upload}>
        Exports of measuring instruments land here: each is read, shown and confirmed before it
        counts.
      </EmptyState>
    );
  return (
    <EmptyState
      title="Nothing here"
      action={<LinkButton href={routes.inTray('?state=all')}>Show all files</LinkButton>}
    >
      No file of your sites is in this state.
    </EmptyState>
  );
}
