import type { Role } from '@/lib/domain/access/permissions';

export type PersonRow = {
  id: number;
  name: string;
  email: string;
  role: Role;
  state: 'active' | 'closed';
  /** The sites open to the person that the administrator may see. */
  sites: { id: number; name: string }[];
  /** How many further sites are open to the person. */
  otherSites: number;
  isSelf: boolean;
  signedInAt: string | null;
};

export type PeopleDto = { people: PersonRow[]; sites: { id: number; name: string }[] };

export type LimitSetRow = {
  id: number;
  title: string;
  edition: string;
  quantity: 'velocity' | 'displacement';
  unit: string;
  bandLowHz: number;
  bandHighHz: number;
  bAb: number;
  bBc: number;
  bCd: number;
  speedMinRpm: number | null;
  speedMaxRpm: number | null;
  powerMinKw: number | null;
  powerMaxKw: number | null;
  support: 'rigid' | 'flexible' | 'any';
  citation: string;
  state: 'in use' | 'retired';
  /** Null for the sets that come with the register. */
  siteName: string | null;
  /** Machines of the actor's sites that it judges now. */
  machines: number;
};

export type LimitSetsDto = { sets: LimitSetRow[]; sites: { id: number; name: string }[] };
