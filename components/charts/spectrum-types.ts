/** Lines of a spectrum as sent for the screen, rising in frequency; reduced ones keep their peaks. */
export type SpectrumCurve = {
  hz: readonly number[];
  values: readonly number[];
  /** Distance of the lines before any reduction. */
  dfHz: number;
};

/** A frequency to lay a harmonic cursor on: “BPFO”, “gear mesh”. */
export type SpectrumMark = { label: string; frequencyHz: number };

/** How the spectrum is looked at. */
export type SpectrumView = {
  y: 'linear' | 'log';
  x: 'Hz' | 'orders';
  /** Off, multiples of the cursor, or multiples of the mark with this label. */
  harmonicsOf: 'off' | 'cursor' | { mark: string };
};
