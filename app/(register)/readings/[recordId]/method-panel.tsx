import { Fact, Facts } from '@/components/ui/fact';
import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import {
  formatBytes,
  formatDateTime,
  formatExact,
  formatLag,
  formatNumber,
  formatQuantity,
} from '@/lib/format';
import { routes } from '@/lib/routes';
import type { MethodDto, ReadingPageDto } from '@/lib/schemas/reading-page';

const SOURCES = {
  tacho: 'from the tacho',
  spectrum: 'found near the stated speed',
  stated: 'as stated',
} as const;

/** How the values were made: method, settings, speed, orders, and the file as it came in. */
export function MethodPanel({ page, made }: { page: ReadingPageDto; made: MethodDto }) {
  const { site, upload, waveform } = page;
  const { decimalMark } = site;
  const number = (value: number, unit: string) => formatQuantity(value, unit, { decimalMark });
  return (
    <Panel title="How it was made">
      <div className="flex flex-col gap-4">
        <Facts>
          <Fact label="method">
            {made.method}, {formatDateTime(made.madeAt, site.timeZone)}
          </Fact>
          <Fact label="window">
            Hann, noise bandwidth {number(made.enbwBins, 'lines')}, lines corrected by coherent gain
          </Fact>
          <Fact label="blocks">
            {made.averages === 1 ? 'one block' : `${made.averages} half-overlapping blocks`} of{' '}
            {made.blockLength} samples, line spacing {number(made.dfHz, 'Hz')}
          </Fact>
          <Fact label="band of the overall">
            {formatExact(made.band.lowHz, '', decimalMark)} to{' '}
            {formatExact(made.band.highHz, 'Hz', decimalMark)}; nothing below is integrated, mean
            removed
          </Fact>
          <Fact label="speed">{speedText(made, number)}</Fact>
          {waveform && (
            <Fact label="as received">
              {waveform.sampleCount} samples in {waveform.receivedUnit} at{' '}
              {formatExact(waveform.sampleRateHz, 'Hz', decimalMark)}
              {waveform.withTacho && ', with a tacho'}
            </Fact>
          )}
          {upload && (
            <Fact label="file">
              <a className="link break-all" href={routes.api.file(upload.id)}>
                {upload.fileName}
              </a>
              {formatBytes(upload.sizeBytes, decimalMark)}
            </Fact>
          )}
        </Facts>
        {upload && (
          <p className="text-xs text-ink-soft">
            SHA-256 <span className="figures break-all">{upload.sha256}</span>
          </p>
        )}
        <Orders made={made} site={site} />
      </div>
    </Panel>
  );
}

function speedText(made: MethodDto, number: (value: number, unit: string) => string) {
  const { speedRpm, speedSource, turns, speedSpreadPct, tachoFault, tachoRepair } = made;
  if (speedRpm === null || speedSource === null) return tachoFault ?? 'not known';
  const parts = [`${number(speedRpm, 'r/min')} ${SOURCES[speedSource]}`];
  if (turns !== null) parts.push(`${turns} whole turns`);
  if (speedSpreadPct !== null) parts.push(`spread ${number(speedSpreadPct, '%')}`);
  if (tachoRepair !== null && tachoRepair !== 'none') parts.push(`tacho: ${tachoRepair}`);
  if (tachoFault !== null) parts.push(tachoFault);
  return parts.join(', ');
}

function Orders({ made, site }: { made: MethodDto; site: ReadingPageDto['site'] }) {
  const { decimalMark, phaseShown } = site;
  if (made.orders.length === 0) return null;
  return (
    <Table caption="Orders of the shaft, as velocity" captionShown>
      <thead>
        <tr>
          <Th>order</Th>
          <Th numeric>frequency, Hz</Th>
          <Th numeric>size, mm/s rms</Th>
          <Th numeric>phase</Th>
        </tr>
      </thead>
      <tbody>
        {made.orders.map(({ order, frequencyHz, amplitudeRmsMmS, lagDeg }) => (
          <tr key={order}>
            <RowHead>{order}x</RowHead>
            <Td numeric>{formatNumber(frequencyHz, { decimals: 2, decimalMark })}</Td>
            <Td numeric>{formatNumber(amplitudeRmsMmS, { decimals: 3, decimalMark })}</Td>
            <Td numeric>{lagDeg === null ? 'no tacho' : formatLag(lagDeg, phaseShown)}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
