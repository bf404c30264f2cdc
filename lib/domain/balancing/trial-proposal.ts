import { centrifugalForceN, unbalanceOfForceGmm, weightN } from './centrifugal-force';

/** What a proposal of a trial weight looks at. */
export type TrialProposalInput = {
  readonly radiusMm: number;
  readonly speedRpm: number;
  readonly rotorMassKg: number;
  /** Static load of the nearest bearing, N; given on two-plane jobs, the rotor's weight otherwise. */
  readonly bearingLoadN?: number | null;
  /** Most that the plane takes, g. */
  readonly planeLimitG?: number | null;
  /** Typical correction of past jobs, g at this radius. */
  readonly pastCorrectionG?: number | null;
  /** Size of a known coefficient, per g·mm, and the reading now: gives a mass by effect. */
  readonly response?: { readonly perGmm: number; readonly amplitudeNow: number } | null;
};

/** A trial weight to fit, and what it means. */
export type TrialProposal = {
  readonly massG: number;
  readonly basis: 'known response' | 'force cap' | 'plane limit' | 'past corrections';
  readonly forceN: number;
  readonly forcePctOfLoad: number;
  readonly forceCapG: number;
  readonly expectedChange: number | null;
  /** Where the trial is proposed: at the mark, because there it is right whichever way degrees are counted. */
  readonly angleDeg: number;
};

/** Force cap as a share of the load (common practice), and the effect aimed at. */
const CAP_SHARE = 0.1;
const AIMED_EFFECT = 0.4;
const PAST_SHARE = 0.3;

/**
 * A trial weight that is heard and does no harm: with a known response the mass that changes the
 * reading by 40 %, otherwise 30 % of past corrections; never above the force cap (10 % of the load at
 * speed) or the plane's limit.
 *
 * @returns mass in g at the given radius, its force in N and % of the load
 * Source: handbook rules of thumb (10 % of the static load).
 * @example 210 kg, 1480 r/min, 400 mm, nothing known → cap 21.4 g, 206 N
 */
export function proposeTrial(input: TrialProposalInput): TrialProposal {
  const loadN = input.bearingLoadN ?? weightN(input.rotorMassKg);
  const forceCapG = trialCapG({ ...input, loadN });
  const wanted = wantedMass(input);
  const capped = [
    { massG: forceCapG, basis: 'force cap' as const },
    ...(input.planeLimitG ? [{ massG: input.planeLimitG, basis: 'plane limit' as const }] : []),
    ...(wanted ? [wanted] : []),
  ].reduce((least, next) => (next.massG < least.massG ? next : least));
  const unbalanceGmm = capped.massG * input.radiusMm;
  const forceN = centrifugalForceN(unbalanceGmm, input.speedRpm);
  return {
    ...capped,
    forceN,
    forcePctOfLoad: (100 * forceN) / loadN,
    forceCapG,
    expectedChange: input.response ? input.response.perGmm * unbalanceGmm : null,
    angleDeg: 0,
  };
}

/**
 * The mass whose force at speed is 10 % of a static load, g.
 * Source: handbook rule of thumb. Example: 500 kg at 500 mm and 1488 r/min allow 40.4 g.
 */
export function trialCapG(input: {
  readonly radiusMm: number;
  readonly speedRpm: number;
  readonly loadN: number;
}): number {
  return unbalanceOfForceGmm(CAP_SHARE * input.loadN, input.speedRpm) / input.radiusMm;
}

/**
 * The mass that changes a reading by `change`, g at a radius, from the size of a coefficient.
 * Source: definition of the coefficient. Example: 1.727 mm/s at 1.34e-4 per g·mm and 500 mm is 25.8 g.
 */
export function massForChangeG(change: number, perGmm: number, radiusMm: number): number {
  return change / (perGmm * radiusMm);
}

function wantedMass({
  response,
  radiusMm,
  pastCorrectionG,
}: TrialProposalInput): Pick<TrialProposal, 'massG' | 'basis'> | null {
  if (response && response.perGmm > 0 && response.amplitudeNow > 0) {
    const change = AIMED_EFFECT * response.amplitudeNow;
    return { massG: massForChangeG(change, response.perGmm, radiusMm), basis: 'known response' };
  }
  if (!pastCorrectionG) return null;
  return { massG: PAST_SHARE * pastCorrectionG, basis: 'past corrections' };
}
