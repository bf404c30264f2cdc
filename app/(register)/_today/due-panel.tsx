import Link from 'next/link';
import { LinkButton } from '@/components/ui/link-button';
import { Panel } from '@/components/ui/panel';
import { ZoneStamp } from '@/components/ui/zone-stamp';
import { tellingReasons } from '@/lib/domain/due/telling-reasons';
import { formatCount, formatQuantity, type DecimalMark } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { DueBoardCard, DueBoardDto } from '@/lib/schemas/due-board';

const SHOWN = 6;

type DuePanelProps = { board: DueBoardDto; decimalMark: DecimalMark };

/** The top of the Due board: what asks for something to be done. */
export function DuePanel({ board, decimalMark }: DuePanelProps) {
  const due = board.cards.filter(({ lane }) => lane !== 'watch');
  const shown = due.slice(0, SHOWN);
  return (
    <Panel
      title="Due"
      note={due.length === 0 ? undefined : `${formatCount(shown.length, due.length)} machines`}
      actions={<LinkButton href={routes.dueBoard()}>Due board</LinkButton>}
    >
      {shown.length === 0 ? (
        <p className="text-ink-soft">Nothing asks for action today.</p>
      ) : (
        <ul className="flex flex-col divide-y divide-rule">
          {shown.map((card) => (
            <DueLine key={card.machineId} card={card} decimalMark={decimalMark} />
          ))}
        </ul>
      )}
    </Panel>
  );
}

function DueLine({ card, decimalMark }: { card: DueBoardCard; decimalMark: DecimalMark }) {
  const { standing } = card;
  return (
    <li className="flex items-start gap-3 py-2.5">
      <ZoneStamp zone={standing.zone} size="small" />
      <div className="min-w-0 grow">
        <p>
          <Link className="link font-semibold" href={routes.machine(card.machineId)}>
            {card.tag}
          </Link>{' '}
          {card.name}: <strong>{card.lane}</strong>
        </p>
        <p className="text-sm text-ink-soft">{tellingReasons(card, 1)[0]}</p>
      </div>
      <span className="figures whitespace-nowrap">
        {formatQuantity(standing.latest.value, 'mm/s rms', { decimals: 2, decimalMark })}
      </span>
    </li>
  );
}
