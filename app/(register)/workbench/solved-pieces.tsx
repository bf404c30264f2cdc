'use client';

import { RotorFace } from '@/components/rotor-face/rotor-face';
import { Caution } from '@/components/ui/caution';
import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { CAUTIONS } from '@/lib/domain/cautions';
import { formatMass, formatNumber, type DecimalMark } from '@/lib/format';
import type { SolvedPieces } from '@/lib/schemas/workbench-weights';

type SolvedPiecesProps = { solved: SolvedPieces; decimalMark: DecimalMark };

/** The best choice for every number of positions; the proposed one is drawn. */
export function SolvedPiecesPanel({ solved, decimalMark }: SolvedPiecesProps) {
  const proposed = solved.choices.find((choice) => choice.proposed)?.weights ?? [];
  return (
    <Panel title="Choices">
      <div className="flex flex-col gap-4">
        <Table caption="Pieces on positions" roomy>
          <thead>
            <tr>
              <Th>hang</Th>
              <Th numeric>in all</Th>
              <Th numeric>leaves, g·mm</Th>
              <Th>it</Th>
            </tr>
          </thead>
          <tbody>
            {solved.choices.map((choice) => (
              <tr key={choice.weights.length} className={choice.proposed ? 'font-semibold' : ''}>
                <RowHead>
                  {choice.weights
                    .map(
                      ({ label, massG }) => `position ${label}: ${formatMass(massG, decimalMark)}`,
                    )
                    .join(', ')}
                </RowHead>
                <Td numeric>{formatMass(choice.totalG, decimalMark)}</Td>
                <Td numeric>{formatNumber(choice.residualGmm, { decimals: 0, decimalMark })}</Td>
                <Td>{verdictOf(choice)}</Td>
              </tr>
            ))}
          </tbody>
        </Table>
        <Caution code="SAF-06">{CAUTIONS['SAF-06'].text}</Caution>
        <RotorFace
          plane={{
            name: 'The plane',
            radiusMm: solved.radiusMm,
            rotationFromDriveEnd: solved.rotationFromDriveEnd === 'clockwise' ? 'cw' : 'ccw',
            positions: solved.positions,
            decimalMark,
          }}
          weights={proposed.map(({ label, massG, angleDeg }) => ({
            ...{ id: label, massG, angleDeg, label: `position ${label}`, state: 'proposed' },
          }))}
        />
      </div>
    </Panel>
  );
}

function verdictOf({ proposed, meetsTarget, proven }: SolvedPieces['choices'][number]): string {
  const enough = meetsTarget ? 'is good enough' : 'leaves too much';
  const best = proven ? '' : '; better ones may exist, the search was stopped';
  return `${proposed ? 'is proposed, ' : ''}${enough}${best}`;
}
