const DAY_MS = 86_400_000;

/** Length of the demo's past: a little over 14 months, counted from day 0 of the models. */
export const DEMO_DAYS = 427;

/** Turns days of the models into instants; the last day ends at midnight UTC of `today`. */
export class DemoCalendar {
  readonly endMs: number;

  constructor(now: Date) {
    this.endMs = Math.floor(now.getTime() / DAY_MS) * DAY_MS;
  }

  /** The instant of a day of the models at a time of that day, UTC. */
  at(day: number, hour = 0, minute = 0): Date {
    const startMs = this.endMs - DEMO_DAYS * DAY_MS;
    return new Date(startMs + day * DAY_MS + (hour * 60 + minute) * 60_000);
  }

  /** The day of the models at an instant, with its fraction. */
  dayOf(at: Date): number {
    return (at.getTime() - this.endMs) / DAY_MS + DEMO_DAYS;
  }
}
