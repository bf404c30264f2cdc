import { describe, expect, it } from 'vitest';
import * as format from '@/lib/format';

const plain = (text: string) => text.replaceAll('\u00a0', ' ');

describe('numbers', () => {
  it.each([
    [3.016, '3.02'],
    [0.1716, '0.172'],
    [92.24, '92.2'],
    [9.996, '10.0'],
    [999.6, '1000'],
    [1487.4, '1487'],
    [64_400, '64400'],
    [0, '0'],
    [-0.5, '−0.500'],
    [0.000012345, '1.23 × 10⁻⁵'],
    [2.5e12, '2.50 × 10¹²'],
    [Number.NaN, 'not known'],
    [Number.POSITIVE_INFINITY, 'not known'],
  ])('%d reads %s', (value, text) => {
    expect(plain(format.formatNumber(value))).toBe(text);
  });

  it('has the decimal mark of the site', () => {
    expect(format.formatNumber(3.016, { decimalMark: ',' })).toBe('3,02');
    expect(format.formatMass(92.24, ',')).toBe('92,2\u00a0g');
    expect(format.formatForInput(0.1, ',')).toBe('0,1');
  });

  it('keeps fixed decimals down a column and never writes minus nothing', () => {
    expect(format.formatNumber(2, { decimals: 2 })).toBe('2.00');
    expect(format.formatNumber(-0.001, { decimals: 2 })).toBe('0.00');
  });

  it('never parts a number from its unit and detection', () => {
    expect(format.formatQuantity(4.3, 'mm/s rms')).toBe('4.30\u00a0mm/s\u00a0rms');
  });

  it('keeps every digit for a box', () => {
    expect(format.formatForInput(92.23456789)).toBe('92.23456789');
    expect(format.formatForInput(null)).toBe('');
  });
});

describe('angles', () => {
  it('always carry their sense', () => {
    expect(plain(format.formatLag(128))).toBe('128° lag');
    expect(plain(format.formatLag(128, 'lead'))).toBe('232° lead');
    expect(plain(format.formatRotorAngle(124.2))).toBe('124° against rotation');
  });

  it('round into [0, 360)', () => {
    expect(format.formatDegrees(359.6)).toBe('0°');
    expect(format.formatDegrees(-10)).toBe('350°');
    expect(format.formatDegrees(36.14, 1)).toBe('36.1°');
    expect(plain(format.formatLag(0, 'lead'))).toBe('0° lead');
  });

  it('read on a clock', () => {
    expect(format.formatClock(0)).toBe('12:00');
    expect(format.formatClock(11.9999)).toBe('12:00');
    expect(format.formatClock(10.7967)).toBe('10:48');
  });
});

describe('sizes and spans', () => {
  it('read in powers of ten', () => {
    expect(plain(format.formatBytes(512))).toBe('512 B');
    expect(plain(format.formatBytes(29_900_000))).toBe('29.9 MB');
  });

  it('read as people say them', () => {
    expect(plain(format.formatDuration(0.42))).toBe('420 ms');
    expect(plain(format.formatDuration(185))).toBe('3 min 05 s');
    expect(plain(format.formatDuration(7800))).toBe('2 h 10 min');
    expect(plain(format.formatShare(0.766))).toBe('77 %');
    expect(plain(format.formatCount(23, 140))).toBe('23 of 140');
    expect(plain(format.formatPlural(1, 'weight'))).toBe('1 weight');
    expect(plain(format.formatPlural(3, 'weight'))).toBe('3 weights');
  });
});

describe('dates', () => {
  const winter = '2026-02-03T13:05:09Z';

  it('stand in the zone of the site, with the zone named', () => {
    expect(format.formatDateTime(winter, 'Europe/Berlin')).toBe('3 Feb 2026, 14:05 CET');
    expect(format.formatDateTime(winter, 'UTC')).toBe('3 Feb 2026, 13:05 UTC');
    expect(format.formatZoneName(winter, 'Asia/Singapore')).toBe('GMT+8');
  });

  it('take the day of the site, not of UTC', () => {
    expect(format.formatDate('2026-02-03T23:30:00Z', 'Europe/Berlin')).toBe('4 Feb 2026');
    expect(format.formatTime(winter, 'Europe/Berlin')).toBe('14:05:09');
    expect(format.formatForDateTimeInput(winter, 'Europe/Berlin')).toBe('2026-02-03T14:05');
  });

  it('say so when they are none', () => {
    expect(format.formatDate('yesterday', 'UTC')).toBe('not known');
    expect(format.formatAge('yesterday', winter)).toBe('not known');
  });

  it.each([
    ['2026-02-03T13:05:00Z', 'just now'],
    ['2026-02-03T12:53:00Z', '12 min ago'],
    ['2026-02-03T11:00:00Z', '2 h ago'],
    ['2026-02-01T14:00:00Z', '47 h ago'],
    ['2026-01-25T13:00:00Z', '9 d ago'],
    ['2026-02-06T14:00:00Z', 'in 3 d'],
  ])('%s is %s', (at, age) => {
    expect(plain(format.formatAge(at, winter))).toBe(age);
  });

  it('count whole days', () => {
    expect(plain(format.formatDays('2026-01-01T12:00:00Z', '2026-01-03T11:00:00Z'))).toBe('1 d');
  });
});

describe('axes', () => {
  it('have the decimals their step needs', () => {
    expect(format.formatTick(1.5, 0.5)).toBe('1.5');
    expect(format.formatTick(20, 10)).toBe('20');
    expect(format.formatTick(0.05, 0.01, ',')).toBe('0,05');
  });

  it('name hours on the site’s clock, and days and months by their own midnight', () => {
    const day = 86_400_000;
    expect(format.formatTimeTick('2026-02-01T00:00:00Z', day, 'America/New_York')).toBe('19:00');
    expect(format.formatTimeTick('2026-02-01T00:00:00Z', 30 * day, 'America/New_York')).toBe(
      '1 Feb',
    );
    expect(format.formatTimeTick('2026-02-01T00:00:00Z', 400 * day, 'America/New_York')).toBe(
      'Feb 2026',
    );
  });
});

describe('settings', () => {
  it('stand as they are, without zeros that nobody entered', () => {
    expect(plain(format.formatExact(2560, 'Hz'))).toBe('2560 Hz');
    expect(plain(format.formatExact(5128.205128, 'Hz', ','))).toBe('5128,21 Hz');
    expect(format.formatExact(10, '')).toBe('10');
  });
});

describe('words', () => {
  it('name zones and roles', () => {
    expect(format.formatZone('C')).toBe('C, put right soon');
    expect(format.formatZone(null)).toBe('not judged');
    expect(format.ROLE_NAMES.engineer).toBe('Reliability engineer');
  });
});
