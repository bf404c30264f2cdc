import { polarPlace, screenDeg, type Sense } from '@/lib/domain/drawing/face-view';
import { spreadApart } from '@/lib/domain/drawing/leader-rows';
import { formatNumber, type DecimalMark } from '@/lib/format';
import { leftWithinDisc } from '@/lib/domain/drawing/within-disc';
import { FACE } from './face-layout';
import type { FaceVector } from './face-types';

const { centre, rim } = FACE;
const LONGEST = rim * 0.68;
const MOST_WORDS = 4;

type FaceVectorsProps = {
  vectors: readonly FaceVector[];
  seen: Sense;
  decimalMark?: DecimalMark;
};

/** The 1x readings as scribed vectors from the centre, and the walk of their tips from run to run. */
export function FaceVectors({ vectors, seen, decimalMark }: FaceVectorsProps) {
  const largest = Math.max(0, ...vectors.map(({ amplitude }) => amplitude));
  if (largest === 0) return null;
  const tips = vectors.map((vector) => ({
    vector,
    ...polarPlace(centre, (vector.amplitude / largest) * LONGEST, screenDeg(vector.lagDeg, seen)),
  }));
  const worded = tips.filter(
    (_, i) => tips.length <= MOST_WORDS || i === 0 || i === tips.length - 1,
  );
  const heights = spreadApart(
    worded.map(({ y }) => y),
    14,
    { min: centre.y - rim * 0.7, max: centre.y + rim * 0.75 },
  );
  return (
    <g>
      {tips.map(({ vector, x, y }, i) => (
        <line
          key={vector.label}
          x1={centre.x}
          y1={centre.y}
          x2={x}
          y2={y}
          className={i === 0 ? 'stroke-scribe' : 'stroke-scribe/60'}
          strokeWidth={i === 0 ? 2 : 1.25}
        />
      ))}
      <polyline
        points={tips.map(({ x, y }) => `${x},${y}`).join(' ')}
        fill="none"
        className="stroke-scribe"
        strokeDasharray="3 3"
      />
      {tips.map(({ vector, x, y }, i) => (
        <circle key={vector.label} cx={x} cy={y} r={i === 0 ? 3 : 2.5} className="fill-scribe" />
      ))}
      {worded.map(({ vector, x }, i) => (
        <VectorWords
          key={vector.label}
          {...{ vector, x, decimalMark }}
          y={heights[i] ?? centre.y}
        />
      ))}
    </g>
  );
}

type VectorWordsProps = { vector: FaceVector; x: number; y: number; decimalMark?: DecimalMark };

/** A letter of the figures' face at this size. */
const LETTER = 7.3;
/** Words stay this far inside the rim. */
const MARGIN = 4;

/** Beside the tip, on the side with more room, and always on the disc. */
function VectorWords({ vector, x, y, decimalMark }: VectorWordsProps) {
  const { label, amplitude } = vector;
  const decimals = amplitude < 1 ? 2 : undefined;
  const words = `${label} ${formatNumber(amplitude, { decimals, decimalMark })}`;
  const width = LETTER * words.length;
  const left = x > centre.x + 8 ? x - 7 - width : x + 7;
  return (
    <text
      x={leftWithinDisc({ left, width, y }, { ...centre, radius: rim - MARGIN })}
      y={y + 4}
      className="figures fill-scribe text-[12px] font-bold"
      paintOrder="stroke"
      stroke="rgb(var(--disc))"
      strokeWidth={3}
    >
      {words}
    </text>
  );
}
