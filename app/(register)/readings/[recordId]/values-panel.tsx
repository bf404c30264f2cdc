import { EmptyState } from '@/components/ui/empty-state';
import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { ZoneStamp } from '@/components/ui/zone-stamp';
import { formatExact, formatLag, formatNumber, formatSpeed, type DecimalMark } from '@/lib/format';
import type { ReadingPageDto, ReadingValueDto } from '@/lib/schemas/reading-page';

/** Every value of the record with unit, detection, band, and the zone with the limits it was judged by. */
export function ValuesPanel({ page }: { page: ReadingPageDto }) {
  const { values, vector, site } = page;
  const { decimalMark } = site;
  if (values.length === 0)
    return <EmptyState title="No values">Nothing was computed from this record yet.</EmptyState>;
  return (
    <Panel title="Values" note="judged by the limits in use when it was read">
      <Table caption="Values of this reading">
        <thead>
          <tr>
            <Th>value</Th>
            <Th numeric>size</Th>
            <Th>unit</Th>
            <Th>band or sense</Th>
            <Th>zone</Th>
            <Th>limits A/B, B/C, C/D</Th>
          </tr>
        </thead>
        <tbody>
          {values.map((value) => (
            <ValueRow key={value.kind} value={value} decimalMark={decimalMark} />
          ))}
          <VectorRow vector={vector} site={site} />
        </tbody>
      </Table>
    </Panel>
  );
}

function ValueRow({ value, decimalMark }: { value: ReadingValueDto; decimalMark: DecimalMark }) {
  const { kind, bandLowHz, bandHighHz, zone, limits } = value;
  const judged = kind.startsWith('overall');
  return (
    <tr>
      <RowHead>{kind.charAt(0).toUpperCase() + kind.slice(1)}</RowHead>
      <Td numeric>{formatNumber(value.value, { decimalMark })}</Td>
      <Td>{value.unit === '' ? 'none' : value.unit}</Td>
      <Td>
        {bandLowHz === null || bandHighHz === null
          ? 'whole record'
          : `${formatExact(bandLowHz, '', decimalMark)} to ${formatExact(bandHighHz, 'Hz', decimalMark)}`}
      </Td>
      <Td>{judged && <ZoneStamp zone={zone} withWord />}</Td>
      <Td>
        {limits && (
          <>
            <span className="figures">
              {[limits.bAb, limits.bBc, limits.bCd]
                .map((boundary) => formatNumber(boundary, { decimalMark }))
                .join(', ')}
            </span>{' '}
            {limits.title} ({limits.edition})
          </>
        )}
      </Td>
    </tr>
  );
}

function VectorRow({ vector, site }: Pick<ReadingPageDto, 'vector' | 'site'>) {
  const { decimalMark, phaseShown } = site;
  if (!vector)
    return (
      <tr>
        <RowHead>1x</RowHead>
        <Td colSpan={5} className="text-ink-soft">
          not measured: neither a tacho nor a speed is known
        </Td>
      </tr>
    );
  const { amplitude, unit, lagDeg, speedRpm, scatter, setupNumber } = vector;
  return (
    <tr>
      <RowHead>1x at {formatSpeed(speedRpm, decimalMark)}</RowHead>
      <Td numeric>{formatNumber(amplitude, { decimalMark })}</Td>
      <Td>{unit}</Td>
      <Td>
        {lagDeg === null ? 'no lag: no tacho' : formatLag(lagDeg, phaseShown)}
        {scatter !== null && (
          <span className="block text-xs text-ink-soft">
            scatter {formatNumber(scatter, { decimalMark })} {unit}
          </span>
        )}
      </Td>
      <Td />
      <Td>{setupNumber === null ? '' : `set-up ${setupNumber}`}</Td>
    </tr>
  );
}
