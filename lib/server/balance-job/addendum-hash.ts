import 'server-only';
import type { AddendumDto } from '@/lib/schemas/job-record';
import { contentHash } from './canonical-json';

/** The hash of an addendum: over its own words and the hash before it. */
export function addendumHash(addendum: Omit<AddendumDto, 'hash'>): string {
  const { number, text, reason, personName, role, at, previousHash } = addendum;
  return contentHash({ number, text, reason, personName, role, at, previousHash });
}

/** Whether every addendum has its hash and follows the one before it, the first the signed content. */
export function isChainIntact(signedHash: string, addenda: readonly AddendumDto[]): boolean {
  let before = signedHash;
  return addenda.every((addendum, index) => {
    const follows = addendum.previousHash === before && addendum.number === index + 1;
    before = addendum.hash;
    return follows && addendumHash(addendum) === addendum.hash;
  });
}
