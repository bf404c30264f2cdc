import type { AddendumDto } from './job-record';

/** A signature as the file carries it. */
export type SignatureInFile = { name: string; role: string; statement: string; at: string };

/** A signed job record for programs and archives. */
export type SignedRecordFile = {
  kind: 'Evenrun job record';
  version: 1;
  /** A name for the file. */
  name: string;
  convention: { angles: string; phase: string; model: string };
  signedAt: string;
  signedBy: string;
  role: string;
  statement: string;
  /** How anybody computes the hash again. */
  hashedAs: string;
  contentHash: string;
  /** The job as it was signed. */
  content: unknown;
  /** Every signature under the same content, the first one included. */
  signatures: SignatureInFile[];
  /** How the hash of an addendum is computed. */
  addendaHashedAs: string;
  /** Remarks made after signing; outside the content and its hash. */
  addenda: AddendumDto[];
};
