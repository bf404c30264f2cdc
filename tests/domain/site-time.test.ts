import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { instantOfTyped } from '@/lib/domain/site-time';
import { formatForDateTimeInput } from '@/lib/format';

const at = (text: string, zone = 'Europe/Berlin') => {
  const read = instantOfTyped(text, zone);
  return read.ok ? new Date(read.value.atMs).toISOString() : read.failure.code;
};

describe('a time as typed', () => {
  it.each([
    ['2026-02-03T14:05', '2026-02-03T13:05:00.000Z'],
    ['2026-07-03 14:05:09.5', '2026-07-03T12:05:09.500Z'],
    ['2026-02-03', '2026-02-02T23:00:00.000Z'],
    ['2026-02-03T14:05Z', '2026-02-03T14:05:00.000Z'],
    ['2026-02-03T14:05:00-0530', '2026-02-03T19:35:00.000Z'],
    ['2026-02-31T14:05', 'TIME_SHAPE'],
    ['2026-02-03T24:05', 'TIME_SHAPE'],
    ['3 Feb 2026', 'TIME_SHAPE'],
    ['', 'TIME_SHAPE'],
    ['2026-03-29T02:30', 'TIME_SKIPPED'],
  ])('%s', (text, wanted) => {
    expect(at(text)).toBe(wanted);
  });

  it('says whether the zone was stated and whether the hour came twice', () => {
    expect(instantOfTyped('2026-10-25T02:30', 'Europe/Berlin')).toMatchObject({
      value: { zoneStated: false, doubled: true, atMs: Date.parse('2026-10-25T00:30Z') },
    });
    expect(instantOfTyped('2026-10-25T02:30+01:00', 'Europe/Berlin')).toMatchObject({
      value: { zoneStated: true, doubled: false, atMs: Date.parse('2026-10-25T01:30Z') },
    });
  });

  it('reads back what a date-and-time box shows, in every zone', () => {
    const zones = ['UTC', 'Europe/Berlin', 'America/New_York', 'Asia/Kolkata', 'Pacific/Auckland'];
    const minutes = fc.integer({ min: 0, max: 30_000_000 });
    fc.assert(
      fc.property(minutes, fc.constantFrom(...zones), (minute, zone) => {
        const wanted = minute * 60_000;
        const read = instantOfTyped(formatForDateTimeInput(new Date(wanted), zone), zone);
        if (!read.ok) throw new Error(read.failure.message);
        const { atMs, doubled } = read.value;
        expect(doubled ? [wanted, wanted - 3_600_000] : [wanted]).toContain(atMs);
      }),
    );
  });
});
