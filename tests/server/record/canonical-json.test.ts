import { describe, expect, it } from 'vitest';
import { canonicalJson, contentHash } from '@/lib/server/balance-job/canonical-json';

describe('canonical JSON', () => {
  // Source: RFC 8785, section 3.2.2 (its sample input and the text expected of it).
  it('writes the sample of RFC 8785 as the RFC does', () => {
    const sample: unknown = JSON.parse(String.raw`{
      "numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001],
      "string": "\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"\/",
      "literals": [null, true, false]
    }`);
    expect(canonicalJson(sample)).toBe(
      String.raw`{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\u000f\nA'B\"\\\\\"/"}`,
    );
  });

  // Source: RFC 8785, section 3.2.3 (order of members by UTF-16 code units).
  it('orders members by their UTF-16 code units, numbers in names included', () => {
    const names = ['\u20ac', '\r', '\ufb33', '1', '\ud83d\ude00', '\u0080', '\u00f6'];
    const text = canonicalJson(Object.fromEntries(names.map((name) => [name, 0])));
    const wanted = ['\r', '1', '\u0080', '\u00f6', '\u20ac', '\ud83d\ude00', '\ufb33'];
    expect(text).toBe(`{${wanted.map((name) => `${JSON.stringify(name)}:0`).join(',')}}`);
    expect(canonicalJson({ b: 1, 10: 2, 9: 3 })).toBe('{"10":2,"9":3,"b":1}');
  });

  it('leaves members out that are undefined, as JSON does', () => {
    expect(canonicalJson({ a: undefined, b: [undefined] })).toBe('{"b":[null]}');
  });

  // Source: FIPS 180-4, SHA-256 of the two bytes “{}” as any tool gives it (sha256sum).
  it('hashes the text with SHA-256', () => {
    expect(contentHash({})).toBe(
      '44136fa355b3678a1146ad16f7e8649e94fb4fc21fe77e8310c060f61caaff8a',
    );
  });
});
