import type { DueCard } from './due-card';
import type { DuePart } from './due-machine';

const FOR_WEIGHTS: readonly DuePart['key'][] = ['time left', 'share', 'growth'];
const AGAINST: readonly DuePart['key'][] = [
  'share',
  'phase',
  'direction',
  'horizontal to vertical',
];

/**
 * The few reasons that speak for a card's lane, most telling first: what asks for attention before
 * everything else; where it looks like unbalance the time left, the share of 1x and the growth; where
 * it does not, what speaks most against unbalance, then the time left.
 *
 * Example: a card in 'find the cause' with a share of 4 % says so before anything of the lag.
 */
export function tellingReasons(card: DueCard, most = 3): string[] {
  const { parts, reasons, lane } = card;
  const noted = reasons.filter((reason) => !parts.some(({ because }) => because === reason));
  const isForWeights = lane === 'act now' || lane === 'rebalance';
  const told = isForWeights ? inOrder(parts, FOR_WEIGHTS) : againstUnbalance(parts);
  return [...noted, ...told.map(({ because }) => because)].slice(0, most);
}

function againstUnbalance(parts: readonly DuePart[]): DuePart[] {
  const against = inOrder(parts, AGAINST).filter(({ value }) => value < 1);
  return [
    ...against.toSorted((one, other) => one.value - other.value),
    ...inOrder(parts, ['time left']),
  ];
}

function inOrder(parts: readonly DuePart[], keys: readonly DuePart['key'][]): DuePart[] {
  return keys.flatMap((key) => parts.filter((part) => part.key === key));
}
