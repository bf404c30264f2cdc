import { senseSeenFrom } from '@/lib/domain/drawing/face-view';
import { END_WORDS, formatDegrees, formatLag, formatMass, formatQuantity } from '@/lib/format';
import { FaceArrows } from './face-arrows';
import { FaceDisc } from './face-disc';
import { FACE, faceHeight } from './face-layout';
import { STATE_WORDS, type FacePlane, type FaceReadings, type FaceWeight } from './face-types';
import type { ViewingEnd } from './face-types';
import { FaceVectors } from './face-vectors';
import { FaceWeights, labelRows } from './face-weights';

type FaceDrawingProps = {
  plane: FacePlane;
  seenFrom: ViewingEnd;
  weights: readonly FaceWeight[];
  readings?: FaceReadings;
  titleId: string;
};

/** The drawing itself; which end it is seen from and the sense of rotation are written on it. */
export function FaceDrawing({ plane, seenFrom, weights, readings, titleId }: FaceDrawingProps) {
  const seen = senseSeenFrom(plane.rotationFromDriveEnd, seenFrom);
  const { decimalMark } = plane;
  const height = faceHeight(labelRows(weights, seen));
  return (
    <svg
      viewBox={`0 0 ${FACE.width} ${height}`}
      role="img"
      aria-labelledby={`${titleId} ${titleId}-words`}
      className="mx-auto block w-full max-w-[26rem] print:max-w-[15cm]"
    >
      <title id={titleId}>{`${plane.name}, ${END_WORDS[seenFrom]}`}</title>
      <desc id={`${titleId}-words`}>{description({ plane, seenFrom, weights, readings })}</desc>
      <text textAnchor="middle">
        <tspan x={FACE.centre.x} y={15} className="fill-ink text-[15px] font-bold">
          {plane.name}
        </tspan>
        <tspan x={FACE.centre.x} y={33} className="fill-ink text-[14px] font-bold">
          {END_WORDS[seenFrom]}
        </tspan>
      </text>
      <FaceArrows seen={seen} />
      <FaceDisc
        seen={seen}
        positions={plane.positions ?? []}
        weightDegs={weights.map(({ angleDeg }) => angleDeg)}
      />
      {readings && <FaceVectors vectors={readings.vectors} {...{ seen, decimalMark }} />}
      <FaceWeights {...{ weights, seen, decimalMark }} />
    </svg>
  );
}

function description(shown: Omit<FaceDrawingProps, 'titleId'>): string {
  const { plane, seenFrom, weights, readings } = shown;
  const turning = senseSeenFrom(plane.rotationFromDriveEnd, seenFrom);
  const hung = weights.map(
    (weight) =>
      `${formatMass(weight.massG, plane.decimalMark)} at ${formatDegrees(weight.angleDeg)}, ${STATE_WORDS[weight.state]}`,
  );
  const read = readings?.vectors.map(
    (vector) =>
      `${vector.label} ${formatQuantity(vector.amplitude, readings.unit, { decimalMark: plane.decimalMark })} at ${formatLag(vector.lagDeg, readings.phaseShown)}`,
  );
  return [
    `The rotor turns ${turning === 'cw' ? 'clockwise' : 'counter-clockwise'} on this drawing.`,
    'Degrees count against rotation from the mark, which stands on top.',
    hung.length > 0 ? `Weights: ${hung.join('; ')}.` : 'No weight is shown.',
    read && read.length > 0 ? `1x at ${readings?.point ?? 'the point'}: ${read.join('; ')}.` : '',
  ]
    .join(' ')
    .trim();
}
