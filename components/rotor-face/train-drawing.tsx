import type { TrainBody, TrainPart } from '@/lib/domain/drawing/train-columns';

export type Drive = 'direct' | 'belt' | 'gear' | 'variable speed';

type TrainDrawingProps = {
  columns: readonly { readonly part: TrainPart; readonly bearing: boolean }[];
  bodies: readonly TrainBody[];
  drive: Drive;
};

const COLUMN = 100;
const AXIS = 52;
const FLOOR = 104;

/** Shaft, bodies, coupling and bearing pedestals, one column a bearing; words stand under it. */
export function TrainDrawing({ columns, bodies, drive }: TrainDrawingProps) {
  const width = columns.length * COLUMN;
  return (
    <svg viewBox={`0 0 ${width} 112`} className="block w-full" aria-hidden="true">
      <line x1={0} y1={FLOOR} x2={width} y2={FLOOR} className="stroke-edge" strokeWidth={1.5} />
      <line x1={14} y1={AXIS} x2={width - 14} y2={AXIS} className="stroke-ink" strokeWidth={5} />
      {bodies.map((body) => (
        <Body key={body.part} body={body} />
      ))}
      {columns.map(({ part, bearing }, index) => (
        <g key={index}>
          {index > 0 && columns[index - 1]?.part !== part && (
            <Joint x={index * COLUMN} drive={drive} />
          )}
          {bearing && <Pedestal x={middle(index)} />}
        </g>
      ))}
    </svg>
  );
}

function middle(index: number): number {
  return index * COLUMN + COLUMN / 2;
}

function Body({ body }: { body: TrainBody }) {
  const alone = body.from === body.to;
  const x = alone ? body.from * COLUMN + 20 : middle(body.from) + 21;
  const width = alone ? COLUMN - 40 : middle(body.to) - middle(body.from) - 42;
  const [top, height] = body.part === 'driven' ? [10, 84] : [22, 60];
  if (body.part === 'driven') {
    return (
      <g className="stroke-ink">
        <rect x={x} y={top} width={width} height={height} rx={2} className="fill-disc" />
        {[0.2, 0.4, 0.6, 0.8].map((share) => (
          <line
            key={share}
            x1={x + width * share}
            y1={top + 5}
            x2={x + width * share}
            y2={top + height - 5}
            className="stroke-scribe/50"
          />
        ))}
      </g>
    );
  }
  return (
    <g className="fill-paper stroke-ink" strokeWidth={1.25}>
      <rect x={x} y={top} width={width} height={height} rx={2} />
      {[0.2, 0.4, 0.6, 0.8].map((share) => (
        <line
          key={share}
          x1={x + 6}
          y1={top + height * share}
          x2={x + width - 6}
          y2={top + height * share}
          className="stroke-edge"
        />
      ))}
    </g>
  );
}

function Pedestal({ x }: { x: number }) {
  return (
    <g className="fill-sheet stroke-ink" strokeWidth={1.5}>
      <path d={`M ${x - 18} ${FLOOR} L ${x - 10} ${AXIS} H ${x + 10} L ${x + 18} ${FLOOR} Z`} />
      <circle cx={x} cy={AXIS} r={11} />
      <circle cx={x} cy={AXIS} r={3} className="fill-ink" />
    </g>
  );
}

function Joint({ x, drive }: { x: number; drive: Drive }) {
  if (drive === 'belt') {
    return (
      <g className="fill-none stroke-ink" strokeWidth={1.5}>
        <ellipse cx={x} cy={AXIS} rx={5} ry={30} className="fill-paper" />
        <path d={`M ${x - 5} ${AXIS - 18} V ${AXIS + 18} M ${x + 5} ${AXIS - 18} V ${AXIS + 18}`} />
      </g>
    );
  }
  return (
    <g className="fill-paper stroke-ink" strokeWidth={1.25}>
      <rect x={x - 12} y={AXIS - 15} width={10} height={30} />
      <rect x={x + 2} y={AXIS - 15} width={10} height={30} />
    </g>
  );
}
