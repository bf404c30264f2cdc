/** A reason to hold a record that lies in its place and time rather than in its samples. */
export type RecordDoubt = {
  readonly code: 'LEVEL_UNLIKE' | 'UNLIKE_POINT' | 'SAME_TIME' | 'CLOCK_AHEAD' | 'CLOCK_OLD';
  readonly message: string;
};

/** What is known of a point before a record is judged there. */
export type PointHistory = {
  /** Overall velocities of the last kept records, mm/s rms, newest first. */
  readonly lastOverallsMmS: readonly number[];
  /** Third-octave distance to the last kept record there, dB; null where there is none. */
  readonly distanceDb: number | null;
  /** The point of the site whose last record is nearest, if it is another one. */
  readonly nearest: { readonly label: string; readonly distanceDb: number } | null;
  /** How far the nearest other record of the point lies in time, s; null where there is none. */
  readonly nearestRecordS: number | null;
};

/** How many kept overalls the level is compared with. */
export const LEVELS_COMPARED = 6;
/** A level beyond this factor of the usual one, either way, is a doubt. */
export const LEVEL_FACTOR = 4;
/** A record this far or further from the last one of its point, dB, is a doubt. */
export const DISTANCE_DOUBT_DB = 6;
const SAME_TIME_S = 60;
const AHEAD_MS_MAX = 5 * 60_000;
const AGE_DAYS_MAX = 400;

/**
 * The doubts about a record's place: its overall velocity (mm/s rms) is more than 4 times or less
 * than a quarter of the median of the last 6 kept at the point; its spectrum lies 6 dB or more (third
 * octaves) from the last one kept there, in which case the point it resembles most is named; another
 * record of the point lies within 60 s. Without a history nothing is doubted.
 */
export function placeDoubts(overallMmS: number, history: PointHistory): RecordDoubt[] {
  return [levelUnlike(overallMmS, history), unlikePoint(history), sameTime(history)].flatMap(
    (doubt) => doubt ?? [],
  );
}

/**
 * The doubts about a record's time against the clock of the register: more than 5 minutes ahead of
 * it, or more than 400 days behind. Both in milliseconds.
 *
 * Example: a record taken two years ago is `CLOCK_OLD`.
 */
export function clockDoubts(takenAtMs: number, nowMs: number): RecordDoubt[] {
  if (takenAtMs > nowMs + AHEAD_MS_MAX) {
    const message = 'The time taken lies ahead of now: check the clock of the instrument.';
    return [{ code: 'CLOCK_AHEAD', message }];
  }
  const days = Math.floor((nowMs - takenAtMs) / 86_400_000);
  if (days <= AGE_DAYS_MAX) return [];
  const message = `The time taken lies ${days} days back: check the clock of the instrument.`;
  return [{ code: 'CLOCK_OLD', message }];
}

function levelUnlike(overall: number, { lastOverallsMmS }: PointHistory): RecordDoubt | null {
  const compared = lastOverallsMmS.slice(0, LEVELS_COMPARED);
  const usual = median(compared);
  if (usual === null || usual <= 0) return null;
  const ratio = overall / usual;
  if (ratio <= LEVEL_FACTOR && ratio >= 1 / LEVEL_FACTOR) return null;
  const times = ratio > 1 ? `${short(ratio)} times` : `only ${short(ratio)} of`;
  return {
    code: 'LEVEL_UNLIKE',
    message: `The overall velocity, ${short(overall)} mm/s rms, is ${times} the usual ${short(usual)} of this point (median of ${compared.length}): check point, unit and state of the machine.`,
  };
}

function unlikePoint({ distanceDb, nearest }: PointHistory): RecordDoubt | null {
  if (distanceDb === null || distanceDb < DISTANCE_DOUBT_DB) return null;
  const unlike = `The spectrum lies ${distanceDb.toFixed(1)} dB from the last one kept here`;
  const message =
    nearest !== null && nearest.distanceDb < distanceDb
      ? `${unlike} and ${nearest.distanceDb.toFixed(1)} dB from that of ${nearest.label}: was it taken there?`
      : `${unlike}: check that the point is the right one.`;
  return { code: 'UNLIKE_POINT', message };
}

function sameTime({ nearestRecordS }: PointHistory): RecordDoubt | null {
  if (nearestRecordS === null || nearestRecordS > SAME_TIME_S) return null;
  const message = `Another record of this point was taken within ${SAME_TIME_S} s of this one: keep the one that counts.`;
  return { code: 'SAME_TIME', message };
}

function median(values: readonly number[]): number | null {
  const sorted = [...values].sort((a, b) => a - b);
  const upper = sorted[sorted.length >> 1];
  const lower = sorted[(sorted.length - 1) >> 1];
  return upper === undefined || lower === undefined ? null : (lower + upper) / 2;
}

function short(value: number): string {
  return String(Number(value.toPrecision(3)));
}
