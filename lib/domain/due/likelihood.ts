import { circularMean } from '../trends/circular';
import { median } from '../trends/order-statistics';
import { shortTurnDeg } from '../units';
import { clamp } from './clamp';
import type { DueMachine, DuePart } from './due-machine';
import type { Standing } from './standing';

const SHARES = 3;
const LAGS = 5;
/** Fewer lags than this say nothing about how steady the lag is. */
const LAGS_MIN = 3;

/**
 * The four parts of "is it unbalance", each 0 to 1, in the order share, phase, direction, horizontal
 * to vertical. Thresholds are proposals of this register on the practice of the trade.
 *
 * - share: `clamp((s − 0.5)/0.3)`, s the median of the last 3 of (1x/overall)²; 0 where no 1x is known
 * - phase: `clamp((40 − sd)/30)`, sd the circular SD of the last 5 lags, degrees; 0.5 without lags
 * - direction: `clamp((6 − q)/3)`, q the larger of H/V and V/H; 1 where not measured
 * - H to V: 1 within 30° of a quarter turn, 0.3 within 30° of 0° or 180°, straight between; 1 where not measured
 *
 * Example: a share of 0.97 gives 1, an SD of 25° gives 0.5, H/V 5.42 gives 0.193.
 */
export function likelihoodParts(machine: DueMachine, { compared }: Standing): DuePart[] {
  return [
    sharePart(compared),
    phasePart(compared),
    directionPart(machine.horizontalOverVertical),
    horizontalToVerticalPart(machine.horizontalLessVerticalLagDeg),
  ];
}

function sharePart(compared: Standing['compared']): DuePart {
  const shares = compared
    .flatMap(({ value, oneX }) =>
      oneX === null || value <= 0 ? [] : [Math.min(1, oneX / value) ** 2],
    )
    .slice(-SHARES);
  const share = shares.length === 0 ? null : median(shares);
  return {
    key: 'share',
    symbol: 'L_share',
    value: share === null ? 0 : clamp((share - 0.5) / 0.3),
    inputs: [{ label: 'share of 1x in the energy', value: share, unit: '' }],
    because:
      share === null
        ? 'No 1x is measured: nothing speaks for unbalance yet.'
        : `1x carries ${percent(share)} of the vibration energy.`,
  };
}

function phasePart(compared: Standing['compared']): DuePart {
  const lags = compared.flatMap(({ lagDeg }) => (lagDeg === null ? [] : [lagDeg])).slice(-LAGS);
  const known = lags.length >= LAGS_MIN;
  const sdDeg = known ? (circularMean(lags)?.sdDeg ?? 180) : null;
  return {
    key: 'phase',
    symbol: 'L_phase',
    value: sdDeg === null ? 0.5 : clamp((40 - sdDeg) / 30),
    inputs: [{ label: 'spread of the lag', value: sdDeg, unit: '°' }],
    because: phaseWords(sdDeg),
  };
}

function phaseWords(sdDeg: number | null): string {
  if (sdDeg === null) return 'No steady record of the lag: counted as half.';
  const spread = String(Math.round(sdDeg));
  if (sdDeg <= 10) return `The lag holds still (spread ${spread}°).`;
  return sdDeg >= 40
    ? `The lag wanders (spread ${spread}°).`
    : `The lag moves (spread ${spread}°).`;
}

function directionPart(ratio: number | null): DuePart {
  const measured = ratio !== null && ratio > 0 ? Math.max(ratio, 1 / ratio) : null;
  return {
    key: 'direction',
    symbol: 'L_direction',
    value: measured === null ? 1 : clamp((6 - measured) / 3),
    inputs: [{ label: 'larger direction over the smaller', value: measured, unit: '' }],
    because: directionWords(measured),
  };
}

function directionWords(ratio: number | null): string {
  if (ratio === null) return 'Only one direction is measured: nothing said by it.';
  return ratio <= 3
    ? 'Both directions shake alike, as unbalance does.'
    : 'One direction shakes far more than the other: a support or a foot does that.';
}

function horizontalToVerticalPart(lagDeg: number | null): DuePart {
  const turn = lagDeg === null ? null : Math.abs(shortTurnDeg(0, lagDeg));
  const offQuarter = turn === null ? 0 : Math.abs(turn - 90);
  return {
    key: 'horizontal to vertical',
    symbol: 'L_hv',
    value: 1 - 0.7 * clamp((offQuarter - 30) / 30),
    inputs: [{ label: 'lag horizontal to vertical', value: turn, unit: '°' }],
    because: horizontalToVerticalWords(turn, offQuarter),
  };
}

function horizontalToVerticalWords(turn: number | null, offQuarter: number): string {
  if (turn === null) return 'The lag between horizontal and vertical is not measured.';
  return offQuarter <= 30
    ? 'Horizontal and vertical are a quarter turn apart, as unbalance makes them.'
    : 'Horizontal and vertical move in one line: unbalance alone does not do that.';
}

function percent(share: number): string {
  return `${String(Math.round(100 * share))} %`;
}
