import { Fact, Facts } from '@/components/ui/fact';
import { Value } from '@/components/ui/value';
import { ZoneStamp } from '@/components/ui/zone-stamp';
import { formatDays, formatLag, formatMass, formatPlural, formatQuantity } from '@/lib/format';
import type { MachinePageDto } from '@/lib/schemas/register';
import { isTrial } from './is-trial';

/** The first line of the sheet: zone, worst point, 1x, weights, days since balance. */
export function HeadFacts({ machine }: { machine: MachinePageDto }) {
  return (
    <Facts>
      <Vibration machine={machine} />
      <Fact label="weights on rotor">{weightsOf(machine)}</Fact>
      <Fact label="days since balance">
        {machine.balancedAt ? formatDays(machine.balancedAt, new Date()) : 'never balanced here'}
      </Fact>
      <Fact label="what it is">{identityOf(machine)}</Fact>
      {machine.missing.length > 0 && (
        <Fact label="not known yet">{machine.missing.join(', ')}</Fact>
      )}
    </Facts>
  );
}

function Vibration({ machine }: { machine: MachinePageDto }) {
  const { worst } = machine;
  const ruling = machine.points.find(({ id }) => id === worst?.pointId);
  const options = { decimalMark: machine.site.decimalMark };
  const shown = { unit: 'mm/s', detection: 'rms', size: 'large', options } as const;
  if (!worst || !ruling)
    return (
      <Fact label="zone">
        <ZoneStamp zone={null} withWord />
      </Fact>
    );
  return (
    <>
      <Fact label="zone">
        <ZoneStamp zone={worst.zone} withWord />
      </Fact>
      <Fact label={`overall, worst point ${worst.label}`}>
        <Value amount={worst.overall} {...shown} />
      </Fact>
      <Fact label={`1x, ${ruling.label}`}>
        <Value amount={ruling.oneX} {...shown} />
        {ruling.lagDeg !== null && <span className="figures">{formatLag(ruling.lagDeg)}</span>}
      </Fact>
    </>
  );
}

function weightsOf({ planes, site }: MachinePageDto): string {
  const weights = planes.flatMap((plane) => plane.weights);
  if (weights.length === 0) return 'none recorded';
  const total = weights.reduce((sum, { massG }) => sum + massG, 0);
  const said = `${formatPlural(weights.length, 'weight')}, ${formatMass(total, site.decimalMark)}`;
  const trials = weights.filter(isTrial).length;
  return trials === 0 ? said : `${said}, of which ${formatPlural(trials, 'trial weight')}`;
}

function identityOf({ kind, nominalSpeedRpm, powerKw, criticality }: MachinePageDto): string {
  const power = powerKw === null ? [] : [formatQuantity(powerKw, 'kW')];
  const speed = formatQuantity(nominalSpeedRpm, 'r/min');
  return [kind, speed, ...power, `criticality ${criticality}`].join(', ');
}
