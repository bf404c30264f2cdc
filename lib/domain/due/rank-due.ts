import type { DueCard } from './due-card';
import { LANES } from './lane';

/**
 * The Due board's order: lanes first; inside 'act now' and 'rebalance' by score, inside the others by
 * urgency, both as shown (score to 0.1); then criticality, older balance, tag. Cards with more fields
 * keep them.
 *
 * Example: of two machines in 'watch' the one with the higher urgency comes first.
 */
export function rankDue<C extends DueCard>(cards: readonly C[]): C[] {
  return cards.toSorted(
    (one, other) =>
      LANES.indexOf(one.lane) - LANES.indexOf(other.lane) ||
      shown(other) - shown(one) ||
      byText(one.criticality, other.criticality) ||
      (other.daysSinceBalance ?? -1) - (one.daysSinceBalance ?? -1) ||
      byText(one.tag, other.tag),
  );
}

// Numbers that look equal on the board are equal, or the tie-breaks would look arbitrary.
function shown({ lane, score, urgency }: DueCard): number {
  const isByScore = lane === 'act now' || lane === 'rebalance';
  return Math.round(10 * (isByScore ? score : 100 * urgency));
}

function byText(one: string, other: string): number {
  if (one === other) return 0;
  return one < other ? -1 : 1;
}
