import type { Metadata } from 'next';
import Link from 'next/link';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { PageHead } from '@/components/ui/page-head';
import { Panel } from '@/components/ui/panel';
import { Tabs } from '@/components/ui/tabs';
import { allows } from '@/lib/domain/access/permissions';
import { LANES } from '@/lib/domain/due/lane';
import { formatPlural } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { UnrankedMachine } from '@/lib/schemas/due-board';
import { requireActor } from '@/lib/server/actor';
import { narrowed } from '@/lib/server/chosen-site';
import { dueBoard } from '@/lib/server/queries/due-board';
import type { BoardView } from './board-view';
import { laneFrom, laneQuery } from './lane-search';
import { LanePanel } from './lane-panel';

export const metadata: Metadata = { title: 'Due board' };

type Props = { searchParams: Promise<{ lane?: string | string[] }> };

export default async function DueBoardPage({ searchParams }: Props) {
  const actor = await narrowed(await requireActor());
  const chosen = laneFrom((await searchParams).lane);
  const { cards, unranked, asOf } = await dueBoard(actor, undefined);
  const inLane = (lane: string) => cards.filter((card) => card.lane === lane);
  const view: BoardView = {
    asOf,
    decimalMark: actor.sites[0]?.decimalMark ?? '.',
    mayOpenJob: allows(actor.role, 'balanceJob:open'),
  };
  const shown = chosen === null ? LANES : [chosen];
  return (
    <>
      <PageHead
        title="Due board"
        note="Which machines need rebalancing, which need something else first, and why"
      />
      <Tabs
        label="Lanes"
        tabs={[
          {
            label: 'all lanes',
            href: routes.dueBoard(),
            count: cards.length,
            current: chosen === null,
          },
          ...LANES.map((lane) => ({
            label: lane,
            href: routes.dueBoard(laneQuery(lane)),
            count: inLane(lane).length,
            current: chosen === lane,
          })),
        ]}
      />
      {cards.length === 0 && (
        <EmptyState
          title="Nothing to rank yet"
          action={<LinkButton href={routes.newUpload()}>Upload readings</LinkButton>}
        >
          A machine comes onto the board with its first reading and a limit set.
        </EmptyState>
      )}
      {shown.map((lane) => (
        <LanePanel
          key={lane}
          lane={lane}
          cards={inLane(lane)}
          view={view}
          showEmpty={chosen !== null}
        />
      ))}
      {chosen === null && unranked.length > 0 && <Unranked machines={unranked} />}
    </>
  );
}

function Unranked({ machines }: { machines: readonly UnrankedMachine[] }) {
  return (
    <Panel title="Not ranked" note={formatPlural(machines.length, 'machine')}>
      <ul className="flex flex-col gap-2">
        {machines.map(({ machineId, tag, name, because }) => (
          <li key={machineId}>
            <Link className="link font-semibold" href={routes.machine(machineId)}>
              {tag}
            </Link>{' '}
            {name}: <span className="text-ink-soft">{because}</span>
          </li>
        ))}
      </ul>
    </Panel>
  );
}
