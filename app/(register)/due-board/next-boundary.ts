import { formatDate } from '@/lib/format';
import type { DueBoardCard } from '@/lib/schemas/due-board';

const DAY_MS = 86_400_000;

/** A late end beyond this says no more than that nobody knows. */
const LATE_MOST_DAYS = 730;

/** When the boundary ahead is reached, in words: “C/D between 3 Feb 2027 and 12 Mar 2027”. */
export function nextBoundaryWords(card: DueBoardCard, asOf: string): string {
  const { zone, boundary, crossing, trend } = card.standing;
  if (zone === 'D') return 'no time left';
  if (trend === null) return 'no trend yet';
  if (!boundary || !crossing || crossing.kind === 'no crossing expected') return 'none expected';
  if (crossing.kind === 'beyond the horizon') return `${boundary.name} not within a year`;
  const dateOf = (days: number) =>
    formatDate(new Date(new Date(asOf).getTime() + days * DAY_MS), card.timeZone);
  const { earlyDays, lateDays } = crossing;
  const early = earlyDays < 1 ? 'now' : dateOf(earlyDays);
  if (lateDays === null || lateDays > LATE_MOST_DAYS) return `${boundary.name} from ${early} on`;
  return `${boundary.name} between ${early} and ${dateOf(lateDays)}`;
}
