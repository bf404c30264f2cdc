import { Notice } from '@/components/ui/notice';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { countedInSense } from '@/lib/domain/balancing/convert-angle';
import {
  formatDegrees,
  formatExact,
  formatLag,
  formatMass,
  formatNumber,
  formatQuantity,
  type DecimalMark,
} from '@/lib/format';
import type { AnswerDto, PointDto } from '@/lib/schemas/balance-job';
import { PlaceInWords, type PlaceSetup, type PlacePlane } from './place-in-words';

/** What an answer is read against: a balance job, or runs typed on the workbench. */
export type AnswerGround = {
  readonly unit: string;
  readonly site: { readonly decimalMark: DecimalMark };
  readonly planes: readonly (PlacePlane & { readonly id: number })[];
  readonly points: readonly Pick<PointDto, 'id' | 'label'>[];
  readonly setup: PlaceSetup;
  /** How the people at the machine count degrees; what is stored counts against rotation. */
  readonly angleSense: 'against' | 'with';
};

type AnswerCardProps = { job: AnswerGround; answer: AnswerDto };

/** Where the weight belongs: plane, grams, place in several ways, force, and what to expect after. */
export function AnswerCard({ job, answer }: AnswerCardProps) {
  return (
    <div className="flex flex-col gap-4">
      {answer.warnings.map((warning) => (
        <Notice key={warning} kind="caution">
          {warning}
        </Notice>
      ))}
      <Weights job={job} answer={answer} />
      {answer.planes.map((plane) => (
        <PlaceInWords
          key={plane.planeId}
          plane={job.planes.find(({ id }) => id === plane.planeId)}
          setup={job.setup}
          angleDeg={plane.angleDeg}
        />
      ))}
      <Expected job={job} answer={answer} />
    </div>
  );
}

function Weights({ job, answer }: AnswerCardProps) {
  const mark = job.site.decimalMark;
  const countsWith = job.angleSense === 'with';
  return (
    <Table caption="Add to what is on the rotor now" captionShown roomy>
      <thead>
        <tr>
          <Th>plane</Th>
          <Th numeric>add</Th>
          {countsWith && <Th numeric>at, with rotation, as you count</Th>}
          <Th numeric>at, against rotation</Th>
          <Th numeric>radius</Th>
          <Th numeric>force</Th>
          <Th numeric>uncertainty</Th>
          <Th numeric>total from as found, against rotation</Th>
        </tr>
      </thead>
      <tbody>
        {answer.planes.map((plane) => (
          <tr key={plane.planeId}>
            <RowHead>{plane.planeName}</RowHead>
            <Td numeric className="text-base font-semibold">
              {formatMass(plane.massG, mark)}
            </Td>
            {countsWith && (
              <Td numeric className="text-base font-semibold">
                {formatDegrees(countedInSense(plane.angleDeg, 'with'), 1, mark)}
              </Td>
            )}
            <Td numeric className="text-base font-semibold">
              {formatDegrees(plane.angleDeg, 1, mark)}
            </Td>
            <Td numeric>{formatQuantity(plane.radiusMm, 'mm')}</Td>
            <Td numeric>{formatQuantity(plane.forceN, 'N')}</Td>
            <Td numeric>{uncertainty(plane.uncertaintyG, plane.uncertaintyDeg)}</Td>
            <Td numeric>
              {formatMass(plane.totalMassG, mark)} at {formatDegrees(plane.totalAngleDeg, 1, mark)}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function Expected({ job, answer }: AnswerCardProps) {
  const { parts } = answer;
  return (
    <div className="text-sm">
      <p>
        Expected after fitting exactly this:{' '}
        {answer.predicted.map((point, index) => (
          <span key={point.pointId}>
            {index > 0 && '; '}
            {point.label}{' '}
            <span className="figures">
              {smallOr(point.amplitude, job.unit)}
              {point.band !== null && ` ± ${formatNumber(point.band)}`}
            </span>
          </span>
        ))}
        .
      </p>
      <p className="text-ink-soft">
        Condition number <span className="figures">{formatNumber(answer.condition.number)}</span> (
        {CONDITION_WORDS[answer.condition.verdict]}); misfit of all runs{' '}
        <span className="figures">{smallOr(answer.misfit, job.unit)}</span>; method {answer.method}.
        {parts &&
          ` Static part ${formatMass(parts.static.massG)} in each plane at ${formatDegrees(parts.static.angleDeg, 1)}, couple part ${formatMass(parts.couple.massG)} at ${formatDegrees(parts.couple.angleDeg, 1)} in the first plane and opposite in the second.`}
      </p>
      <details className="mt-1">
        <summary className="cursor-pointer">Influence coefficients used</summary>
        <ul>
          {answer.coefficients.map((h) => (
            <li key={`${h.planeId}-${h.pointId}`}>
              Plane {nameOf(job.planes, h.planeId)} to{' '}
              {job.points.find(({ id }) => id === h.pointId)?.label}:{' '}
              <span className="figures">
                {formatQuantity(h.sizePerKgMm, `${job.unit} per kg·mm`)} at {formatLag(h.deg)}
              </span>
            </li>
          ))}
        </ul>
      </details>
    </div>
  );
}

const CONDITION_WORDS = {
  good: 'good',
  caution: 'with care: small errors of reading move the weights a lot',
  withhold: 'too high: the planes cannot be told apart',
} as const;

/** Nobody reads less than a hundredth: below it the number is only rounding. */
function smallOr(amplitude: number, unit: string): string {
  return amplitude < 0.01 ? `below ${formatExact(0.01, unit)}` : formatQuantity(amplitude, unit);
}

function uncertainty(grams: number | null, degrees: number | null): string {
  if (grams === null || degrees === null) return 'not known: one base run';
  return `± ${formatMass(grams)}, ± ${formatDegrees(degrees)}`;
}

function nameOf(planes: AnswerGround['planes'], id: number): string {
  return planes.find((plane) => plane.id === id)?.name ?? '';
}
