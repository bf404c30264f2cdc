import { highestPeaks } from '@/lib/domain/drawing/spectrum-lines';
import { formatNumber } from '@/lib/format';
import { Table, Td, Th } from '@/components/ui/table';
import type { SpectrumCurve } from './spectrum-types';

type PeaksTableProps = { curve: SpectrumCurve; unit: string; turnHz: number | null; title: string };

const MOST = 10;

/** The highest lines of the spectrum, largest first. */
export function PeaksTable({ curve, unit, turnHz, title }: PeaksTableProps) {
  const peaks = highestPeaks(curve.values, MOST);
  return (
    <details className="mt-1">
      <summary className="target flex cursor-pointer items-center text-sm text-blue">
        Highest peaks
      </summary>
      <Table caption={`${title}, highest peaks`}>
        <thead>
          <tr>
            <Th numeric>frequency, Hz</Th>
            {turnHz !== null && <Th numeric>order</Th>}
            <Th numeric>{`size, ${unit}`}</Th>
          </tr>
        </thead>
        <tbody>
          {peaks.map(({ index, value }) => {
            const hz = curve.hz[index] ?? 0;
            return (
              <tr key={index}>
                <Td numeric>{formatNumber(hz, { significant: 4 })}</Td>
                {turnHz !== null && <Td numeric>{formatNumber(hz / turnHz, { decimals: 2 })}</Td>}
                <Td numeric>{formatNumber(value)}</Td>
              </tr>
            );
          })}
        </tbody>
      </Table>
    </details>
  );
}
