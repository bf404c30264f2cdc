import {
  formatDegrees,
  formatExact,
  formatLag,
  formatMass,
  formatNumber,
  formatQuantity,
  type DecimalMark,
} from '@/lib/format';
import type { AnswerDto } from '@/lib/schemas/balance-job';
import type { AnswerGround } from './answer-ground';

type ExpectedProps = { job: AnswerGround; answer: AnswerDto };

/** What the points should read once the answer hangs there, and what that rests on. */
export function Expected({ job, answer }: ExpectedProps) {
  const { parts } = answer;
  const { decimalMark } = job.site;
  return (
    <div className="text-sm">
      <p>
        Expected after fitting exactly this:{' '}
        {answer.predicted.map((point, index) => (
          <span key={point.pointId}>
            {index > 0 && '; '}
            {point.label}{' '}
            <span className="figures">
              {smallOr(point.amplitude, job.unit, decimalMark)}
              {point.band !== null && ` ± ${formatNumber(point.band, { decimalMark })}`}
            </span>
          </span>
        ))}
        .
      </p>
      <p className="text-ink-soft">
        Condition number{' '}
        <span className="figures">{formatNumber(answer.condition.number, { decimalMark })}</span> (
        {CONDITION_WORDS[answer.condition.verdict]}); misfit of all runs{' '}
        <span className="figures">{smallOr(answer.misfit, job.unit, decimalMark)}</span>; method{' '}
        {answer.method}.
        {parts &&
          ` Static part ${formatMass(parts.static.massG, decimalMark)} in each plane at ${formatDegrees(parts.static.angleDeg, 1, decimalMark)}, couple part ${formatMass(parts.couple.massG, decimalMark)} at ${formatDegrees(parts.couple.angleDeg, 1, decimalMark)} in the first plane and opposite in the second.`}
      </p>
      <details className="mt-1">
        <summary className="cursor-pointer">Influence coefficients used</summary>
        <ul>
          {answer.coefficients.map((h) => (
            <li key={`${h.planeId}-${h.pointId}`}>
              Plane {nameOf(job.planes, h.planeId)} to{' '}
              {job.points.find(({ id }) => id === h.pointId)?.label}:{' '}
              <span className="figures">
                {formatQuantity(h.sizePerKgMm, `${job.unit} per kg·mm`, { decimalMark })} at{' '}
                {formatLag(h.deg)}
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
function smallOr(amplitude: number, unit: string, decimalMark: DecimalMark): string {
  return amplitude < 0.01
    ? `below ${formatExact(0.01, unit, decimalMark)}`
    : formatQuantity(amplitude, unit, { decimalMark });
}

function nameOf(planes: AnswerGround['planes'], id: number): string {
  return planes.find((plane) => plane.id === id)?.name ?? '';
}
