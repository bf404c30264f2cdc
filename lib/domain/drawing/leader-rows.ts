/** Where the label of one mark on the disc goes: a side, a row on that side, a channel for its line. */
export type LeaderRow = {
  readonly side: 'left' | 'right';
  /** 0 is the row next to the disc. */
  readonly row: number;
  /** 0 is the channel next to the disc; never shared on one side. */
  readonly channel: number;
};

/**
 * Rows for labels under a disc, so that neither labels nor their lines ever cross: each mark goes to
 * the side it stands on, the lowest mark takes the first row and the inmost channel, higher marks
 * pass outside it. `screenDegs` are clockwise from the top.
 *
 * Example: `leaderRows([236])` is `[{ side: 'left', row: 0, channel: 0 }]`.
 */
export function leaderRows(screenDegs: readonly number[]): LeaderRow[] {
  const lowestFirst = screenDegs
    .map((deg, index) => ({ index, side: sideOf(deg), height: Math.cos((deg * Math.PI) / 180) }))
    .sort((a, b) => a.height - b.height || a.index - b.index);
  const taken = { left: 0, right: 0 };
  const rows = new Map<number, LeaderRow>();
  for (const { index, side } of lowestFirst) {
    rows.set(index, { side, row: taken[side], channel: taken[side] });
    taken[side] += 1;
  }
  return screenDegs.map((_, index) => rows.get(index) ?? { side: 'left', row: 0, channel: 0 });
}

/**
 * Moves values apart until neighbours are at least `gap` apart, keeping their order and staying
 * between `min` and `max` where there is room.
 *
 * Example: `spreadApart([10, 11], 10, { min: 0, max: 100 })` is `[10, 20]`.
 */
export function spreadApart(
  wanted: readonly number[],
  gap: number,
  bounds: { readonly min: number; readonly max: number },
): number[] {
  const order = wanted.map((value, index) => ({ value, index }));
  order.sort((a, b) => a.value - b.value || a.index - b.index);
  const placed: number[] = [];
  for (const { value } of order) {
    placed.push(Math.max(value, bounds.min, (placed.at(-1) ?? -Infinity) + gap));
  }
  let ceiling = bounds.max;
  for (let i = placed.length - 1; i >= 0; i--) {
    placed[i] = Math.min(placed[i] ?? 0, ceiling);
    ceiling = (placed[i] ?? 0) - gap;
  }
  const result = wanted.map(() => 0);
  order.forEach(({ index }, rank) => {
    result[index] = placed[rank] ?? 0;
  });
  return result;
}

function sideOf(screenDeg: number): 'left' | 'right' {
  return screenDeg > 0 && screenDeg <= 180 ? 'right' : 'left';
}
