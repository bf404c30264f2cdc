import { clockHours } from '@/lib/domain/drawing/face-view';
import { arcMm, positionWords } from '@/lib/domain/drawing/rotor-place';
import { formatClock, formatMass, formatQuantity, formatRotorAngle } from '@/lib/format';
import { STATE_WORDS, type FacePlane, type FaceWeight, type ViewingEnd } from './face-types';

type PlaceListProps = {
  plane: FacePlane;
  weights: readonly FaceWeight[];
  seenFrom: ViewingEnd;
};

/**
 * Each weight's place in several ways at once. The clock is given for both ends, so that no number
 * changes with the end the drawing is seen from; the end that is drawn stands out.
 */
export function PlaceList({ plane, weights, seenFrom }: PlaceListProps) {
  if (weights.length === 0) return null;
  return (
    <ul className="mt-3 flex flex-col gap-2 text-sm">
      {weights.map((weight) => (
        <li key={weight.id}>
          <span className="figures font-bold">{formatMass(weight.massG, plane.decimalMark)}</span>{' '}
          {STATE_WORDS[weight.state]}
          {weight.label !== undefined && `, ${weight.label}`}
          <span className="block text-ink-soft">
            <Ways plane={plane} angleDeg={weight.angleDeg} />
            <span className="block">
              clock, mark parked on top: <Clock {...{ plane, weight, seenFrom }} />
            </span>
          </span>
        </li>
      ))}
    </ul>
  );
}

function Ways({ plane, angleDeg }: { plane: FacePlane; angleDeg: number }) {
  const words = positionWords(angleDeg, plane.positions ?? []);
  const arc = formatQuantity(arcMm(angleDeg, plane.radiusMm), 'mm', { decimals: 0 });
  return (
    <>
      <span className="font-semibold text-ink">{formatRotorAngle(angleDeg)}</span> ={' '}
      <span className="font-semibold text-ink">{arc}</span> along the rim at r&nbsp;
      {formatQuantity(plane.radiusMm, 'mm', { decimalMark: plane.decimalMark })}
      {words.kind === 'at' && (
        <>
          {' '}
          = <span className="font-semibold text-ink">{named(words.label)}</span>
        </>
      )}
      {words.kind === 'between' && ` = between ${named(words.from)} and ${named(words.to)}`}
    </>
  );
}

function Clock({
  plane,
  weight,
  seenFrom,
}: Omit<PlaceListProps, 'weights'> & { weight: FaceWeight }) {
  const drive = plane.rotationFromDriveEnd;
  const other = drive === 'cw' ? 'ccw' : 'cw';
  const drawn = (end: ViewingEnd) => (end === seenFrom ? 'font-bold text-ink' : '');
  return (
    <>
      <span className={drawn('drive-end')}>
        {formatClock(clockHours(weight.angleDeg, drive))} from the drive end
      </span>
      {', '}
      <span className={drawn('other-end')}>
        {formatClock(clockHours(weight.angleDeg, other))} from the other end
      </span>
    </>
  );
}

/** A bare number or letter needs the word before it. */
function named(label: string): string {
  return label.includes(' ') ? label : `position ${label}`;
}
