import { Notice } from '@/components/ui/notice';
import { formatDegrees, formatNumber } from '@/lib/format';
import type { TrialComparisonDto } from '@/lib/schemas/balance-job-parts';

/** What the trial runs say beside the coefficient book, before any more weight goes on. */
export function TrialsAgainstBook({ trials }: { trials: readonly TrialComparisonDto[] }) {
  const doubtful = trials.filter(({ agrees }) => !agrees);
  if (trials.length === 0) return null;
  if (doubtful.length === 0)
    return <p className="text-sm">The coefficient book agrees with what the trial runs say.</p>;
  const mirrored = doubtful.some(({ sensesSuspect }) => sensesSuspect);
  return (
    <Notice
      kind="caution"
      title={
        mirrored
          ? 'Were degrees counted the other way? The trial answers like its mirror image'
          : 'This rotor answered differently in earlier jobs'
      }
    >
      <ul>
        {doubtful.map(({ planeName, pointLabel, ratio, turnDeg }) => (
          <li key={`${planeName} ${pointLabel}`}>
            Plane {planeName} at {pointLabel}: {formatNumber(ratio, { decimals: 2 })} times the size
            in the book, turned by {formatDegrees(turnDeg, 0)}.
          </li>
        ))}
      </ul>
      <p>
        {mirrored
          ? 'Go and look where the trial weight hangs, and whether the instrument shows lag or lead, before anything else is fitted.'
          : 'Look at the weight, its plane, the sensors, the mark and the supports before you go on.'}
      </p>
    </Notice>
  );
}
