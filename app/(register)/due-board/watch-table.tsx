import Link from 'next/link';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { ZoneStamp } from '@/components/ui/zone-stamp';
import { formatAge, formatNumber, formatQuantity, formatShare, NOT_MEASURED } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { DueBoardCard } from '@/lib/schemas/due-board';
import type { BoardView } from './board-view';
import { nextBoundaryWords } from './next-boundary';

type WatchTableProps = { cards: readonly DueBoardCard[]; view: BoardView };

/** Machines of which nothing is due, one line each. */
export function WatchTable({ cards, view }: WatchTableProps) {
  return (
    <Table caption="Machines to watch, by urgency">
      <thead>
        <tr>
          <Th>machine</Th>
          <Th>zone</Th>
          <Th numeric>overall, mm/s rms</Th>
          <Th numeric>1x share</Th>
          <Th numeric>since balance</Th>
          <Th>read</Th>
          <Th>next boundary</Th>
          <Th numeric>urgency</Th>
        </tr>
      </thead>
      <tbody>
        {cards.map((card) => (
          <WatchRow key={card.machineId} card={card} view={view} />
        ))}
      </tbody>
    </Table>
  );
}

function WatchRow({ card, view }: { card: DueBoardCard; view: BoardView }) {
  const { standing } = card;
  const { asOf, decimalMark } = view;
  return (
    <tr>
      <RowHead>
        <Link className="link" href={routes.machine(card.machineId)}>
          {card.tag}
        </Link>{' '}
        <span className="font-normal text-ink-soft">{card.name}</span>
      </RowHead>
      <Td>
        <ZoneStamp zone={standing.zone} size="small" />
      </Td>
      <Td numeric>{formatNumber(standing.latest.value, { decimals: 2, decimalMark })}</Td>
      <Td numeric>{card.oneXShare === null ? NOT_MEASURED : formatShare(card.oneXShare)}</Td>
      <Td numeric>
        {card.daysSinceBalance === null
          ? 'no balance on record'
          : formatQuantity(card.daysSinceBalance, 'd', { decimals: 0 })}
      </Td>
      <Td>{formatAge(card.readAt, asOf)}</Td>
      <Td>{nextBoundaryWords(card, asOf)}</Td>
      <Td numeric>{formatNumber(100 * card.urgency, { decimals: 1, decimalMark })}</Td>
    </tr>
  );
}
