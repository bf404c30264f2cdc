import { Notice } from '@/components/ui/notice';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatMass, formatNumber, formatQuantity, type DecimalMark } from '@/lib/format';
import type { PlacementDto } from '@/lib/schemas/balance-job-parts';

type PlacementTableProps = { placement: PlacementDto; unit: string; decimalMark: DecimalMark };

/** The answer on the fixed positions of a plane: the best choice for every number of them. */
export function PlacementTable({ placement, unit, decimalMark }: PlacementTableProps) {
  const { planeName, pieceG, targetGmm, failure, choices } = placement;
  if (failure !== null)
    return (
      <Notice kind="caution" title={`Plane ${planeName}: not on its positions`}>
        {failure}
      </Notice>
    );
  const points = choices[0]?.expected ?? [];
  return (
    <div className="flex flex-col gap-2">
      <Table caption={`Plane ${planeName}: on its positions`} captionShown roomy>
        <thead>
          <tr>
            <Th>hang</Th>
            <Th numeric>in all</Th>
            <Th numeric>leaves, g·mm</Th>
            {points.map(({ label }) => (
              <Th key={label} numeric>
                {label} then, {unit}
              </Th>
            ))}
            <Th>it</Th>
          </tr>
        </thead>
        <tbody>
          {choices.map((choice) => (
            <tr key={choice.weights.length} className={choice.proposed ? 'font-semibold' : ''}>
              <RowHead>
                {choice.weights
                  .map(({ label, massG }) => `${label}: ${formatMass(massG, decimalMark)}`)
                  .join(', ')}
              </RowHead>
              <Td numeric>{formatMass(choice.totalG, decimalMark)}</Td>
              <Td numeric>{formatNumber(choice.residualGmm, { decimals: 0, decimalMark })}</Td>
              {choice.expected.map(({ label, amplitude }) => (
                <Td key={label} numeric>
                  {formatNumber(amplitude, { decimals: 2, decimalMark })}
                </Td>
              ))}
              <Td>{verdictOf(choice)}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
      <p className="text-xs text-ink-soft">
        Pieces of {formatMass(pieceG, decimalMark)}, with the room that the weights on the rotor
        leave. Good enough where {formatQuantity(targetGmm, 'g·mm', { decimals: 0 })} or less
        remain; the fewest positions that reach it are proposed.
      </p>
    </div>
  );
}

function verdictOf(choice: PlacementDto['choices'][number]): string {
  const enough = choice.meetsTarget ? 'is good enough' : 'leaves too much';
  const best = choice.proven ? '' : '; better ones may exist, the search was stopped';
  return `${choice.proposed ? 'is proposed, ' : ''}${enough}${best}`;
}
