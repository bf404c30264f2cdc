import type { ZoneLetter } from './register';

/** A machine whose point passed a zone boundary from one kept reading to the next. */
export type ZoneChange = {
  machineId: number;
  tag: string;
  name: string;
  siteName: string;
  timeZone: string;
  pointLabel: string;
  recordId: number;
  at: string;
  before: { value: number; zone: ZoneLetter };
  after: { value: number; zone: ZoneLetter };
};

/** Something entered about a machine. */
export type RecentEvent = {
  id: number;
  machineId: number;
  tag: string;
  at: string;
  timeZone: string;
  kind: string;
  text: string;
  person: string;
  balanceJobId: number | null;
};

export type RecentChangesDto = {
  /** How many days back they reach. */
  days: number;
  worse: ZoneChange[];
  better: ZoneChange[];
  events: RecentEvent[];
};
