import type { ContentDifference } from '../domain/balance-job/content-differences';

/** What the register knows of a signed record, and whether it is as signed. */
export type RecordCheckDto = {
  jobId: number;
  number: number;
  machine: string;
  timeZone: string;
  signedBy: string;
  signedAt: string;
  contentHash: string;
  /** The hash that the stored content gives now. */
  recomputedHash: string;
  intact: boolean;
  signatures: number;
  addenda: number;
  addendaIntact: boolean;
  /** Where the stored record is not as the run sheet and the ledger have it; looked for where not intact. */
  differences: ContentDifference[];
};

/** A kept file beside the record it was made of. */
export type RecordFileMatchDto = {
  record: RecordCheckDto;
  /** Whether the file's content is the one that was signed. */
  same: boolean;
  /** Where file (`one`) and register (`other`) differ. */
  differences: ContentDifference[];
  /** Addenda that the register has beyond the file. */
  newerAddenda: number;
};

/** What is said of a file that somebody kept. */
export type RecordFileCheckDto = {
  statedHash: string;
  /** The hash that the file's own content gives. */
  recomputedHash: string;
  /** Null where no record of the sites the person may see belongs to it. */
  match: RecordFileMatchDto | null;
};
