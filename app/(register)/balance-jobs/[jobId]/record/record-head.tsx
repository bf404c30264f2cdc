import { Fact, Facts } from '@/components/ui/fact';
import { Panel } from '@/components/ui/panel';
import {
  formatDateTime,
  formatDegrees,
  formatQuantity,
  formatSpeed,
  NOT_KNOWN,
} from '@/lib/format';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';

/** Machine, reason, convention and conditions of a job. */
export function RecordHead({ job }: { job: BalanceJobDto }) {
  const { setup, rotor, site } = job;
  return (
    <Panel title="Machine and conditions">
      <Facts>
        <Fact label="site">{site.name}</Fact>
        <Fact label="speed">
          <span className="figures">{formatSpeed(job.machine.nominalSpeedRpm)}</span>
        </Fact>
        <Fact label="rotor">
          {rotor.name},{' '}
          {rotor.massKg === null ? `mass ${NOT_KNOWN}` : formatQuantity(rotor.massKg, 'kg')}
        </Fact>
        <Fact label={`mark, set-up ${setup.number}`}>{setup.mark}</Fact>
        <Fact label="tacho">
          {formatDegrees(setup.tachoDeg)} from top in the direction of rotation, {setup.tachoEdge}{' '}
          edge
        </Fact>
        <Fact label="rotation, from the drive end">{setup.rotationFromDriveEnd}</Fact>
        <Fact label="job">
          {job.kind}, {job.unit}
        </Fact>
        <Fact label="targets">{targetsOf(job)}</Fact>
        <Fact label="typed as">
          phase {job.phaseSense}, degrees {job.angleSense} rotation
        </Fact>
        <Fact label="opened">
          {formatDateTime(job.openedAt, site.timeZone)}, {job.openedBy}
        </Fact>
        <Fact label="closed">
          {job.closedAt ? formatDateTime(job.closedAt, site.timeZone) : 'open'}
        </Fact>
      </Facts>
      <p className="mt-3">Reason: {job.reason}</p>
      {job.closingNote && <p className="whitespace-pre-line">Closing note: {job.closingNote}</p>}
    </Panel>
  );
}

function targetsOf({ targets, unit, rotor, site }: BalanceJobDto): string {
  const { decimalMark } = site;
  const said = [
    targets.oneX === null
      ? null
      : `1x below ${formatQuantity(targets.oneX, unit, { decimalMark })}`,
    targets.zone === null ? null : `overall in zone ${targets.zone} or better`,
    targets.grade ? `estimate within G ${rotor.grade === null ? NOT_KNOWN : rotor.grade}` : null,
  ].filter((one) => one !== null);
  return said.length === 0 ? 'none set' : said.join('; ');
}
