/** Evaluation zone of a broad-band value (ISO 20816-1). */
export type Zone = 'A' | 'B' | 'C' | 'D';

/** What each zone means, in the words of this register. */
export const ZONE_MEANING: Readonly<Record<Zone, string>> = {
  A: 'as new',
  B: 'fine',
  C: 'put right soon',
  D: 'act',
};

/** Boundaries A/B, B/C and C/D in the unit of the value judged, rising. */
export type ZoneBoundaries = { readonly ab: number; readonly bc: number; readonly cd: number };

/** Boundaries with the speeds they hold for, r/min, both ends included; null: no such end. */
export type ZoneLimits = {
  readonly boundaries: ZoneBoundaries;
  readonly speedMinRpm: number | null;
  readonly speedMaxRpm: number | null;
};

/** A zone, or why there is none: no zone is better than a wrong one. */
export type ZoneVerdict =
  | { readonly kind: 'zone'; readonly zone: Zone }
  | {
      readonly kind: 'no zone';
      readonly code: 'NO_VALUE' | 'NO_LIMITS' | 'SPEED_OUTSIDE';
      readonly reason: string;
    };

/**
 * The zone of a value that is known to be a number ≥ 0, in the boundaries' unit and detector. A
 * value equal to a boundary belongs to the lower, better zone. Source: zones of ISO 20816-1; the
 * standard leaves the boundary itself open, the choice is ours.
 *
 * Example: with 1.4/2.8/4.5 mm/s rms, 1.40 is A and 1.41 is B.
 */
export function zoneOf(value: number, { ab, bc, cd }: ZoneBoundaries): Zone {
  if (value <= ab) return 'A';
  if (value <= bc) return 'B';
  return value <= cd ? 'C' : 'D';
}

/**
 * The zone of a reading, or 'no zone' when the value is not a number ≥ 0, when there are no limits,
 * or when `speedRpm` lies outside the speeds the limits hold for. A null speed is not checked: the
 * caller passes the nominal speed where none was recorded.
 *
 * Example: 1.2 mm/s rms at 90 r/min under limits for 120 to 30 000 r/min has no zone.
 */
export function judgeValue(
  value: number,
  limits: ZoneLimits | null,
  speedRpm: number | null,
): ZoneVerdict {
  if (!(value >= 0 && value < Infinity))
    return noZone('NO_VALUE', 'There is no value to judge: take the reading again.');
  if (limits === null)
    return noZone('NO_LIMITS', 'No limits are in use here: choose a limit set for the machine.');
  if (speedRpm !== null && !coversSpeed(limits, speedRpm))
    return noZone(
      'SPEED_OUTSIDE',
      `${String(Math.round(speedRpm))} r/min is outside the speeds this limit set holds for (${speedSpan(limits)}): choose one for this speed.`,
    );
  return { kind: 'zone', zone: zoneOf(value, limits.boundaries) };
}

/** The worse of two verdicts; a zone is worse than no zone. Example: B and C give C. */
export function worseVerdict(one: ZoneVerdict, other: ZoneVerdict): ZoneVerdict {
  if (other.kind === 'no zone') return one;
  if (one.kind === 'no zone') return other;
  return other.zone > one.zone ? other : one;
}

/** Whether limits hold at a speed, both ends included. Example: 120 r/min is inside 120–30 000. */
export function coversSpeed(
  { speedMinRpm, speedMaxRpm }: Pick<ZoneLimits, 'speedMinRpm' | 'speedMaxRpm'>,
  speedRpm: number,
): boolean {
  return speedRpm >= (speedMinRpm ?? 0) && speedRpm <= (speedMaxRpm ?? Infinity);
}

function noZone(
  code: Extract<ZoneVerdict, { kind: 'no zone' }>['code'],
  reason: string,
): ZoneVerdict {
  return { kind: 'no zone', code, reason };
}

function speedSpan({ speedMinRpm, speedMaxRpm }: ZoneLimits): string {
  if (speedMaxRpm === null) return `from ${String(speedMinRpm)} r/min`;
  return `${String(speedMinRpm ?? 0)} to ${String(speedMaxRpm)} r/min`;
}
