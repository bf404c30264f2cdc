import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatDegrees, formatNumber, formatQuantity } from '@/lib/format';
import type { BookCoefficientDto } from '@/lib/schemas/balance-job-parts';

type Line = BookCoefficientDto & {
  count?: number;
  spreadPct?: number | null;
  converted?: boolean;
};
type CoefficientLinesProps = { lines: readonly Line[]; unit: string };

/** Influence coefficients by plane and point, with how well their estimates agree where that is known. */
export function CoefficientLines({ lines, unit }: CoefficientLinesProps) {
  const graded = lines.some(({ count }) => count !== undefined);
  return (
    <Table caption="Influence coefficients from the book">
      <thead>
        <tr>
          <Th>plane</Th>
          <Th>point</Th>
          <Th numeric>{unit} per kg·mm</Th>
          <Th numeric>turn</Th>
          {graded && <Th numeric>jobs</Th>}
          {graded && <Th numeric>spread</Th>}
        </tr>
      </thead>
      <tbody>
        {lines.map(({ planeName, pointLabel, sizePerKgMm, deg, count, spreadPct, converted }) => (
          <tr key={`${planeName} ${pointLabel}`}>
            <RowHead>{planeName}</RowHead>
            <Td>{pointLabel}</Td>
            <Td numeric>{formatNumber(sizePerKgMm, { decimals: 3 })}</Td>
            <Td numeric>
              {formatDegrees(deg, 1)}
              {converted === true && ', converted'}
            </Td>
            {graded && <Td numeric>{count}</Td>}
            {graded && <Td numeric>{spreadWords(spreadPct)}</Td>}
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function spreadWords(spreadPct: number | null | undefined): string {
  if (spreadPct === null || spreadPct === undefined) return 'one estimate';
  return formatQuantity(spreadPct, '%', { decimals: 1 });
}
