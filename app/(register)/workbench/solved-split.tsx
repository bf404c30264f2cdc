'use client';

import type { FaceWeight } from '@/components/rotor-face/face-types';
import { RotorFace } from '@/components/rotor-face/rotor-face';
import { Caution } from '@/components/ui/caution';
import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { countedInSense } from '@/lib/domain/balancing/convert-angle';
import { CAUTIONS } from '@/lib/domain/cautions';
import {
  formatDegrees,
  formatMass,
  formatNumber,
  formatQuantity,
  type DecimalMark,
} from '@/lib/format';
import type { SolvedSplit } from '@/lib/schemas/workbench';

type SolvedSplitProps = { solved: SolvedSplit; decimalMark: DecimalMark };

/** What each position carries, and the positions drawn. */
export function SolvedSplitPanel({ solved, decimalMark }: SolvedSplitProps) {
  const { shares, massG, angleDeg, sumOverWhole, positions } = solved;
  const proposed = shares.map((share): FaceWeight => ({
    id: share.label,
    massG: share.massG,
    angleDeg: share.angleDeg,
    label: `position ${share.label}`,
    state: 'proposed',
  }));
  return (
    <Panel title="Shares">
      <div className="flex flex-col gap-4">
        <Shares solved={solved} decimalMark={decimalMark} />
        <p className="text-sm text-ink-soft">
          {shares.length === 1 ? 'It acts as' : 'Together they act as'}{' '}
          {formatMass(massG, decimalMark)} at {formatDegrees(angleDeg, 1, decimalMark)} against
          rotation; {shares.length === 1 ? 'its mass' : 'their sum'} is{' '}
          <span className="figures">
            {formatNumber(sumOverWhole, { decimals: 2, decimalMark })}
          </span>{' '}
          times as much.
        </p>
        <Caution code="SAF-06">{CAUTIONS['SAF-06'].text}</Caution>
        <RotorFace
          plane={{
            name: 'The plane',
            radiusMm: solved.radiusMm,
            rotationFromDriveEnd: solved.rotationFromDriveEnd === 'clockwise' ? 'cw' : 'ccw',
            positions,
            decimalMark,
          }}
          weights={proposed}
        />
      </div>
    </Panel>
  );
}

function Shares({ solved, decimalMark }: SolvedSplitProps) {
  const countsWith = solved.angleSense === 'with';
  return (
    <Table caption="What each position carries" roomy>
      <thead>
        <tr>
          <Th>position</Th>
          <Th numeric>fit</Th>
          {countsWith && <Th numeric>at, with rotation, as you count</Th>}
          <Th numeric>at, against rotation</Th>
          <Th numeric>force</Th>
        </tr>
      </thead>
      <tbody>
        {solved.shares.map((share) => (
          <tr key={share.label}>
            <RowHead>{share.label}</RowHead>
            <Td numeric className="text-base font-semibold">
              {formatMass(share.massG, decimalMark)}
            </Td>
            {countsWith && (
              <Td numeric>
                {formatDegrees(countedInSense(share.angleDeg, 'with'), 1, decimalMark)}
              </Td>
            )}
            <Td numeric>{formatDegrees(share.angleDeg, 1, decimalMark)}</Td>
            <Td numeric>
              {share.forceN === null
                ? 'type the speed'
                : formatQuantity(share.forceN, 'N', { decimalMark })}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
