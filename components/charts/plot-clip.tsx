import type { PlotBox } from './chart-types';

/** Curves stay inside the plot when zoomed; plots of one size share the rectangle. */
export function Clip({ box }: { box: PlotBox }) {
  return (
    <clipPath id={clipId(box)}>
      <rect x={box.left} y={box.top} width={box.width} height={box.height} />
    </clipPath>
  );
}

export function clipId({ left, top, width, height }: PlotBox): string {
  return `plot-${Math.round(left)}-${top}-${Math.round(width)}-${height}`;
}
