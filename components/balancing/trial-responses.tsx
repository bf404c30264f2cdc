import { formatNumber, formatQuantity, type DecimalMark } from '@/lib/format';
import type { TrialCheck } from '@/lib/schemas/balance-job';

type TrialResponsesProps = { checks: readonly TrialCheck[]; decimalMark: DecimalMark };

/** How clearly each trial weight was heard. */
export function TrialResponses({ checks, decimalMark }: TrialResponsesProps) {
  if (checks.length === 0) return null;
  return (
    <ul className="text-sm">
      {checks.map((check) => (
        <li key={check.planeId}>
          Trial in plane {check.planeName}: the reading at {check.pointLabel} changed by{' '}
          <span className="figures">{formatQuantity(check.changePct, '%', { decimalMark })}</span>
          {check.changeOverNoise !== null && (
            <>
              ,{' '}
              <span className="figures">
                {formatNumber(check.changeOverNoise, { decimalMark })}
              </span>{' '}
              times the scatter
            </>
          )}
          : {VERDICT_WORDS[check.verdict]}
          {!check.thirtyRule && ' The trade’s 30 % or 30° rule is not met.'}
        </li>
      ))}
    </ul>
  );
}

const VERDICT_WORDS = {
  good: 'clear enough.',
  wide: 'enough for a wide band; a larger trial weight would be better.',
  refuse: 'too small to be told from the scatter. Fit a larger trial weight.',
  unknown: 'the scatter is not known from one base run.',
} as const;
