/** Geometry of a rolling bearing; ball and pitch diameter in one unit, whichever. */
export type BearingGeometry = {
  readonly rollers: number;
  readonly rollerDiameterMm: number;
  readonly pitchDiameterMm: number;
  readonly contactDeg: number;
};

/** Kinematic frequencies of a rolling bearing, Hz. */
export type BearingFrequencies = {
  readonly ftfHz: number;
  readonly bsfHz: number;
  readonly bpfoHz: number;
  readonly bpfiHz: number;
};

/**
 * Kinematic frequencies of a rolling bearing with turning inner and standing outer ring, without
 * slip. With `c = d/D·cos α`: `FTF = f/2·(1−c)`, `BPFO = n·f/2·(1−c)`, `BPFI = n·f/2·(1+c)`,
 * `BSF = f·D/(2d)·(1−c²)`. A ball defect strikes both races, at 2·BSF. Measured lines usually lie
 * within 2 % of these. `shaftHz` > 0. Source: textbooks (kinematics of rolling).
 *
 * Example: 9 balls, 22.2/103 mm, 0°, 24.6667 Hz: FTF 9.68, BPFO 87.08, BPFI 134.92, BSF 54.56 Hz.
 */
export function bearingFrequencies(geometry: BearingGeometry, shaftHz: number): BearingFrequencies {
  const { rollers, rollerDiameterMm: d, pitchDiameterMm: pitch, contactDeg } = geometry;
  const c = (d / pitch) * Math.cos((contactDeg * Math.PI) / 180);
  const ftfHz = (shaftHz / 2) * (1 - c);
  return {
    ftfHz,
    bsfHz: ((shaftHz * pitch) / (2 * d)) * (1 - c * c),
    bpfoHz: rollers * ftfHz,
    bpfiHz: rollers * (shaftHz / 2) * (1 + c),
  };
}
