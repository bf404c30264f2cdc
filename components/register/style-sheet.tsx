import { Badge } from '@/components/ui/badge';
import { Dialog } from '@/components/ui/dialog';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Fact, Facts } from '@/components/ui/fact';
import { KeyCap } from '@/components/ui/key-cap';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { PageHead } from '@/components/ui/page-head';
import { Panel } from '@/components/ui/panel';
import { ProgressBar } from '@/components/ui/progress-bar';
import { Skeleton } from '@/components/ui/skeleton';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { Tabs } from '@/components/ui/tabs';
import { Value } from '@/components/ui/value';
import { ZoneStamp } from '@/components/ui/zone-stamp';
import { formatAge, formatNumber } from '@/lib/format';
import { routes } from '@/lib/routes';
import { StyleSheetCharts } from './style-sheet-charts';
import { StyleSheetDrawings } from './style-sheet-drawings';
import { StyleSheetForms } from './style-sheet-forms';

const HERE = routes.styleSheet();

/** Every part of the screen in every state, with invented data. */
export function StyleSheet() {
  return (
    <>
      <PageHead
        title="Style sheet"
        crumbs={[{ label: 'Settings', href: routes.settings() }, { label: 'Style sheet' }]}
        note="Every part of the screen in every state, with invented data."
        actions={<Button variant="primary">Record a reading</Button>}
      />
      <Panel title="Values and stamps">
        <Facts>
          <Fact label="zone">
            <ZoneStamp zone="C" withWord />
          </Fact>
          <Fact label="overall, worst point">
            <Value amount={3.016} unit="mm/s" detection="rms" size="large" />
          </Fact>
          <Fact label="1x, bearing A horizontal">
            <Value amount={2.64} unit="mm/s" detection="rms" size="large" />
            <Value amount={314} unit="°" detection="lag" size="large" options={{ decimals: 0 }} />
          </Fact>
          <Fact label="kurtosis">
            <Value amount={null} unit="" />
          </Fact>
        </Facts>
        <div className="mt-4 flex flex-wrap items-center gap-4">
          {(['A', 'B', 'C', 'D', null] as const).map((zone) => (
            <ZoneStamp key={zone ?? 'none'} zone={zone} size="large" withWord />
          ))}
          <ZoneStamp zone="D" size="small" />
          <Badge>provisional</Badge>
          <KeyCap>/</KeyCap>
        </div>
      </Panel>
      <StyleSheetForms />
      <Words />
      <Rows />
      <StyleSheetDrawings />
      <StyleSheetCharts />
    </>
  );
}

function Words() {
  return (
    <Panel title="Notices, waiting, nothing there">
      <div className="flex flex-col gap-3">
        <Notice title="The set-up changed on 2 Mar">Coefficients from before do not apply.</Notice>
        <Notice kind="success" title="Correction saved" />
        <Notice kind="caution" title="The speed differs by 3 % from the base run" />
        <Notice kind="failure" title="We couldn’t keep the record">
          The point was retired. Choose another point.
        </Notice>
        <ProgressBar label="Reading fan-3.csv" done={12.4} of={29.9} text="12.4 MB of 29.9 MB" />
        <Skeleton className="h-9" />
        <EmptyState
          title="No balance job yet"
          action={<LinkButton href={HERE}>Open one</LinkButton>}
        >
          Jobs of this machine stand here, newest first.
        </EmptyState>
        <div>
          <Dialog title="Line this run through?" trigger={<Button>Open a dialog</Button>}>
            It stays in the record, with your reason.
          </Dialog>
        </div>
      </div>
    </Panel>
  );
}

const MACHINES = [
  { tag: 'KX-2', name: 'Kiln exhaust fan', zone: 'C', overall: 3.016, at: '2026-01-25T12:00:00Z' },
  { tag: 'SB-2', name: 'Screw blower', zone: 'D', overall: 5.1, at: '2026-02-02T12:00:00Z' },
] as const;
const NOW = '2026-02-03T13:00:00Z';

function Rows() {
  return (
    <Panel title="Due board" note="2 of 140 machines, worst first">
      <Tabs
        label="Lanes"
        tabs={[
          { href: HERE, label: 'All', count: 140, current: true },
          { href: `${HERE}?lane=rebalance`, label: 'Rebalance', count: 2, current: false },
        ]}
      />
      <Table caption="Machines that are due">
        <thead>
          <tr>
            <Th sort={{ href: HERE, direction: null }}>machine</Th>
            <Th>zone</Th>
            <Th numeric sort={{ href: HERE, direction: 'descending' }}>
              overall, mm/s rms
            </Th>
            <Th numeric>read</Th>
          </tr>
        </thead>
        <tbody>
          {MACHINES.map(({ tag, name, zone, overall, at }) => (
            <tr key={tag}>
              <RowHead>
                {tag} <span className="font-normal text-ink-soft">{name}</span>
              </RowHead>
              <Td>
                <ZoneStamp zone={zone} size="small" />
              </Td>
              <Td numeric>{formatNumber(overall, { decimals: 2 })}</Td>
              <Td numeric>{formatAge(at, NOW)}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </Panel>
  );
}
