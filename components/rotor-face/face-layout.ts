/** Measures of the drawing, in its own units; 320 wide, so that its words can be read at 280 px. */
export const FACE = {
  width: 320,
  centre: { x: 160, y: 190 },
  /** Rim of the disc, where weights hang. */
  rim: 90,
  degrees: 107,
  arrow: 126,
  largestDot: 10,
  /** First row of labels under the disc, and how far rows are apart. */
  firstRow: 334,
  rowHeight: 33,
} as const;

/** How tall the drawing is with so many rows of labels. */
export function faceHeight(rows: number): number {
  return rows === 0 ? 312 : FACE.firstRow + rows * FACE.rowHeight - 10;
}

/** Letters of the ground's colour behind a word, so that lines under it stay apart from it. */
export const HALO = {
  paintOrder: 'stroke',
  stroke: 'rgb(var(--sheet))',
  strokeWidth: 4,
  strokeLinejoin: 'round',
} as const;
