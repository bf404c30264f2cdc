import { highestPeaks } from '@/lib/domain/drawing/spectrum-lines';
import { formatNumber } from '@/lib/format';
import { Table, Td, Th } from '@/components/ui/table';
import { titleText, type ChartTitle } from './chart-types';
import type { SpectrumCurve } from './spectrum-types';

type PeaksTableProps = { curve: SpectrumCurve; turnHz: number | null; title: ChartTitle };

const MOST = 10;

/** The highest lines of the spectrum, largest first. */
export function PeaksTable({ curve, turnHz, title }: PeaksTableProps) {
  const { unit, decimalMark } = title;
  const peaks = highestPeaks(curve.values, MOST);
  return (
    <details className="mt-1">
      <summary className="target flex cursor-pointer items-center text-sm text-blue">
        Highest peaks
      </summary>
      <Table caption={`${titleText(title)}, highest peaks`}>
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
                <Td numeric>{formatNumber(hz, { significant: 4, decimalMark })}</Td>
                {turnHz !== null && (
                  <Td numeric>{formatNumber(hz / turnHz, { decimals: 2, decimalMark })}</Td>
                )}
                <Td numeric>{formatNumber(value, { decimalMark })}</Td>
              </tr>
            );
          })}
        </tbody>
      </Table>
    </details>
  );
}
