import { describe, expect, it } from 'vitest';
import {
  naturalFrequencies,
  velocityAt,
  type RigidRotor,
  type Sensor,
  type SupportPair,
} from '@/scripts/simulate/rigid-rotor';

/** 100 kg on two equal supports 1 m apart, natural frequency of the shift 100 rad/s. */
const supports = (dampingRatio: number): SupportPair => {
  const dampingNsM = (2 * dampingRatio * 100 * 100) / 2;
  return { stiffnessNM: [5e5, 5e5], dampingNsM: [dampingNsM, dampingNsM] };
};
const rotor = (dampingRatio: number, over: Partial<RigidRotor> = {}): RigidRotor => ({
  massKg: 100,
  tiltInertiaKgM2: 100 * 0.3 ** 2,
  centreM: 0.5,
  spanM: 1,
  x: supports(dampingRatio),
  y: supports(dampingRatio),
  turning: 1,
  ...over,
});
const alongX: Sensor = { support: 0, deg: 0 };
const alongY: Sensor = { support: 0, deg: 90 };
const rpmOf = (radPerS: number) => (radPerS * 60) / (2 * Math.PI);
/** 10 g·m at the centre: e = 1e-4 m. */
const heavySpot = (deg: number) => ({ placeM: 0.5, kgM: 0.01, deg });

/** X/e in mm/s rms at Ω. */
const inMmS = (ratio: number, omega: number) => (1000 * ratio * 1e-4 * omega) / Math.SQRT2;

// Rotating unbalance: MX/(me) = r²/√((1−r²)² + (2ζr)²), tan φ = 2ζr/(1−r²); velocity leads displacement
// by 90°. S. S. Rao, Mechanical Vibrations, ch. 3 (from memory); the numbers were computed by hand.
describe('a symmetric rotor with its unbalance in the middle', () => {
  it('at resonance, ζ = 0.05: ten times the eccentricity, displacement 90° behind, velocity in phase', () => {
    const shown = velocityAt(rotor(0.05), rpmOf(100), [heavySpot(0)], alongX);
    expect(shown.rmsMmS).toBeCloseTo(inMmS(10, 100), 9);
    expect(Math.cos((shown.lagDeg * Math.PI) / 180)).toBeCloseTo(1, 9);
  });

  it('at twice the resonance without damping: 4/3 of the eccentricity, 180° behind', () => {
    const shown = velocityAt(rotor(0), rpmOf(200), [heavySpot(0)], alongX);
    expect(shown.rmsMmS).toBeCloseTo(inMmS(4 / 3, 200), 9);
    expect(shown.lagDeg).toBeCloseTo(90, 9);
  });

  it('at half the resonance without damping: a third of it, in phase', () => {
    const shown = velocityAt(rotor(0), rpmOf(50), [heavySpot(0)], alongX);
    expect(shown.rmsMmS).toBeCloseTo(inMmS(1 / 3, 50), 9);
    expect(shown.lagDeg).toBeCloseTo(270, 9);
  });

  it('at r = 1.5, ζ = 0.1: 2.25/√(1.25² + 0.3²) = 1.7504, tan φ = 0.3/−1.25, φ = 166.504°', () => {
    const shown = velocityAt(rotor(0.1), rpmOf(150), [heavySpot(40)], alongX);
    expect(shown.rmsMmS).toBeCloseTo(inMmS(1.7503, 150), 3);
    // 40° against rotation come 40° later.
    expect(shown.lagDeg).toBeCloseTo(166.504 + 40 - 90, 2);
  });
});

describe('directions and tilt', () => {
  it('a sensor a quarter turn further is passed a quarter turn later, or earlier the other way round', () => {
    const at = (turning: 1 | -1) =>
      velocityAt(rotor(0.1, { turning }), 1500, [heavySpot(0)], alongY).lagDeg;
    const first = velocityAt(rotor(0.1), 1500, [heavySpot(0)], alongX).lagDeg;
    expect((at(1) - first + 360) % 360).toBeCloseTo(90, 9);
    expect((first - at(-1) + 360) % 360).toBeCloseTo(90, 9);
  });

  // Shift: √(K/m) = 100 rad/s; tilt: √(2k·(L/2)²/J) = √(1e6·0.25/9) = 166.67 rad/s.
  it('has the natural frequencies of shift and tilt', () => {
    const [shift, tilt] = naturalFrequencies(rotor(0), supports(0));
    expect(shift).toBeCloseTo(100, 9);
    expect(tilt).toBeCloseTo(500 / 3, 9);
  });

  // Couple of 0.01 kg·m at both ends: M = 0.01·Ω²·1 m, tilt = M/(2.5e5 − 9·Ω²); at 100 rad/s 6.25e-4 rad,
  // 0.5 m off the middle 3.125e-4 m, opposite at the two supports.
  it('answers a couple by tilting, opposite at the two supports', () => {
    const couple = [
      { placeM: 0, kgM: 0.01, deg: 180 },
      { placeM: 1, kgM: 0.01, deg: 0 },
    ];
    // Half the mass keeps the shift, which a couple leaves alone, off its resonance.
    const still = rotor(0, { massKg: 50 });
    const [a, b] = ([0, 1] as const).map((support) =>
      velocityAt(still, rpmOf(100), couple, { support, deg: 0 }),
    );
    const size = (1000 * 3.125e-4 * 100) / Math.SQRT2;
    expect(a!.rmsMmS).toBeCloseTo(size, 6);
    expect(b!.rmsMmS).toBeCloseTo(size, 6);
    expect((a!.lagDeg - b!.lagDeg + 360) % 360).toBeCloseTo(180, 6);
  });
});
