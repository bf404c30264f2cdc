import { describe, expect, it } from 'vitest';
import { readRecordCode, shortCode } from '@/lib/domain/balance-job/record-code';

const HASH = '4f0a91c277de0b13aa55aa55aa55aa55aa55aa55aa55aa55aa55aa55aa55aa55';

describe('the code of a record', () => {
  it('is the beginning of its hash in fours', () => {
    expect(shortCode(HASH)).toBe('4f0a 91c2 77de 0b13');
  });

  it.each(['4f0a 91c2 77de 0b13', ' 4F0A-91C2-77DE-0B13 ', '4f0a91c277de0b13', HASH])(
    'is read as typed: %s',
    (typed) => {
      const read = readRecordCode(typed);
      expect(read.ok && HASH.startsWith(read.value)).toBe(true);
    },
  );

  it('is refused with a letter that no code has, and the letter is named', () => {
    expect(readRecordCode('4f0a 91c2 77de 0bl3')).toMatchObject({
      failure: { code: 'not-a-code', message: expect.stringContaining('“l”') as string },
    });
  });

  it.each(['4f0a 91c2', `${HASH}0`, ''])('is refused at a wrong length: %s', (typed) => {
    expect(readRecordCode(typed)).toMatchObject({ failure: { code: 'code-length' } });
  });
});
