import type { DecimalMark } from './column-layout';

/** What a file says about itself in the lines above its numbers. */
export type FileFacts = { readonly sampleRateHz: number | null; readonly speedRpm: number | null };

const FACT = /^#?\s*"?([^=:;,\t"]*?)"?\s*[=:;,\t]\s*"?([+-]?\d[\d.,]*)\s*([a-z/]*)/i;

/**
 * Reads `sample_rate_hz=12800`, `speed_r_min=1480` and the like, with or without `#`, with `=`, `:`
 * or the delimiter between, units kHz, Hz and r/min understood. A value written with the other
 * decimal mark than the file's is not taken.
 *
 * Example: `# Sample rate: 12.8 kHz` states 12800 Hz.
 */
export function fileFacts(lines: readonly string[], mark: DecimalMark | null): FileFacts {
  const facts = lines.flatMap((line) => factOf(line, mark) ?? []);
  return {
    sampleRateHz: facts.find(({ kind }) => kind === 'rate')?.value ?? null,
    speedRpm: facts.find(({ kind }) => kind === 'speed')?.value ?? null,
  };
}

/** Whether a line states one of those facts, so that it is neither header nor data. */
export function isFactLine(line: string): boolean {
  const key = FACT.exec(line)?.[1];
  return key !== undefined && kindOf(key) !== null;
}

type Fact = { readonly kind: 'rate' | 'speed'; readonly value: number };

function factOf(line: string, mark: DecimalMark | null): Fact | null {
  const match = FACT.exec(line);
  if (match === null) return null;
  const [, key = '', text = '', unit = ''] = match;
  const kind = kindOf(key);
  const plain = mark === 'comma' ? text.replace(',', '.') : text;
  const value = Number(plain) * factorOf(kind, `${key} ${unit}`.toLowerCase());
  return kind === null || !(value > 0) || !Number.isFinite(value) ? null : { kind, value };
}

function kindOf(key: string): Fact['kind'] | null {
  const words = key.toLowerCase().replace(/[^a-z]+/g, ' ');
  if (/sampl\w* ?(rate|freq)|abtast(rate|frequenz)|^ ?fs( |$)/.test(words)) return 'rate';
  return /speed|drehzahl|\brpm\b/.test(words) ? 'speed' : null;
}

function factorOf(kind: Fact['kind'] | null, text: string): number {
  if (kind === 'rate') return /khz/.test(text) ? 1000 : 1;
  return /\bhz\b|_hz/.test(text) ? 60 : 1;
}
