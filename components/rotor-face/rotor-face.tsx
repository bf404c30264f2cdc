'use client';

import { useId, useState } from 'react';
import { otherEnd } from '@/lib/domain/drawing/face-view';
import { Button } from '@/components/ui/button';
import { FaceDrawing } from './face-drawing';
import type { FacePlane, FaceReadings, FaceWeight, ViewingEnd } from './face-types';
import { PlaceList } from './place-list';
import { ReadingsTable } from './readings-table';

type RotorFaceProps = {
  plane: FacePlane;
  weights: readonly FaceWeight[];
  /** 1x readings of one point, walking from the first run to the last. */
  readings?: FaceReadings;
  /** The end it is first seen from. */
  seenFrom?: ViewingEnd;
  /** Told when a person walks round to the other end, to keep the choice. */
  onSeenFrom?: (end: ViewingEnd) => void;
  /** Leaves out the list of places, where the page has its own. */
  withoutPlaces?: boolean;
};

/**
 * A correction plane seen from a stated end. Walking round to the other end redraws everything and
 * changes no number.
 */
export function RotorFace({
  plane,
  weights,
  readings,
  seenFrom = 'drive-end',
  onSeenFrom,
  withoutPlaces = false,
}: RotorFaceProps) {
  const titleId = useId();
  const [end, setEnd] = useState<ViewingEnd>(seenFrom);
  const walkRound = () => {
    const next = otherEnd(end);
    setEnd(next);
    onSeenFrom?.(next);
  };
  return (
    <figure className="min-w-0">
      <FaceDrawing {...{ plane, weights, readings, titleId }} seenFrom={end} />
      <figcaption className="mx-auto max-w-[26rem] print:max-w-[15cm]">
        <p className="mt-2 text-center text-xs text-ink-soft">
          Degrees count against rotation from the mark
          {plane.markLabel && <>, which is: {plane.markLabel}</>}.
          {readings && ` Scribed on the disc: 1x at ${readings.point}, ${readings.unit}.`}
        </p>
        <div className="no-print mt-2 text-center">
          <Button onClick={walkRound}>
            {end === 'drive-end' ? 'I stand at the other end' : 'I stand at the drive end'}
          </Button>
        </div>
        {!withoutPlaces && <PlaceList plane={plane} weights={weights} seenFrom={end} />}
        {readings && <ReadingsTable readings={readings} decimalMark={plane.decimalMark} />}
      </figcaption>
    </figure>
  );
}
