import Link from 'next/link';
import {
  partOf,
  trainBodies,
  trainColumns,
  type TrainColumn,
  type TrainPart,
} from '@/lib/domain/drawing/train-columns';
import type { ZoneLetter } from '@/lib/format';
import { ZoneStamp } from '@/components/ui/zone-stamp';
import { TrainDrawing, type Drive } from './train-drawing';

export type TrainPoint = { id: number; label: string; zone: ZoneLetter | null; href: string };

export type TrainBearing = {
  id: number;
  label: string;
  part: TrainPart;
  points: readonly TrainPoint[];
};

type MachineTrainProps = {
  /** Names it for screen readers: the machine's tag and name. */
  name: string;
  bearings: readonly TrainBearing[];
  overhung: boolean;
  drive: Drive;
};

/** A machine from the side, driver first; every bearing carries the stamps of its points, as links. */
export function MachineTrain({ name, bearings, overhung, drive }: MachineTrainProps) {
  const columns = trainColumns(bearings, overhung);
  const grid = { gridTemplateColumns: `repeat(${columns.length}, minmax(4.75rem, 1fr))` };
  return (
    <div
      role="region"
      aria-label={`Side view of ${name}`}
      tabIndex={0}
      className="relative overflow-x-auto print:overflow-visible"
    >
      <div
        className="mx-auto"
        style={{ minWidth: `${columns.length * 4.75}rem`, maxWidth: `${columns.length * 9}rem` }}
      >
        <TrainDrawing
          columns={columns.map((column) => ({
            part: partOf(column),
            bearing: column.kind === 'bearing',
          }))}
          bodies={trainBodies(columns)}
          drive={drive}
        />
        <ul className="grid" style={grid}>
          {columns.map((column, index) => (
            <ColumnWords key={index} column={column} />
          ))}
        </ul>
      </div>
    </div>
  );
}

function ColumnWords({ column }: { column: TrainColumn<TrainBearing> }) {
  if (column.kind === 'body')
    return <li className="text-center text-xs text-ink-soft">{column.part}</li>;
  const { bearing } = column;
  return (
    <li className="flex flex-col items-center gap-1">
      <span className="text-center text-xs text-ink-soft">bearing {bearing.label}</span>
      <ul className="flex flex-wrap justify-center gap-x-1 gap-y-2 max-sm:gap-y-3">
        {bearing.points.map((point) => (
          <li key={point.id}>
            <Link
              href={point.href}
              className="flex min-w-6 flex-col items-center gap-0.5 rounded p-0.5 hover:bg-blue-wash max-sm:min-w-10"
            >
              <ZoneStamp zone={point.zone} size="small" />
              <span className="figures text-xs">{point.label}</span>
            </Link>
          </li>
        ))}
      </ul>
    </li>
  );
}
