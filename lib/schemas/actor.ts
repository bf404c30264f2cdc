import type { Role } from '@/lib/domain/access/permissions';

export type SiteDto = {
  id: number;
  name: string;
  timeZone: string;
  decimalMark: '.' | ',';
  phaseShown: 'lag' | 'lead';
};

/** Who is acting: what every query and command takes first. */
export type Actor = {
  personId: number;
  name: string;
  email: string;
  role: Role;
  sites: readonly SiteDto[];
};
