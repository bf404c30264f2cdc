import 'server-only';
import type { DueMachine, DueReading } from '@/lib/domain/due/due-machine';
import { median } from '@/lib/domain/trends/order-statistics';
import { dayOfInstant } from '@/lib/domain/trends/trend-line';
import { shortTurnDeg } from '@/lib/domain/units';
import type { BreakRow, DirectionRow, DueRows, RulingRow, SeriesRow } from './due-rows';

/** Horizontal and vertical compare only where they were taken in one visit. */
const ONE_VISIT_DAYS = 1;
const YEAR_DAYS = 365;

/** A machine with everything that a card needs. */
export type RankedRow = RulingRow & {
  ab: number;
  bc: number;
  cd: number;
  pointId: number;
  pointLabel: string;
  bearingId: number;
};

/** What the board knows of one machine, with days counted on the time line of `dayOfInstant`. */
export function dueMachineOf(row: RankedRow, rows: DueRows, now: Date): DueMachine {
  const today = dayOfInstant(now.getTime());
  const readings = (rows.series.get(row.pointId) ?? []).map((one) => readingOf(one, row.setupId));
  const latestDay = readings.at(-1)?.day ?? today;
  const breaks = rows.breaks.get(row.machineId) ?? [];
  const visit = (rows.directions.get(row.bearingId) ?? []).filter(
    ({ at }) => Math.abs(dayOf(at) - latestDay) <= ONE_VISIT_DAYS,
  );
  return {
    tag: row.tag,
    criticality: row.criticality,
    boundaries: { ab: row.ab, bc: row.bc, cd: row.cd },
    readings,
    breakDays: breaks.filter((one) => one.breaks).map(({ at }) => dayOf(at)),
    readingAgeDays: today - latestDay,
    ...directionsOf(visit, row.setupId),
    ...balancesOf(breaks, today),
    blockingFindings: [],
  };
}

/** Days of an instant as a row brings it. */
export function dayOf(at: Date | string): number {
  return dayOfInstant(new Date(at).getTime());
}

function readingOf(row: SeriesRow, setupId: number | null): DueReading {
  return {
    day: dayOf(row.at),
    value: row.value,
    oneX: row.oneX,
    lagDeg: isOfSetup(row, setupId) ? row.lagDeg : null,
    speedRpm: row.speedRpm,
  };
}

// A lag of an older set-up counts from another mark: it does not compare.
function isOfSetup(row: { setupId: number | null }, setupId: number | null): boolean {
  return row.setupId === null || setupId === null || row.setupId === setupId;
}

function directionsOf(visit: readonly DirectionRow[], setupId: number | null) {
  const [h, v] = (['H', 'V'] as const).map((name) =>
    visit.find(({ direction }) => direction === name),
  );
  if (!h || !v) return { horizontalOverVertical: null, horizontalLessVerticalLagDeg: null };
  const hasLags = isOfSetup(h, setupId) && isOfSetup(v, setupId);
  return {
    horizontalOverVertical: v.oneX > 0 ? h.oneX / v.oneX : null,
    horizontalLessVerticalLagDeg:
      hasLags && h.lagDeg !== null && v.lagDeg !== null ? shortTurnDeg(v.lagDeg, h.lagDeg) : null,
  };
}

function balancesOf(breaks: readonly BreakRow[], today: number) {
  const days = breaks.filter(({ isBalance }) => isBalance).map(({ at }) => dayOf(at));
  const lives = days.slice(1).map((day, index) => day - (days[index] ?? day));
  const last = days.at(-1);
  return {
    daysSinceBalance: last === undefined ? null : today - last,
    balanceLifeDays: lives.length === 0 ? null : median(lives),
    balancesInYear: days.filter((day) => today - day <= YEAR_DAYS).length,
  };
}
