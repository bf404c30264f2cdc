/** Powers of ten that a double holds exactly. */
const EXACT_POWERS = Float64Array.from({ length: 23 }, (_, i) => Number(`1e${i}`));
const LARGEST_EXACT = 2 ** 53;
const SPACE = 32;
const PLUS = 43;
const MINUS = 45;

/**
 * Reads decimal numbers straight from bytes, one cell after the other, correctly rounded: a mantissa
 * below 2⁵³ and a power of ten up to 22 are exact doubles, so one multiplication or division rounds
 * once (W. D. Clinger, 1990); anything longer goes through `Number(text)`. `position` is where the
 * next cell starts. Accepted: optional sign, digits with at most one decimal mark, optional
 * exponent, spaces around.
 */
export class NumberCursor {
  position = 0;
  private mantissa = 0;
  private exponent = 0;

  constructor(
    private readonly bytes: Uint8Array,
    private readonly mark: number,
  ) {}

  /**
   * The number at `position`, which moves behind it and the spaces after; NaN, with `position`
   * unmoved, if there is none. What follows the number is the caller's to judge.
   */
  read(): number {
    const start = this.skipSpaces(this.position);
    const first = this.bytes[start] ?? 0;
    const digits = first === MINUS || first === PLUS ? start + 1 : start;
    this.mantissa = 0;
    const whole = this.scanDigits(digits);
    let end = whole;
    let decimals = 0;
    if (this.bytes[whole] === this.mark) {
      end = this.scanDigits(whole + 1);
      decimals = end - whole - 1;
    }
    if (whole === digits && decimals === 0) return NaN;
    const afterExponent = this.scanExponent(end);
    this.position = this.skipSpaces(afterExponent);
    const power = this.exponent - decimals;
    const size = this.exactSize(power) ?? this.slowSize(digits, afterExponent);
    return first === MINUS ? -size : size;
  }

  private exactSize(power: number): number | null {
    if (this.mantissa >= LARGEST_EXACT || power < -22 || power > 22) return null;
    return power < 0
      ? this.mantissa / (EXACT_POWERS[-power] ?? NaN)
      : this.mantissa * (EXACT_POWERS[power] ?? NaN);
  }

  private slowSize(from: number, to: number): number {
    const text = new TextDecoder('windows-1252').decode(this.bytes.subarray(from, to));
    return Number(text.replace(',', '.'));
  }

  private skipSpaces(from: number): number {
    let at = from;
    while (this.bytes[at] === SPACE) at++;
    return at;
  }

  private scanDigits(from: number): number {
    let at = from;
    let mantissa = this.mantissa;
    for (;;) {
      const digit = (this.bytes[at] ?? 0) - 48;
      if (digit < 0 || digit > 9) break;
      mantissa = mantissa * 10 + digit;
      at++;
    }
    this.mantissa = mantissa;
    return at;
  }

  private scanExponent(from: number): number {
    this.exponent = 0;
    if (((this.bytes[from] ?? 0) | 32) !== 101) return from;
    const sign = this.bytes[from + 1] ?? 0;
    const digits = sign === MINUS || sign === PLUS ? from + 2 : from + 1;
    let at = digits;
    let exponent = 0;
    for (; isDigit(this.bytes[at]); at++) {
      exponent = Math.min(9999, exponent * 10 + (this.bytes[at] ?? 0) - 48);
    }
    if (at === digits) return from;
    this.exponent = sign === MINUS ? -exponent : exponent;
    return at;
  }
}

function isDigit(byte: number | undefined): boolean {
  return byte !== undefined && byte >= 48 && byte <= 57;
}
