'use client';

import { RotorFace } from '@/components/rotor-face/rotor-face';
import { Caution } from '@/components/ui/caution';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { countedInSense } from '@/lib/domain/balancing/convert-angle';
import { CAUTIONS } from '@/lib/domain/cautions';
import { formatDegrees, formatMass, formatNumber, type DecimalMark } from '@/lib/format';
import type { SolvedWithoutPhase } from '@/lib/schemas/workbench-weights';

type SolvedWithoutPhaseProps = { solved: SolvedWithoutPhase; decimalMark: DecimalMark };

/** The correction, how well the sizes agree with it, and where it hangs. */
export function SolvedWithoutPhasePanel({ solved, decimalMark }: SolvedWithoutPhaseProps) {
  const { massG, angleDeg, angleSense, consistency, trusted, radiusMm } = solved;
  return (
    <Panel title="Correction">
      <div className="flex flex-col gap-4">
        {!trusted && (
          <Notice kind="failure" title="The sizes do not agree with one another">
            The consistency is {formatNumber(consistency, { decimals: 2, decimalMark })}; 1 is
            perfect, and outside 0.85 to 1.15 the runs are repeated before anything is fitted.
          </Notice>
        )}
        <p className="text-lg">
          Take the trial weight off and fit{' '}
          <strong className="figures">{formatMass(massG, decimalMark)}</strong> at{' '}
          <strong className="figures">{formatDegrees(angleDeg, 1, decimalMark)}</strong> against
          rotation
          {angleSense === 'with' &&
            ` (${formatDegrees(countedInSense(angleDeg, 'with'), 1, decimalMark)} with rotation, as you count)`}
          , on the radius of the trial weight.
        </p>
        <Sizes solved={solved} decimalMark={decimalMark} />
        <Caution code="SAF-06">{CAUTIONS['SAF-06'].text}</Caution>
        <RotorFace
          plane={{
            name: 'The plane',
            radiusMm,
            rotationFromDriveEnd: solved.rotationFromDriveEnd === 'clockwise' ? 'cw' : 'ccw',
            decimalMark,
          }}
          weights={[{ id: 'answer', massG, angleDeg, label: 'correction', state: 'proposed' }]}
        />
      </div>
    </Panel>
  );
}

function Sizes({ solved, decimalMark }: SolvedWithoutPhaseProps) {
  const size = (value: number) => formatNumber(value, { decimals: 2, decimalMark });
  return (
    <Table caption={`Sizes read and fitted, ${solved.unit}`} captionShown>
      <thead>
        <tr>
          <Th>weight at, against rotation</Th>
          <Th numeric>read</Th>
          <Th numeric>fitted</Th>
        </tr>
      </thead>
      <tbody>
        {solved.runs.map(({ angleDeg, amplitude, fitted }) => (
          <tr key={angleDeg}>
            <RowHead>{formatDegrees(angleDeg, 1, decimalMark)}</RowHead>
            <Td numeric>{size(amplitude)}</Td>
            <Td numeric>{size(fitted)}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
