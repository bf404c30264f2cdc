import { polarPlace, screenDeg, type Sense } from '@/lib/domain/drawing/face-view';
import { leaderRows, type LeaderRow } from '@/lib/domain/drawing/leader-rows';
import { weightDotRadii } from '@/lib/domain/drawing/weight-dots';
import { formatDegrees, formatMass, type DecimalMark } from '@/lib/format';
import { FACE, HALO } from './face-layout';
import { STATE_WORDS, type FaceWeight } from './face-types';
import { WeightDot } from './weight-dot';

/** Rows of labels that the weights need. */
export function labelRows(weights: readonly FaceWeight[], seen: Sense): number {
  const rows = leaderRows(weights.map(({ angleDeg }) => screenDeg(angleDeg, seen)));
  return rows.reduce((most, { row }) => Math.max(most, row + 1), 0);
}

type FaceWeightsProps = { weights: readonly FaceWeight[]; seen: Sense; decimalMark?: DecimalMark };

/** Every weight as brass on the rim, with a line to its words under the disc. */
export function FaceWeights({ weights, seen, decimalMark }: FaceWeightsProps) {
  const places = weights.map(({ angleDeg }) => screenDeg(angleDeg, seen));
  const rows = leaderRows(places);
  const radii = weightDotRadii(
    weights.map(({ massG }) => massG),
    FACE.largestDot,
  );
  const marks = weights.map((weight, i) => ({
    weight,
    at: polarPlace(FACE.centre, FACE.rim, places[i] ?? 0),
    row: rows[i] ?? { side: 'left' as const, row: 0, channel: 0 },
    radius: radii[i] ?? FACE.largestDot,
  }));
  return (
    <g>
      {marks.map(({ weight, at, row }) => (
        <path
          key={weight.id}
          d={leaderPath(at, row)}
          fill="none"
          className="stroke-ink"
          strokeWidth={0.75}
        />
      ))}
      {/* Larger ones first, so that a small one on the same place stays in sight. */}
      {[...marks]
        .sort((a, b) => b.radius - a.radius)
        .map(({ weight, at, radius }) => (
          <WeightDot key={weight.id} at={at} radius={radius} state={weight.state} />
        ))}
      {marks.map(({ weight, row }) => (
        <WeightWords key={weight.id} {...{ weight, row, decimalMark }} />
      ))}
    </g>
  );
}

const CHANNEL_STEP = 6;
const INMOST_CHANNEL = 24;
const WORDS_FROM_EDGE = 28;

/** Out to the side, down its own channel, in to its row: like a dimension line, and none crosses. */
function leaderPath(at: { x: number; y: number }, { side, row, channel }: LeaderRow): string {
  const fromEdge = Math.max(2, INMOST_CHANNEL - channel * CHANNEL_STEP);
  const x = side === 'left' ? fromEdge : FACE.width - fromEdge;
  const end = side === 'left' ? WORDS_FROM_EDGE : FACE.width - WORDS_FROM_EDGE;
  const y = rowMiddle(row);
  return `M ${at.x} ${at.y} H ${x} V ${y} H ${end}`;
}

function rowMiddle(row: number): number {
  return FACE.firstRow + row * FACE.rowHeight - 5;
}

type WeightWordsProps = { weight: FaceWeight; row: LeaderRow; decimalMark?: DecimalMark };

function WeightWords({ weight, row, decimalMark }: WeightWordsProps) {
  const left = row.side === 'left';
  const x = left ? WORDS_FROM_EDGE + 3 : FACE.width - WORDS_FROM_EDGE - 3;
  const y = rowMiddle(row.row) + 5;
  return (
    <text textAnchor={left ? 'start' : 'end'} {...HALO}>
      <tspan x={x} y={y} className="figures fill-ink text-[13px] font-bold">
        {formatMass(weight.massG, decimalMark)} at {formatDegrees(weight.angleDeg)}
      </tspan>
      <tspan x={x} y={y + 14} className="fill-ink-soft text-[12px]">
        {underWords(weight)}
      </tspan>
    </text>
  );
}

/** The longest row of words that leaves room for another beside it. */
const LONGEST = 20;
const SHORT_STATES = { on: 'on', trial: 'trial', proposed: 'proposed', removed: 'off' } as const;

/** What it is, in few words; the whole of it stands in the list under the drawing. */
function underWords({ state, label }: FaceWeight): string {
  const words = label === undefined ? STATE_WORDS[state] : `${SHORT_STATES[state]}, ${label}`;
  return words.length <= LONGEST ? words : `${words.slice(0, LONGEST - 1)}…`;
}
