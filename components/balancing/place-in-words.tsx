import { clockHours, opposite } from '@/lib/domain/drawing/face-view';
import { arcMm, positionWords } from '@/lib/domain/drawing/rotor-place';
import { formatClock, formatDegrees, formatQuantity, type DecimalMark } from '@/lib/format';
import type { PlaneDto, SetupDto } from '@/lib/schemas/balance-job';

export type PlacePlane = Pick<PlaneDto, 'name' | 'radiusMm' | 'positions'>;
export type PlaceSetup = Pick<SetupDto, 'mark' | 'rotationFromDriveEnd'>;

type PlaceInWordsProps = {
  plane: PlacePlane | undefined;
  setup: PlaceSetup;
  angleDeg: number;
  decimalMark: DecimalMark;
};

/** One place said in several ways, so that it can be laid out with a tape, a count or a look. */
export function PlaceInWords({ plane, setup, angleDeg, decimalMark }: PlaceInWordsProps) {
  if (!plane) return null;
  const sense = setup.rotationFromDriveEnd === 'clockwise' ? 'cw' : 'ccw';
  const words = positionWords(angleDeg, plane.positions);
  return (
    <p>
      Plane {plane.name}: count{' '}
      <strong className="figures">
        {formatDegrees(angleDeg, 1, decimalMark)} against rotation
      </strong>{' '}
      from the mark ({setup.mark}) ={' '}
      <span className="figures">
        {formatQuantity(arcMm(angleDeg, plane.radiusMm), 'mm', { decimals: 0 })}
      </span>{' '}
      of arc at radius{' '}
      <span className="figures">{formatQuantity(plane.radiusMm, 'mm', { decimalMark })}</span>
      {words.kind === 'at' && ` = ${words.label}`}
      {words.kind === 'between' && `, between ${words.from} and ${words.to}`}; with the mark parked
      on top, about <span className="figures">{formatClock(clockHours(angleDeg, sense))}</span> on
      the clock seen from the drive end,{' '}
      <span className="figures">{formatClock(clockHours(angleDeg, opposite(sense)))}</span> from the
      other end.
    </p>
  );
}
