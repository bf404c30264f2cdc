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
};
