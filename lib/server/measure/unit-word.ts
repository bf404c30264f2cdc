import 'server-only';
const WORDS: Readonly<Record<string, string>> = { 'm/s2': 'm/s²', um: 'µm' };

/** A unit as people write it: `m/s2` is “m/s²”, `um` is “µm”. */
export function unitWord(unit: string): string {
  return WORDS[unit] ?? unit;
}
