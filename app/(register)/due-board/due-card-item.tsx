import Link from 'next/link';
import { Badge } from '@/components/ui/badge';
import { Fact, Facts } from '@/components/ui/fact';
import { LinkButton } from '@/components/ui/link-button';
import { Value } from '@/components/ui/value';
import { ZoneStamp } from '@/components/ui/zone-stamp';
import { tellingReasons } from '@/lib/domain/due/telling-reasons';
import { formatAge, formatNumber, type DecimalMark } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { DueBoardCard } from '@/lib/schemas/due-board';
import type { BoardView } from './board-view';
import { nextBoundaryWords } from './next-boundary';
import { Working } from './working';

type DueCardItemProps = { card: DueBoardCard; view: BoardView };

/** A machine on the board: how it stands, why it is in this lane, and the working behind it. */
export function DueCardItem({ card, view }: DueCardItemProps) {
  const isForBalancing = card.lane === 'rebalance' || card.lane === 'act now';
  return (
    <li className="flex flex-col gap-3 py-4 first:pt-0 last:pb-0">
      <header className="flex flex-wrap items-center gap-x-3 gap-y-2">
        <ZoneStamp zone={card.standing.zone} />
        <h3 className="text-base font-semibold">
          <Link className="link" href={routes.machine(card.machineId)}>
            {card.tag}
          </Link>{' '}
          {card.name}
        </h3>
        <span className="text-ink-soft">
          {card.siteName}, {card.areaName}
        </span>
        {card.mark === 'old reading' && <Badge>take a reading first</Badge>}
        {card.asksWhy && <Badge>balanced often: ask why</Badge>}
        <Rank card={card} isForBalancing={isForBalancing} decimalMark={view.decimalMark} />
      </header>
      <CardFacts card={card} view={view} />
      <ul className="list-disc pl-5 text-ink-soft">
        {tellingReasons(card).map((reason) => (
          <li key={reason}>{reason}</li>
        ))}
      </ul>
      <div className="flex flex-wrap items-start gap-x-4 gap-y-2">
        <Working card={card} decimalMark={view.decimalMark} />
        {view.mayOpenJob && isForBalancing && (
          <span className="no-print ml-auto">
            <LinkButton href={routes.newBalanceJob(card.machineId)}>Open a balance job</LinkButton>
          </span>
        )}
      </div>
    </li>
  );
}

type RankProps = { card: DueBoardCard; isForBalancing: boolean; decimalMark: DecimalMark };

function Rank({ card, isForBalancing, decimalMark }: RankProps) {
  const value = isForBalancing ? card.score : 100 * card.urgency;
  return (
    <span className="ml-auto whitespace-nowrap text-ink-soft">
      {isForBalancing ? 'score' : 'urgency'}{' '}
      <span className="figures text-lg text-ink">
        {formatNumber(value, { decimals: 1, decimalMark })}
      </span>
    </span>
  );
}

function CardFacts({ card, view }: DueCardItemProps) {
  const { standing, gain } = card;
  const { asOf, decimalMark } = view;
  const options = { decimals: 2, decimalMark };
  return (
    <Facts>
      <Fact label={`overall, ${card.pointLabel}`}>
        <Value amount={standing.latest.value} unit="mm/s" detection="rms" options={options} />
      </Fact>
      <Fact label="1x share of the energy, latest">
        <Value
          amount={card.oneXShare === null ? null : 100 * card.oneXShare}
          unit="%"
          options={{ decimals: 0 }}
        />
      </Fact>
      <Fact label="since balance">
        <Value
          amount={card.daysSinceBalance}
          unit="d"
          options={{ decimals: 0 }}
          missing="none on record"
        />
      </Fact>
      <Fact label="next boundary">{nextBoundaryWords(card, asOf)}</Fact>
      <Fact label="if the 1x falls to a quarter">
        <Value amount={gain?.overall ?? null} unit="mm/s" detection="rms" options={options} />
        {gain && <ZoneStamp zone={gain.zone} size="small" />}
      </Fact>
      <Fact label="read">
        <Link className="link" href={routes.point(card.pointId)}>
          {formatAge(card.readAt, asOf)}
        </Link>
      </Fact>
    </Facts>
  );
}
