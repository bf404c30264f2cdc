import { SIGNIFICANT_SHARE_OF_BC } from '../severity/change-rule';
import { severityIndex } from '../severity/severity-index';
import { HORIZON_DAYS } from '../trends/crossing';
import { clamp } from './clamp';
import type { Criticality, DueMachine, DuePart } from './due-machine';
import type { Standing } from './standing';

const CONSEQUENCE: Readonly<Record<Criticality, number>> = { A: 1, B: 0.7, C: 0.4, D: 0.15 };
const TIME_HORIZON_DAYS = 180;
const MONTH_DAYS = 30;

/**
 * The five parts of "how soon", each 0 to 1, in the order severity, time left, growth, consequence,
 * balance age. The curve and the horizon are proposals of this register.
 *
 * - severity Z: `severityIndex` of the larger of fit and latest
 * - time left T: `clamp((180 − t)/180)`, t the early day to the boundary ahead; 1 in D, 0 where none is expected
 * - growth G: slope per 30 days over 25 % of B/C
 * - consequence C: criticality A 1, B 0.7, C 0.4, D 0.15
 * - balance age A: days since balance over the median balance life; 0 where unknown
 *
 * Example: early day 72.4 gives T 0.598; 0.49 mm/s per 30 days with B/C 2.8 gives G 0.70.
 */
export function urgencyParts(machine: DueMachine, standing: Standing): DuePart[] {
  return [
    severityPart(machine, standing),
    timePart(standing),
    growthPart(machine, standing),
    consequencePart(machine),
    agePart(machine),
  ];
}

function severityPart(
  { boundaries }: DueMachine,
  { ruling, latest, fitNow, zone }: Standing,
): DuePart {
  return {
    key: 'severity',
    symbol: 'Z',
    value: severityIndex(ruling, boundaries),
    inputs: [
      { label: 'latest', value: latest.value, unit: 'mm/s rms' },
      { label: 'trend today', value: fitNow, unit: 'mm/s rms' },
    ],
    because: `The latest reading lies in zone ${zone}.`,
  };
}

function timePart({ zone, crossing, boundary }: Standing): DuePart {
  const isExpected = crossing !== null && crossing.kind !== 'no crossing expected';
  const early = isExpected ? crossing.earlyDays : null;
  const inTime = early === null ? 0 : clamp((TIME_HORIZON_DAYS - early) / TIME_HORIZON_DAYS);
  return {
    key: 'time left',
    symbol: 'T',
    value: zone === 'D' ? 1 : inTime,
    inputs: [
      { label: 'early', value: early, unit: 'd' },
      { label: 'middle', value: isExpected ? crossing.middleDays : null, unit: 'd' },
      { label: 'late', value: isExpected ? crossing.lateDays : null, unit: 'd' },
    ],
    because: timeWords(zone === 'D', early, boundary?.name ?? ''),
  };
}

function timeWords(isInD: boolean, early: number | null, boundary: string): string {
  if (isInD) return 'Zone D: there is no time left.';
  if (early === null) return `No crossing of ${boundary} is expected from these readings.`;
  if (early > HORIZON_DAYS) return `${boundary} is not expected within a year.`;
  if (early < 1) return `${boundary} may be passed already.`;
  return `${boundary} is reached in ${String(Math.round(early))} days at the earliest.`;
}

function growthPart({ boundaries }: DueMachine, { trend }: Standing): DuePart {
  const monthly = trend === null ? null : trend.perDay * MONTH_DAYS;
  const share = monthly === null ? 0 : monthly / (SIGNIFICANT_SHARE_OF_BC * boundaries.bc);
  return {
    key: 'growth',
    symbol: 'G',
    value: clamp(share),
    inputs: [{ label: 'growth', value: monthly, unit: 'mm/s per 30 d' }],
    because: growthWords(monthly, share),
  };
}

function growthWords(monthly: number | null, share: number): string {
  if (monthly === null) return 'Too few readings since the last break for a trend.';
  if (monthly <= 0) return 'It does not grow.';
  return `One month brings ${String(Math.round(100 * share))} % of a significant change.`;
}

function consequencePart({ criticality }: DueMachine): DuePart {
  return {
    key: 'consequence',
    symbol: 'C',
    value: CONSEQUENCE[criticality],
    inputs: [],
    because: `Criticality ${criticality}.`,
  };
}

function agePart({ daysSinceBalance, balanceLifeDays }: DueMachine): DuePart {
  const known = daysSinceBalance !== null && balanceLifeDays !== null && balanceLifeDays > 0;
  return {
    key: 'balance age',
    symbol: 'A',
    value: known ? clamp(daysSinceBalance / balanceLifeDays) : 0,
    inputs: [
      { label: 'since balance', value: daysSinceBalance, unit: 'd' },
      { label: 'median balance life', value: balanceLifeDays, unit: 'd' },
    ],
    because: ageWords(daysSinceBalance, known ? balanceLifeDays : null),
  };
}

function ageWords(days: number | null, life: number | null): string {
  if (days === null) return 'No balance is on record.';
  const since = `Balanced ${String(Math.round(days))} days ago`;
  return life === null
    ? `${since}; how long a balance lasts here is not known yet.`
    : `${since}; a balance lasts about ${String(Math.round(life))} days here.`;
}
