/** Where in a job a caution stands. */
export type CautionStep =
  | 'opening a job'
  | 'hands on the rotor'
  | 'before each start'
  | 'fitting a weight'
  | 'closing a job';

/** A safety caution: its words, where it stands, and what a person confirms. */
export type Caution = {
  readonly id: string;
  /** Raised with every change of the words, so that a record shows which words were ticked. */
  readonly version: number;
  readonly step: CautionStep;
  readonly text: string;
  readonly needsTick: boolean;
  /** The person who did it at the machine is named. */
  readonly needsName: boolean;
};

/**
 * Stands on every job. The rules of the place and the work of people licensed for it come before
 * anything that this record says.
 */
export const STANDING_SENTENCE =
  'This record helps with arithmetic and memory and controls nothing. The isolation, lock-out and permit rules of your site, ' +
  'the limits of the machine’s maker, the law where you are and the judgement of qualified, licensed people come first.';

/**
 * The cautions of a balance job, in words of our own. They cannot be switched off; a site may add its
 * own. Basis: 29 CFR 1910.147 and local equivalents, 1910.146, 1910.212, ISO 21940-13, and common practice.
 */
export const CAUTIONS = {
  'SAF-01': {
    id: 'SAF-01',
    version: 1,
    step: 'hands on the rotor',
    text:
      'Hands on the rotor only when every energy source is isolated, locked by your own lock and tried: ' +
      'electricity, belt, gravity, pressure, draught. Your site’s lock-out rules decide how.',
    needsTick: true,
    needsName: true,
  },
  'SAF-02': {
    id: 'SAF-02',
    version: 1,
    step: 'before each start',
    text:
      'Every run lifts the lock-out: tools out, people clear, each lock taken off by its owner. ' +
      'After the run, isolate and lock again before anybody touches the rotor.',
    needsTick: true,
    needsName: true,
  },
  'SAF-03': {
    id: 'SAF-03',
    version: 1,
    step: 'hands on the rotor',
    text: 'Wait until it stands still. Draught can turn a fan: close the dampers and block or brace the rotor.',
    needsTick: true,
    needsName: false,
  },
  'SAF-04': {
    id: 'SAF-04',
    version: 1,
    step: 'before each start',
    text:
      'Guards back, cables of sensor and tacho clear of the shaft, no loose clothing, and nobody in the plane of the wheel ' +
      'or the coupling during run-up.',
    needsTick: true,
    needsName: true,
  },
  'SAF-05': {
    id: 'SAF-05',
    version: 1,
    step: 'opening a job',
    text:
      'A fan casing, duct or scrubber may be a confined space: test the air, have an attendant and a way to rescue, ' +
      'and the permit your site asks for.',
    needsTick: true,
    needsName: false,
  },
  'SAF-06': {
    id: 'SAF-06',
    version: 1,
    step: 'fitting a weight',
    text:
      'Weigh the mass on a scale, fasteners included. Its fixing must carry at least five times the force shown here, ' +
      'and the maker’s rule if it is to stay. Lock clamp screws; clip on a piece only where turning seats it.',
    needsTick: true,
    needsName: false,
  },
  'SAF-09': {
    id: 'SAF-09',
    version: 1,
    step: 'before each start',
    text:
      'Count the starts: a motor stands only so many an hour and needs time to cool. No extra start without asking ' +
      'whoever is responsible for the machine.',
    needsTick: false,
    needsName: false,
  },
  'SAF-10': {
    id: 'SAF-10',
    version: 1,
    step: 'fitting a weight',
    text:
      'Welding on a rotor: earth clamp on the rotor next to the weld, never through the bearings. Hot-work permit, ' +
      'fire watch and gas test as your site asks; metal that matches the wheel; no weld where its maker forbids it.',
    needsTick: true,
    needsName: false,
  },
  'SAF-14': {
    id: 'SAF-14',
    version: 1,
    step: 'closing a job',
    text:
      'Hand back: tools counted, temporary weights gone or made permanent, guards on, each lock taken off by its owner, ' +
      'and the area owner told.',
    needsTick: true,
    needsName: true,
  },
} as const satisfies Readonly<Record<string, Caution>>;
