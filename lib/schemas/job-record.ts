import type { BalanceJobDto } from './balance-job';
import type { Report } from './report';

export type CautionLine = {
  cautionId: string;
  step: string;
  namedPerson: string | null;
  person: string;
  at: string;
};

/** With what was measured, as far as the register knows. */
export type EquipmentDto = {
  pulsesPerTurn: number;
  supportNote: string | null;
  sensors: { pointLabel: string; place: string; turnedOver: boolean }[];
};

/** A later remark. Its hash covers its words and the hash before it, so that none can be put in between. */
export type AddendumDto = {
  number: number;
  text: string;
  reason: string;
  personName: string;
  role: string;
  at: string;
  previousHash: string;
  hash: string;
};

/** What a signed record is beyond its content. */
export type SignedState = {
  contentHash: string;
  areaOwner: string;
  /** Whether the stored content still gives the hash that was signed. */
  intact: boolean;
  addenda: AddendumDto[];
  addendaIntact: boolean;
};

export type JobRecordDto = {
  job: BalanceJobDto;
  /** Set once signed. */
  signed: SignedState | null;
  /** Whether this person has signed already. */
  hasSigned: boolean;
  report: Report;
};
