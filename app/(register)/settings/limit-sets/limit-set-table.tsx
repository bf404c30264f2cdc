import { Badge } from '@/components/ui/badge';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatExact, type DecimalMark } from '@/lib/format';
import type { LimitSetRow } from '@/lib/schemas/settings';

type LimitSetTableProps = { sets: readonly LimitSetRow[]; decimalMark: DecimalMark };

/** Every set with its boundaries, for what it holds, and where it comes from. */
export function LimitSetTable({ sets, decimalMark }: LimitSetTableProps) {
  // As it was given: a rounded boundary would be another boundary.
  const number = (value: number) => formatExact(value, '', decimalMark);
  return (
    <Table caption="Limit sets">
      <thead>
        <tr>
          <Th>set</Th>
          <Th numeric>A/B</Th>
          <Th numeric>B/C</Th>
          <Th numeric>C/D</Th>
          <Th>unit, band</Th>
          <Th>holds for</Th>
          <Th numeric>machines</Th>
          <Th>from</Th>
        </tr>
      </thead>
      <tbody>
        {sets.map((set) => (
          <tr key={set.id}>
            <RowHead>
              <span className="block min-w-44">
                {set.title}{' '}
                <span className="font-normal text-ink-soft">
                  {set.edition}
                  {set.siteName !== null && `, ${set.siteName}`}
                </span>{' '}
                {set.state === 'retired' && <Badge>retired</Badge>}
              </span>
            </RowHead>
            <Td numeric>{number(set.bAb)}</Td>
            <Td numeric>{number(set.bBc)}</Td>
            <Td numeric>{number(set.bCd)}</Td>
            <Td className="min-w-28">
              {set.unit}, {formatExact(set.bandLowHz, '', decimalMark)} to{' '}
              {formatExact(set.bandHighHz, 'Hz', decimalMark)}
            </Td>
            <Td className="min-w-40">{holdsFor(set, decimalMark)}</Td>
            <Td numeric>{set.machines}</Td>
            <Td className="min-w-64">{set.citation}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function holdsFor(set: LimitSetRow, decimalMark: DecimalMark): string {
  const parts = [
    set.support === 'any' ? null : `${set.support} support`,
    range(set.powerMinKw, set.powerMaxKw, 'kW', decimalMark),
    range(set.speedMinRpm, set.speedMaxRpm, 'r/min', decimalMark),
  ].filter((part) => part !== null);
  return parts.length === 0 ? 'no bound stated' : parts.join('; ');
}

function range(low: number | null, high: number | null, unit: string, decimalMark: DecimalMark) {
  if (low === null && high === null) return null;
  if (high === null) return `from ${formatExact(low ?? 0, unit, decimalMark)}`;
  if (low === null) return `up to ${formatExact(high, unit, decimalMark)}`;
  return `${formatExact(low, '', decimalMark)} to ${formatExact(high, unit, decimalMark)}`;
}
