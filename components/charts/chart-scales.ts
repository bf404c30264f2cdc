import { scaleLinear, scaleUtc } from '@visx/scale';
import type { ChartRange, PlotBox } from './chart-types';

export type LinearScale = ReturnType<typeof linearX>;

/** Number scale over the width of the plot. */
export function linearX(range: ChartRange, box: PlotBox) {
  return scaleLinear<number>({
    domain: [range.from, range.to],
    range: [box.left, box.left + box.width],
  });
}

/** Number scale up the height of the plot, rounded outwards. */
export function linearY(range: ChartRange, box: PlotBox) {
  return scaleLinear<number>({
    domain: [range.from, range.to],
    range: [box.top + box.height, box.top],
    nice: 4,
  });
}

/** Round instants inside a range of epoch milliseconds. */
export function timeTicks(range: ChartRange, count: number): number[] {
  const scale = scaleUtc<number>({ domain: [new Date(range.from), new Date(range.to)] });
  return scale.ticks(count).map((tick) => tick.getTime());
}

/** The place of a share of the width on the x axis. */
export function shareToX(share: number, range: ChartRange): number {
  return range.from + share * (range.to - range.from);
}
