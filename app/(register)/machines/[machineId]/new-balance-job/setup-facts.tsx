import { Fact, Facts } from '@/components/ui/fact';
import { formatDegrees, formatMass, formatPlural, formatRotorAngle } from '@/lib/format';
import type { NewJobDto } from '@/lib/schemas/balance-job';

/** Mark, tacho, sense of rotation and what hangs on the rotor, to be compared with the machine. */
export function SetupFacts({ dto }: { dto: NewJobDto }) {
  const { setup, ledger } = dto;
  return (
    <>
      <Facts>
        <Fact label={`mark, set-up ${setup.number}`}>{setup.mark}</Fact>
        <Fact label="tacho, from top in the direction of rotation">
          <span className="figures">{formatDegrees(setup.tachoDeg)}</span> {setup.tachoEdge} edge
        </Fact>
        <Fact label="rotation, seen from the drive end">{setup.rotationFromDriveEnd}</Fact>
        <Fact label="rotor">{dto.rotorName}</Fact>
        <Fact label="coefficient book">
          {dto.estimates === 0 ? 'empty' : formatPlural(dto.estimates, 'estimate')}
        </Fact>
      </Facts>
      <h3 className="mt-4 text-sm font-semibold">On the rotor now</h3>
      {ledger.length === 0 ? (
        <p className="text-ink-soft">No weight is recorded.</p>
      ) : (
        <ul className="mt-1">
          {ledger.map((weight) => (
            <li key={weight.id}>
              Plane {weight.planeName}: <span className="figures">{formatMass(weight.massG)}</span>{' '}
              at <span className="figures">{formatRotorAngle(weight.angleDeg)}</span>
              {weight.positionLabel && ` (${weight.positionLabel})`}, {weight.fixing}
            </li>
          ))}
        </ul>
      )}
    </>
  );
}
