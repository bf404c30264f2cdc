import type { ReactNode } from 'react';
import { polarPlace, screenDeg, type Sense } from '@/lib/domain/drawing/face-view';
import { spreadApart } from '@/lib/domain/drawing/leader-rows';
import { outerCircle } from '@/lib/domain/drawing/outer-circle';
import { formatLag, formatNumber, formatQuantity, type DecimalMark } from '@/lib/format';
import { Table, Td, Th, RowHead } from '@/components/ui/table';
import { HALO } from './face-layout';
import { PolarGround } from './polar-ground';

export type WalkStep = { id: number | string; label: string; amplitude: number; lagDeg: number };

type VectorWalkProps = {
  /** “1x, bearing A horizontal”. */
  title: string;
  unit: string;
  /** In the order they were taken. */
  steps: readonly WalkStep[];
  /** Way in which lag counts on the drawing; written on it. */
  counts?: Sense;
  /** Of the site; a point where left out. */
  decimalMark?: DecimalMark;
};

const CENTRE = { x: 160, y: 158 };
const RADIUS = 120;
const MOST_WORDS = 6;

/** The 1x vector's path over runs or dates, in a polar plot with its numbers as a table. */
export function VectorWalk({ title, unit, steps, counts = 'cw', decimalMark }: VectorWalkProps) {
  const outer = outerCircle(Math.max(0, ...steps.map(({ amplitude }) => amplitude)));
  const turning = counts === 'cw' ? 'ccw' : 'cw';
  const places = steps.map((step) => ({
    step,
    ...polarPlace(CENTRE, (step.amplitude / outer) * RADIUS, screenDeg(step.lagDeg, turning)),
  }));
  const worded = places.filter(
    (_, i) => places.length <= MOST_WORDS || i === 0 || i === places.length - 1,
  );
  const heights = spreadApart(
    worded.map(({ y }) => y),
    14,
    { min: 30, max: 290 },
  );
  return (
    <figure className="min-w-0">
      <figcaption className="text-sm font-semibold">
        {title}, {unit}, by lag
      </figcaption>
      <svg
        viewBox="0 0 320 322"
        role="img"
        aria-label={`${title}: ${steps.length} vectors, in the table that follows`}
        className="mx-auto mt-2 block w-full max-w-[26rem]"
      >
        <PolarGround
          centre={CENTRE}
          radius={RADIUS}
          outer={outer}
          counts={counts}
          decimalMark={decimalMark}
        />
        <polyline
          points={places.map(({ x, y }) => `${x},${y}`).join(' ')}
          fill="none"
          className="stroke-blue"
          strokeWidth={1.5}
        />
        {places.map(({ step, x, y }, i) => (
          <circle
            key={step.id}
            cx={x}
            cy={y}
            r={i === places.length - 1 ? 4.5 : 3}
            className={i === places.length - 1 ? 'fill-blue' : 'fill-sheet stroke-blue'}
          />
        ))}
        {worded.map(({ step, x }, i) => (
          <StepWords key={step.id} x={x} y={heights[i] ?? 0}>
            {step.label} {formatNumber(step.amplitude, { decimalMark })}
          </StepWords>
        ))}
      </svg>
      <WalkTable title={title} unit={unit} steps={steps} decimalMark={decimalMark} />
    </figure>
  );
}

/** Words beside a tip, towards the middle of the plot. */
function StepWords({ x, y, children }: { x: number; y: number; children: ReactNode }) {
  return (
    <text
      x={x + (x > CENTRE.x ? -8 : 8)}
      y={y + 4}
      textAnchor={x > CENTRE.x ? 'end' : 'start'}
      className="fill-ink text-[12px] font-semibold"
      {...HALO}
    >
      {children}
    </text>
  );
}

function WalkTable({ title, unit, steps, decimalMark }: Omit<VectorWalkProps, 'counts'>) {
  return (
    <details className="mt-2">
      <summary className="cursor-pointer py-1 text-sm text-blue">Numbers</summary>
      <Table caption={`${title}, as numbers`}>
        <thead>
          <tr>
            <Th>run or date</Th>
            <Th numeric>{`size, ${unit}`}</Th>
            <Th numeric>phase</Th>
          </tr>
        </thead>
        <tbody>
          {steps.map((step) => (
            <tr key={step.id}>
              <RowHead>{step.label}</RowHead>
              <Td numeric>{formatQuantity(step.amplitude, '', { decimalMark })}</Td>
              <Td numeric>{formatLag(step.lagDeg)}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </details>
  );
}
