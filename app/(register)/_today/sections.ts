import type { Role } from '@/lib/domain/access/permissions';

export type TodaySection = 'due' | 'jobs' | 'waiting' | 'changes' | 'events';

const BY_ROLE: Readonly<Record<Role, readonly TodaySection[]>> = {
  technician: ['jobs', 'waiting', 'due', 'changes', 'events'],
  engineer: ['changes', 'due', 'waiting', 'jobs', 'events'],
  planner: ['due', 'jobs', 'changes', 'events', 'waiting'],
  administrator: ['waiting', 'changes', 'due', 'jobs', 'events'],
  reader: ['changes', 'due', 'jobs', 'events', 'waiting'],
};

/** What a role sees first. */
export function todaySections(role: Role): readonly TodaySection[] {
  return BY_ROLE[role];
}
