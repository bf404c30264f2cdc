import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  angleOfArc,
  angleOfClock,
  angleOfPosition,
  countedInSense,
  lagAfterChange,
  lagFromPhase,
  parseAngle,
  rotorDegAfterChange,
  rotorDegFromWithRotation,
} from '@/lib/domain/balancing/convert-angle';
import { clockText, describePlace } from '@/lib/domain/balancing/describe-place';
import { normaliseDeg } from '@/lib/domain/units';
import { codeOf, valueOf } from './job-builder';
import { near, nearDeg } from './near';

const turns = fc.double({ min: 0, max: 360, noNaN: true });

describe('parseAngle', () => {
  it('takes 0 to 360, and 360 is the mark itself', () => {
    expect([0, 0.5, 359.9, 360].map((typed) => valueOf(parseAngle(typed)))).toEqual([
      0, 0.5, 359.9, 0,
    ]);
  });

  it.each([-10, 720, 360.1, NaN, Infinity])('refuses %s and names the field', (typed) => {
    const refused = parseAngle(typed, 'trial.angleDeg');
    expect(refused).toMatchObject({
      ok: false,
      failure: { code: 'angle-range', field: 'trial.angleDeg' },
    });
  });

  it('says what a whole turn would make of it', () => {
    const refused = parseAngle(-10);
    expect(refused.ok ? '' : refused.failure.message).toContain('that is 350.');
    const nothing = parseAngle(NaN);
    expect(nothing.ok ? '' : nothing.failure.message).not.toContain('whole turn');
  });
});

describe('angles counted in other ways', () => {
  it('with rotation: 75° is 285°, and twice over is where it began', () => {
    expect(rotorDegFromWithRotation(75)).toBe(285);
    expect(rotorDegFromWithRotation(0)).toBe(0);
    fc.assert(
      fc.property(turns, (deg) =>
        nearDeg(rotorDegFromWithRotation(rotorDegFromWithRotation(deg)), deg, 1e-9),
      ),
    );
  });

  it('counted with rotation 285° reads as 75°, and typing that gives 285° back', () => {
    expect(countedInSense(285, 'with')).toBe(75);
    expect(countedInSense(285, 'against')).toBe(285);
    expect(countedInSense(0, 'with')).toBe(0);
    fc.assert(
      fc.property(turns, (deg) =>
        nearDeg(rotorDegFromWithRotation(countedInSense(deg, 'with')), deg, 1e-9),
      ),
    );
  });

  it('positions: number 4 of 7 with rotation, number 1 at 10°, is at 215.71°', () => {
    const ring = { count: 7, firstDeg: 10, numbered: 'with' } as const;
    near(valueOf(angleOfPosition(4, ring)), 215.714, 0.001);
    expect(valueOf(angleOfPosition(1, ring))).toBe(10);
  });

  it.each([0, 8, 1.5, -1])('positions: there is no %s among 7', (position) => {
    const ring = { count: 7, firstDeg: 0, numbered: 'against' } as const;
    expect(codeOf(angleOfPosition(position, ring))).toBe('no-position');
  });

  it('arc: 512 mm along 400 mm is 73.34°, the other way 286.66°', () => {
    near(valueOf(angleOfArc(512, 400)), 73.34, 0.01);
    near(valueOf(angleOfArc(512, 400, 'with')), 286.66, 0.01);
    expect(valueOf(angleOfArc(0, 400, 'with'))).toBe(0);
  });

  it.each([
    [-1, 400],
    [2514, 400],
    [10, 0],
    [NaN, 400],
  ])('arc: %s mm on %s mm is refused', (length, radius) => {
    expect(codeOf(angleOfArc(length, radius))).toBe('arc-range');
  });

  it('clock: 10:48 on a rotor seen turning clockwise is 36°', () => {
    near(valueOf(angleOfClock(10.8, 'cw')), 36, 1e-9);
    near(valueOf(angleOfClock(1.2, 'ccw')), 36, 1e-9);
    expect(valueOf(angleOfClock(12, 'cw'))).toBe(0);
    expect(valueOf(angleOfClock(12, 'ccw'))).toBe(0);
    expect(codeOf(angleOfClock(12.1, 'cw'))).toBe('clock-range');
    expect(codeOf(angleOfClock(-0.1, 'cw'))).toBe('clock-range');
  });
});

describe('lag from what an instrument calls phase', () => {
  it('a lead of 130° is a lag of 230°', () => {
    expect(lagFromPhase({ deg: 130, sense: 'lead', to: 'positive peak' })).toBe(230);
  });

  it('adds half a turn for the negative peak and a quarter for the zero crossing', () => {
    expect(lagFromPhase({ deg: 300, sense: 'lag', to: 'negative peak' })).toBe(120);
    expect(lagFromPhase({ deg: 20, sense: 'lag', to: 'positive-going zero crossing' })).toBe(110);
    expect(lagFromPhase({ deg: 20, sense: 'lead', to: 'negative peak' })).toBe(160);
  });
});

describe('a set-up that was changed', () => {
  it('200° with the tacho moved 30° with rotation is 170°', () => {
    const change = { kind: 'tacho moved with rotation', deg: 30 } as const;
    expect(lagAfterChange(200, change)).toBe(170);
    expect(lagAfterChange(10, change)).toBe(340);
    expect(rotorDegAfterChange(10, change)).toBe(10);
  });

  it('a moved mark takes the same from lags and angles, so coefficients stay', () => {
    const change = { kind: 'mark moved against rotation', deg: 25 } as const;
    fc.assert(
      fc.property(turns, turns, (lag, angle) => {
        const before = normaliseDeg(lag - angle);
        const after = lagAfterChange(lag, change) - rotorDegAfterChange(angle, change);
        nearDeg(after, before, 1e-9);
        nearDeg(lagAfterChange(lag, change), lag - 25, 1e-9);
      }),
    );
  });

  it('a sensor turned over twice is as before', () => {
    const change = { kind: 'sensor turned over' } as const;
    expect(lagAfterChange(40, change)).toBe(220);
    expect(lagAfterChange(220, change)).toBe(40);
    expect(rotorDegAfterChange(40, change)).toBe(40);
  });
});

describe('describePlace', () => {
  const place = {
    angleDeg: 36.1,
    radiusMm: 400,
    rotationFromDriveEnd: 'cw',
    viewingEnd: 'drive-end',
  } as const;
  const positions = Array.from({ length: 8 }, (_, i) => ({ label: `${i + 1}`, angleDeg: 45 * i }));

  it('36.1° on 400 mm, seen turning clockwise, is 252 mm along the rim and 10:48', () => {
    const words = describePlace({ ...place, positions });
    near(words.arcMm, 252.03, 0.01);
    expect(words.withRotationDeg).toBeCloseTo(323.9, 9);
    expect(words.clock).toBe('10:48');
    expect(words.seenTurning).toBe('cw');
    expect(words.nearest?.label).toBe('2');
    near(words.nearest!.offsetDeg, -8.9, 1e-9);
  });

  it('from the other end only the clock changes', () => {
    const from = describePlace({ ...place, positions });
    const other = describePlace({ ...place, positions, viewingEnd: 'other-end' });
    expect(other).toEqual({ ...from, clock: '1:12', seenTurning: 'ccw' });
  });

  it('finds the nearest position across the mark, and none where there are none', () => {
    expect(describePlace({ ...place, angleDeg: 350, positions }).nearest).toEqual({
      label: '1',
      offsetDeg: -10,
    });
    expect(describePlace(place).nearest).toBeNull();
  });

  it('all its ways lead back to the same spot', () => {
    fc.assert(
      fc.property(turns, (angleDeg) => {
        const words = describePlace({ ...place, angleDeg });
        nearDeg(valueOf(angleOfArc(words.arcMm, 400)), angleDeg, 1e-6);
        nearDeg(rotorDegFromWithRotation(words.withRotationDeg), angleDeg, 1e-9);
        const [hours = NaN, minutes = NaN] = words.clock.split(':').map(Number);
        // The clock is read to the minute, which is half a degree.
        nearDeg(valueOf(angleOfClock((hours % 12) + minutes / 60, 'cw')), angleDeg, 0.26);
      }),
    );
  });
});

describe('clockText', () => {
  it('reads as people read it', () => {
    const texts = [0, 10.8, 3, 0.1, 11.999].map(clockText);
    expect(texts).toEqual(['12:00', '10:48', '3:00', '12:06', '12:00']);
  });
});
