import { divide, fromPolar, multiply, scale, type Complex } from '../complex';
import type { ModelledPoint, SupportMode } from './modelled-machine';

/**
 * Influence coefficient of a point for a plane at `speedRpm` > 0: velocity, mm/s rms, per g·mm, angle
 * as lag. One mode of mass M: the force `U·Ω²` moves it by `x = F/(M·(ω₀² − Ω² − 2jζω₀Ω))` (sign of
 * j for lag), velocity lags displacement by −90°, and a sensor β further in the direction of rotation
 * than the tacho sees everything β later. Source: textbooks, forced response of a damped mode.
 *
 * Example: far above resonance it nears `Ω·10⁻³/(√2·M)` in size: 0.37·10⁻³ for 300 kg at 1485 r/min.
 */
export function influenceOf(point: ModelledPoint, plane: number, speedRpm: number): Complex {
  const omega = (2 * Math.PI * speedRpm) / 60;
  const forcePerGmm = (point.leverage[plane] ?? 0) * 1e-6 * omega ** 2;
  const displacementM = divide({ re: forcePerGmm, im: 0 }, dynamicStiffness(point.mode, omega));
  const velocityRmsMmS = scale(displacementM, (omega * 1000) / Math.SQRT2);
  return multiply(velocityRmsMmS, fromPolar(1, point.fromTachoDeg - 90));
}

function dynamicStiffness(mode: SupportMode, omega: number): Complex {
  const natural = (2 * Math.PI * mode.naturalSpeedRpm) / 60;
  return scale(
    { re: natural ** 2 - omega ** 2, im: -2 * mode.dampingRatio * natural * omega },
    mode.modalMassKg,
  );
}
