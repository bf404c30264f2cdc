import { RowKeys } from '@/components/register/row-keys';
import { Panel } from '@/components/ui/panel';
import type { Lane } from '@/lib/domain/due/lane';
import { formatPlural } from '@/lib/format';
import type { DueBoardCard } from '@/lib/schemas/due-board';
import type { BoardView } from './board-view';
import { DueCardItem } from './due-card-item';
import { WatchTable } from './watch-table';

type LanePanelProps = {
  lane: Lane;
  cards: readonly DueBoardCard[];
  view: BoardView;
  /** Says that the lane is empty instead of leaving it out. */
  showEmpty: boolean;
};

const MEANS: Readonly<Record<Lane, string>> = {
  'act now': 'zone D, and it looks like unbalance: by score',
  'act now, find the cause': 'zone D, and something else than unbalance shows: by urgency',
  rebalance: 'rising towards a boundary or past the middle of the scale, by score',
  'find the cause': 'it calls for action, but not for weights yet: by urgency',
  watch: 'nothing is due: by urgency',
};

/** One lane with its machines in order. */
export function LanePanel({ lane, cards, view, showEmpty }: LanePanelProps) {
  if (cards.length === 0 && !showEmpty) return null;
  const note = `${formatPlural(cards.length, 'machine')}, ${MEANS[lane]}`;
  return (
    <Panel title={sentence(lane)} note={note}>
      {cards.length === 0 && <p className="text-ink-soft">No machine is in this lane.</p>}
      {lane === 'watch' && cards.length > 0 ? (
        <RowKeys>
          <WatchTable cards={cards} view={view} />
        </RowKeys>
      ) : (
        <ol className="flex flex-col divide-y divide-rule">
          {cards.map((card) => (
            <DueCardItem key={card.machineId} card={card} view={view} />
          ))}
        </ol>
      )}
    </Panel>
  );
}

function sentence(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
