import { randomSource } from '@/lib/domain/plant-model/random-source';
import { DEMO_DAYS, type DemoCalendar } from './demo-calendar';
import type { DemoMachine } from './demo-machine';

/** One visit to one machine. */
export type Round = { readonly at: Date; readonly day: number; readonly speedRpm: number };

const EVERY_DAYS = 18;
const JITTER_DAYS = 5;

/** The rounds of a machine: every two to three weeks, in the morning, at nearly the same speed. */
export function roundsOf(machine: DemoMachine, calendar: DemoCalendar): Round[] {
  const random = randomSource(7919 * machine.number);
  const rounds: Round[] = [];
  const first = 2 + Math.floor(6 * random());
  const last = machine.spec.lastDay ?? DEMO_DAYS - 2;
  for (let i = 0; first + EVERY_DAYS * i <= last; i++) {
    const day = Math.min(last, first + EVERY_DAYS * i + Math.floor(JITTER_DAYS * random()));
    const at = calendar.at(day, 0, Math.round(60 * machine.roundHour));
    const speedRpm = machine.spec.speedRpm * (1 + 0.006 * (random() - 0.5));
    rounds.push({ at, day: calendar.dayOf(at), speedRpm: Math.round(speedRpm) });
  }
  return rounds;
}

/** When a point is read in a round: the machine is walked around, two minutes a point. */
export function readAt({ at }: Round, pointIndex: number): Date {
  return new Date(at.getTime() + pointIndex * 120_000);
}

/** The round after which an instrument keeps samples too: as its plan says, counted from the end. */
export function sampledFrom({ spec }: DemoMachine, rounds: readonly Round[]): number {
  const kept = { 'last round': 1, 'last rounds': 6 };
  return rounds.length - (spec.waveforms ? kept[spec.waveforms] : 0);
}
